import type { CompiledPart, CompiledStage } from './compile.ts';
import { assumptionsOf } from './assumptions.ts';
import { cautionsOf } from './cautions/index.ts';
import { judge } from './duty/condition.ts';
import type { PartDuty } from './duty/partDuty.ts';
import { headroomOf } from './headroom/headroom.ts';
import type { HeadroomBench } from './headroom/headroom.ts';
import type { Point } from './point.ts';
import { plain, readoutOf, readPart } from './readPart.ts';
import type { DutyReading, Figure, Notice, PartReading, SettledState } from './readings.ts';
import { notSetSnags } from './snags/notSet.ts';

const unjudged: DutyReading = {
  duty: 'none',
  verdict: 'not-checked',
  headroom: null,
  reasons: [],
  spread: null,
};

const judged = (bench: HeadroomBench & { readonly point: Point }, duty: PartDuty): DutyReading => {
  if (duty.terms === null) return unjudged;
  const { verdict, reasons } = judge(duty.asked, bench.point.measure);
  return {
    duty: duty.duty,
    verdict,
    headroom: headroomOf(bench, duty, bench.point),
    reasons: verdict === 'held' ? [...reasons, 'nominal only'] : reasons,
    spread: null,
  };
};

interface Stand {
  readonly compiled: CompiledStage;
  readonly duties: ReadonlyMap<string, PartDuty>;
  readonly snags: readonly Notice[];
  /** Null where the drawing holds nothing electrical. */
  readonly bench: (HeadroomBench & { readonly point: Point }) | null;
}

/** Of rails of one name the one that holds the voltage speaks; of other parts of one name, the first. */
const speakers = (parts: readonly CompiledPart[]): ReadonlySet<string> => {
  const byName = new Map<string, CompiledPart>();
  for (const part of parts) {
    const known = byName.get(part.name);
    if (known === undefined || (known.elements.length === 0 && part.elements.length > 0)) {
      byName.set(part.name, part);
    }
  }
  return new Set([...byName.values()].map((part) => part.id));
};

/** The readings of a settled state, as the contract states them. */
export const readState = ({ compiled, duties, snags, bench }: Stand): SettledState => {
  const empty = { pins: {}, pinCurrents: {}, parts: {} };
  if (bench === null) {
    return {
      settled: true,
      method: 'direct',
      iterations: 0,
      residual: { amperes: 0, ratio: 0 },
      assumptions: assumptionsOf(compiled),
      ...empty,
      snags,
      cautions: [],
    };
  }
  const { point } = bench;
  const { settlement } = point;
  const pins: Record<string, Figure> = {};
  const pinCurrents: Record<string, Figure> = {};
  const parts: Record<string, PartReading> = {};
  const speaking = speakers(compiled.parts);
  const loose = new Set(compiled.loose);
  for (const part of compiled.parts) {
    if (!speaking.has(part.id)) continue;
    for (const pin of part.pins) {
      const node = compiled.nodeOf(part.id, pin);
      const volts = node === null ? undefined : settlement.voltages[node];
      pins[`${part.name}.${pin}`] = volts === undefined || point.unsetNode(node) ? null : plain(volts);
    }
    // Nothing electrical reaches a part that is left out: it has no figures, and its snag says why.
    if (loose.has(part.id)) continue;
    const readout = readoutOf(compiled, part, point);
    for (const pin of part.pins) {
      const current = readout.pinCurrents[pin];
      if (current !== undefined) pinCurrents[`${part.name}.${pin}`] = plain(current);
    }
    const duty = duties.get(part.id) ?? null;
    const verdict = duty === null ? unjudged : judged(bench, duty);
    const reading = readPart(compiled, part, readout, point, duty, verdict);
    if (reading !== null) parts[part.name] = reading;
  }
  return {
    settled: true,
    method: settlement.method,
    iterations: settlement.iterations,
    residual: settlement.residual,
    assumptions: assumptionsOf(compiled),
    pins,
    pinCurrents,
    parts,
    snags: [...snags, ...notSetSnags(compiled, point)],
    cautions: cautionsOf({ compiled, duties, point, parts }),
  };
};
