/** Which readings belong on the drawing, as text, before any of them has a place. */
import type {
  BipolarReading,
  MosfetReading,
  PartReading,
  SettledState,
  TwoPinReading,
  Verdict,
} from '../../readings/readings.ts';
import { formatQuantity } from '../../values/format.ts';
import { badgeWords } from '../badge/words.ts';
import type { BadgeSign } from '../badge/sign.ts';
import { branchesOf, type Branch, type Run } from '../branches.ts';
import { lineCurrents, pinCurrentsOf } from '../lineCurrents.ts';
import type { Scene, ScenePart } from '../scene.ts';
import type { Piece } from '../wireGraph.ts';
import { nodesOf, type SceneNode } from './nodes.ts';

/** All readings, those that matter first, or none. */
export type Density = 'all' | 'key' | 'none';

export interface WantedChip {
  /** Of its own in the drawing: `chip/p3.drain`. */
  readonly id: string;
  /** As the readings name it: `Q1.drain`. */
  readonly name: string;
  readonly node: SceneNode;
  /** Null where the drawing does not fix the voltage. */
  readonly volts: number | null;
  readonly text: string;
}

export interface WantedCurrent {
  /** Of its own in the drawing: `current/p4`, `current/p6.emitter`, `current/w3.0`. */
  readonly id: string;
  /** Id of the part or wire concerned. */
  readonly of: string;
  /** `R1.current`. */
  readonly name: string;
  /** Stretches on which the figure may stand, and which way the current runs on each (from its `from` or against). */
  readonly runs: readonly (Run & { readonly forward: boolean })[];
  readonly text: string;
}

export interface WantedBadge {
  /** Of its own in the drawing: `badge/p3`. */
  readonly id: string;
  /** `Q1`. */
  readonly name: string;
  readonly part: ScenePart;
  readonly sign: Omit<BadgeSign, 'stale'>;
  readonly words: string;
  readonly current: string | undefined;
  readonly verdict: Verdict;
}

export interface Wanted {
  readonly chips: readonly WantedChip[];
  readonly currents: readonly WantedCurrent[];
  readonly badges: readonly WantedBadge[];
}

/** What is smaller is written as nothing, and makes no chevron: it is below what the arithmetic can tell from zero. */
const leastVolts = 1e-9;
const leastAmperes = 1e-12;

const voltsText = (volts: number): string => formatQuantity(Math.abs(volts) < leastVolts ? 0 : volts, 'V');
const amperesText = (amperes: number): string =>
  formatQuantity(Math.abs(amperes) < leastAmperes ? 0 : amperes, 'A');

export const notFixed = 'not fixed';

export const wantedOf = (
  scene: Scene,
  wiring: readonly Piece[],
  state: SettledState,
  density: Density,
): Wanted => {
  if (density === 'none') return { chips: [], currents: [], badges: [] };
  const badges = scene.parts.flatMap((part) => wantedBadge(part, state.parts[part.key]));
  const chips = nodesOf(scene, wiring).flatMap((node) => wantedChip(node, state));
  if (density === 'key') return { chips: chips.filter(isKey), currents: [], badges };
  return { chips, currents: wantedCurrents(scene, wiring, state, badges), badges };
};

/** At a transistor's pin, a test point, or a tag. */
const isKey = ({ node }: WantedChip): boolean =>
  node.pins.some(({ part }) => part.joins === 'label' || part.pins.size === 1 || isTransistor(part));

const isTransistor = ({ pins }: ScenePart): boolean => pins.has('gate') || pins.has('base');

const wantedChip = (node: SceneNode, state: SettledState): readonly WantedChip[] => {
  if (node.stated) return [];
  const [first] = node.pins.filter(({ part, pin }) => `${part.key}.${pin}` in state.pins);
  if (first === undefined) return [];
  const name = `${first.part.key}.${first.pin}`;
  const volts = state.pins[name] ?? null;
  const text = volts === null ? notFixed : voltsText(volts);
  return [{ id: `chip/${first.part.id}.${first.pin}`, name, node, volts, text }];
};

const wantedBadge = (part: ScenePart, reading: PartReading | undefined): readonly WantedBadge[] => {
  if (reading === undefined) return [];
  const base = { id: `badge/${part.id}`, name: part.key, part };
  if (isMosfet(reading)) {
    if (reading.region === null) return [];
    const { region, reversed, inversion, verdict } = reading;
    const sign = {
      family: 'mosfet',
      region,
      reversed,
      verdict,
      ...(inversion === undefined ? {} : { inversion }),
    } as const;
    return [{ ...base, sign, words: badgeWords(sign), current: figure(reading.drainCurrent), verdict }];
  }
  if (isBipolar(reading)) {
    if (reading.region === null) return [];
    const { region, reversed, verdict } = reading;
    const sign = { family: 'bipolar', region, reversed, verdict } as const;
    return [{ ...base, sign, words: badgeWords(sign), current: figure(reading.collectorCurrent), verdict }];
  }
  if (isDiode(reading)) {
    const sign = {
      family: 'diode',
      region: reading.region,
      reversed: false,
      verdict: 'not-checked',
    } as const;
    return [
      { ...base, sign, words: badgeWords(sign), current: figure(reading.current), verdict: 'not-checked' },
    ];
  }
  return [];
};

const figure = (amperes: number | null): string | undefined =>
  amperes === null ? undefined : amperesText(amperes);

const isMosfet = (reading: PartReading): reading is MosfetReading => reading.kind === 'mosfet';
const isBipolar = (reading: PartReading): reading is BipolarReading => reading.kind === 'bipolar';
const isDiode = (
  reading: PartReading,
): reading is TwoPinReading & { readonly region: NonNullable<TwoPinReading['region']> } =>
  reading.kind === 'diode' && typeof reading.region === 'string';

/** One figure a branch, unless a badge in it, or at its end, says the same. */
const wantedCurrents = (
  scene: Scene,
  wiring: readonly Piece[],
  state: SettledState,
  badges: readonly WantedBadge[],
): readonly WantedCurrent[] => {
  const pinCurrent = pinCurrentsOf(scene, state.pinCurrents);
  const currents = wiring.map((piece) => lineCurrents(piece, pinCurrent));
  const said = new Set(badges.filter(({ current }) => current !== undefined).map(({ part }) => part.id));
  return branchesOf(wiring).flatMap((branch): WantedCurrent[] => {
    if (branch.through.some(({ id }) => said.has(id))) return [];
    if (branch.endsAt.some(({ part, pin }) => pin === 'collector' && said.has(part.id))) return [];
    const runs = branch.runs.flatMap((run) => {
      const amperes = currents[run.piece]?.[run.stretch];
      return amperes === undefined || Math.abs(amperes) < leastAmperes ? [] : [{ ...run, amperes }];
    });
    const [first] = runs;
    if (first === undefined) return [];
    return [
      {
        ...nameOf(branch, wiring),
        runs: runs.map(({ piece, stretch, amperes }) => ({ piece, stretch, forward: amperes > 0 })),
        text: amperesText(Math.abs(first.amperes)),
      },
    ];
  });
};

/** By the part passed through, else by the pin at which the branch ends, else by a wire. */
const nameOf = (
  { through, endsAt, runs }: Branch,
  wiring: readonly Piece[],
): Pick<WantedCurrent, 'id' | 'of' | 'name'> => {
  const named = through.find(({ label }) => label !== undefined);
  if (named !== undefined) return { id: `current/${named.id}`, of: named.id, name: `${named.key}.current` };
  const [end] = endsAt;
  if (end !== undefined) {
    const { part, pin } = end;
    return { id: `current/${part.id}.${pin}`, of: part.id, name: `${part.key}.${pin}.current` };
  }
  const { piece = 0, stretch = 0 } = runs[0] ?? {};
  const { stretches = [], vertices = [] } = wiring[piece] ?? {};
  const wire = stretches[stretch]?.wire ?? '';
  const [near] = vertices.flatMap(({ pins }) => pins);
  // One wire may be part of several branches.
  const id = `current/${wire}.${stretch}`;
  return { id, of: wire, name: near === undefined ? wire : `${near.part.key}.${near.pin} wire current` };
};
