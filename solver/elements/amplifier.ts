/**
 * Operational amplifier. Without supplies: V_out = A·(V₊ − V₋ + V_os), against the reference. With supplies: the same about
 * the middle of the supplies, held between low + margin and high − margin; what the output gives comes from `high`,
 * what it takes goes to `low`. The output current is an unknown of its own.
 */
import type { Element } from '../circuit.ts';
import { absorbedPower, REFERENCE, type ElementLaw, type ReadingPoint } from './law.ts';

export interface AmplifierParameters {
  /** Open-loop gain, V/V; 1e6. */
  readonly gain?: number;
  /** Input offset, V; 0. */
  readonly offset?: number;
  /** How close the output comes to each supply, V; 0. With supplies only. */
  readonly outputMargin?: number;
}

export interface AmplifierOperating {
  /** Plus less minus, V. */
  readonly input: number;
  /** Against the reference, V. */
  readonly output: number;
  /** Out of the output, A. */
  readonly outputCurrent: number;
  /** Which supply the output stands against. */
  readonly limited: 'none' | 'high' | 'low';
  /** Absorbed, W; without supplies, what the output absorbs. */
  readonly power: number;
}

const DEFAULT_GAIN = 1e6;

const read = (limited: AmplifierOperating['limited'], at: ReadingPoint): AmplifierOperating => ({
  input: at.unknowns[0]! - at.unknowns[1]!,
  output: at.unknowns[2]!,
  outputCurrent: -at.currents[2]!,
  limited,
  power: absorbedPower(at),
});

export const idealAmplifierLaw: ElementLaw<AmplifierOperating> = {
  name: 'amplifier',
  terminals: ['plus', 'minus', 'out'],
  parameters: ['gain', 'offset'],
  internals: [],
  branches: ['current'],
  pattern: [
    [2, 3],
    [3, 0],
    [3, 1],
    [3, 2],
  ],
  senses: [0, 1],
  lags: [[3, 2]],
  derivedSize: 2,
  memorySize: 0,
  paths: () => [{ kind: 'driven', from: 2, to: REFERENCE, ideal: true }],
  derive(values, _conditions, derived, at) {
    derived[at] = values[0]!;
    derived[at + 1] = values[1]!;
  },
  load({ x, residual, jacobian, derived, gainScale }, batch) {
    let { unknown: u, slot: s, derived: d } = batch;
    for (let k = 0; k < batch.count; k++, u += 4, s += 4, d += 2) {
      const gain = gainScale * derived[d]!;
      residual[u + 2] = x[u + 3]!;
      residual[u + 3] = x[u + 2]! - gain * (x[u]! - x[u + 1]! + derived[d + 1]!); // V
      jacobian[s] = 1;
      jacobian[s + 1] = -gain;
      jacobian[s + 2] = gain;
      jacobian[s + 3] = 1;
    }
  },
  read: (at) => read('none', at),
};

/** Part of the way to a limit within which the output follows the gain exactly; from there it bends into the limit. */
const STRAIGHT = 0.98;
/** Current over which the output's supply current passes from `low` to `high`, A. */
const CROSSING_CURRENT = 1e-9;

export const suppliedAmplifierLaw: ElementLaw<AmplifierOperating> = {
  name: 'amplifier',
  terminals: ['plus', 'minus', 'out', 'high', 'low'],
  parameters: ['gain', 'offset', 'outputMargin'],
  internals: [],
  branches: ['current'],
  pattern: [
    [2, 5],
    [3, 5],
    [4, 5],
    [5, 0],
    [5, 1],
    [5, 2],
    [5, 3],
    [5, 4],
  ],
  senses: [0, 1],
  lags: [[5, 2]],
  derivedSize: 3,
  memorySize: 0,
  paths: () => [
    { kind: 'driven', from: 2, to: 3, ideal: false },
    { kind: 'driven', from: 2, to: 4, ideal: false },
    { kind: 'driven', from: 3, to: 4, ideal: false },
  ],
  derive(values, _conditions, derived, at) {
    derived.set(values, at);
  },
  load({ x, residual, jacobian, derived, gainScale }, batch) {
    let { unknown: u, slot: s, derived: d } = batch;
    for (let k = 0; k < batch.count; k++, u += 6, s += 8, d += 3) {
      const current = x[u + 5]!; // into the output
      // What the output takes leaves at `low`, what it gives enters at `high`; the two shares sum to one.
      const root = Math.hypot(current, CROSSING_CURRENT);
      const taken = (current + root - CROSSING_CURRENT) / 2;
      residual[u + 2] = current;
      residual[u + 3] = taken - current;
      residual[u + 4] = -taken;
      const takenSlope = (1 + current / root) / 2;
      jacobian[s] = 1;
      jacobian[s + 1] = takenSlope - 1;
      jacobian[s + 2] = -takenSlope;
      writeOutputRow(x, residual, jacobian, derived, gainScale, u, s + 3, d);
    }
  },
  read(at) {
    const [plus = 0, minus = 0, out = 0, high = 0, low = 0] = at.unknowns;
    const [gain = 1, offset = 0, margin = 0] = at.derived;
    const middle = (high + low) / 2;
    const reach = Math.max((high - low) / 2 - margin, 0);
    const wanted = gain * (plus - minus + offset);
    const against = Math.abs(wanted) <= reach * STRAIGHT ? 'none' : out > middle ? 'high' : 'low';
    return read(against, at);
  },
};

/** Row 5: V_out = middle + bend(A·(V₊ − V₋ + V_os)), V. */
function writeOutputRow(
  x: Float64Array,
  residual: Float64Array,
  jacobian: Float64Array,
  derived: Float64Array,
  gainScale: number,
  u: number,
  s: number,
  d: number,
): void {
  const gain = derived[d]! * gainScale;
  const high = x[u + 3]!;
  const low = x[u + 4]!;
  const room = (high - low) / 2 - derived[d + 2]!;
  const reach = Math.max(room, 0);
  const wanted = gain * (x[u]! - x[u + 1]! + derived[d + 1]!);
  const size = Math.abs(wanted);
  const straight = STRAIGHT * reach;
  const rest = reach - straight;
  let bent = wanted;
  let slope = 1; // ∂bent/∂wanted
  let byReach = 0; // ∂bent/∂reach
  if (size > straight) {
    const sign = Math.sign(wanted);
    const over = rest > 0 ? (size - straight) / rest : Infinity;
    const share = over === Infinity ? 1 : over / (1 + over); // 0 at the end of the straight part, 1 far beyond
    bent = sign * (straight + rest * share);
    slope = over === Infinity ? 0 : 1 / ((1 + over) * (1 + over));
    byReach = sign * (STRAIGHT + (1 - STRAIGHT) * share - slope * (STRAIGHT + (1 - STRAIGHT) * over));
    if (over === Infinity) byReach = sign;
  }
  const half = room > 0 ? byReach / 2 : 0;
  residual[u + 5] = x[u + 2]! - (high + low) / 2 - bent;
  jacobian[s] = -gain * slope;
  jacobian[s + 1] = gain * slope;
  jacobian[s + 2] = 1;
  jacobian[s + 3] = -0.5 - half;
  jacobian[s + 4] = -0.5 + half;
}

/** Terminals plus, minus, out; or plus, minus, out, high, low where supplies are wired. */
export function amplifier(
  name: string,
  nodes:
    | readonly [plus: number, minus: number, out: number]
    | readonly [plus: number, minus: number, out: number, high: number, low: number],
  { gain = DEFAULT_GAIN, offset = 0, outputMargin = 0 }: AmplifierParameters = {},
): Element<AmplifierOperating> {
  return nodes.length === 3
    ? { name, law: idealAmplifierLaw, nodes, values: Float64Array.of(gain, offset) }
    : { name, law: suppliedAmplifierLaw, nodes, values: Float64Array.of(gain, offset, outputMargin) };
}
