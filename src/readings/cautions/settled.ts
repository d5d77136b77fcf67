import type { CompiledPart, CompiledStage } from '../compile.ts';
import type { PartDuty } from '../duty/partDuty.ts';
import type { Point } from '../point.ts';
import type { Notice, PartReading } from '../readings.ts';

/** A settled state as the cautions look at it. */
export interface Settled {
  readonly compiled: CompiledStage;
  readonly duties: ReadonlyMap<string, PartDuty>;
  readonly point: Point;
  /** By name, as in the readings. */
  readonly parts: Readonly<Record<string, PartReading>>;
}

export type Caution = (settled: Settled) => readonly Notice[];

/** Whatever local codes ask, and whoever may do the work by them, stands above a sentence of this program. */
export const deferral = 'local codes and licensed practice come first';

/** A numeric figure of a part's reading; null where it has none. */
export const figureOf = ({ parts }: Settled, part: CompiledPart, key: string): number | null => {
  const figure = (parts[part.name] as Readonly<Record<string, unknown>> | undefined)?.[key];
  return typeof figure === 'number' ? figure : null;
};

/** Solved voltage of a pin, V; null where it is not set. */
export const voltageOf = ({ compiled, point }: Settled, part: CompiledPart, pin: string): number | null => {
  const node = compiled.nodeOf(part.id, pin);
  return node === null || point.unsetNode(node) ? null : (point.settlement.voltages[node] ?? null);
};
