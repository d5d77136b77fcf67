/**
 * Logic output: a resistance to `high` or to `low` by its level, nothing when open, and clamp diodes from `low` to the
 * output and from the output to `high`, which make an unpowered output a path (common practice for such outputs).
 */
import type { Element } from '../circuit.ts';
import { INTEGRATED_SATURATION_CURRENT, RESISTANCE_FLOOR, SILICON_BAND_GAP } from './constants.ts';
import {
  deriveShockley,
  evaluateJunction,
  JUNCTION_SIZE,
  junctionResult,
  limitJunction,
} from './junction.ts';
import { absorbedPower, Phase, type ElementLaw, type LocalEntry, type Path } from './law.ts';

export type LogicLevel = 'high' | 'low' | 'open';

export interface LogicOutputParameters {
  readonly level: LogicLevel;
  /** Ω, from the output to `high`; 50. */
  readonly highResistance?: number;
  /** Ω, from the output to `low`; 50. */
  readonly lowResistance?: number;
  /** Of the clamp diodes, A; 1e-15. */
  readonly clampSaturationCurrent?: number;
}

export interface LogicOutputOperating {
  readonly level: LogicLevel;
  /** Against `low`, V. */
  readonly output: number;
  /** Out of the output, A. */
  readonly outputCurrent: number;
  /** Forward currents of the clamp diodes, A. */
  readonly highClampCurrent: number;
  readonly lowClampCurrent: number;
  /** Absorbed, W. */
  readonly power: number;
}

const levels: readonly LogicLevel[] = ['low', 'high', 'open'];

const OUT = 0;
const HIGH = 1;
const LOW = 2;

/** Places in `derived`. */
const HIGH_CONDUCTANCE = 0;
const LOW_CONDUCTANCE = 1;
const LEAK = 2;
const LEVEL = 3;
const CLAMP = 4;
const DERIVED_SIZE = CLAMP + JUNCTION_SIZE;

const endEntries = (end: number): LocalEntry[] => [
  [OUT, OUT],
  [OUT, end],
  [end, OUT],
  [end, end],
];

export const logicOutputLaw: ElementLaw<LogicOutputOperating> = {
  name: 'logic-output',
  terminals: ['out', 'high', 'low'],
  parameters: ['level', 'highResistance', 'lowResistance', 'clampSaturationCurrent'],
  internals: [],
  branches: [],
  pattern: [...endEntries(HIGH), ...endEntries(LOW)],
  senses: [],
  derivedSize: DERIVED_SIZE,
  memorySize: 2,

  paths(values) {
    const driven: Path[] =
      values[0] === 2 ? [] : [{ kind: 'passive', from: OUT, to: values[0] === 1 ? HIGH : LOW }];
    return [...driven, { kind: 'junction', from: OUT, to: HIGH }, { kind: 'junction', from: LOW, to: OUT }];
  },

  pathValues: [0],

  derive(values, { temperature, leak }, derived, at) {
    const level = values[0]!;
    derived[at + HIGH_CONDUCTANCE] = level === 1 ? 1 / Math.max(values[1]!, RESISTANCE_FLOOR) : 0;
    derived[at + LOW_CONDUCTANCE] = level === 0 ? 1 / Math.max(values[2]!, RESISTANCE_FLOOR) : 0;
    derived[at + LEAK] = leak;
    derived[at + LEVEL] = level;
    deriveShockley(values[3]!, 1, 0, SILICON_BAND_GAP, temperature, derived, at + CLAMP);
  },

  load(work, batch) {
    const { x, residual, jacobian, derived, memory, phase } = work;
    let { unknown: u, slot: s, derived: d, memory: m } = batch;
    for (let k = 0; k < batch.count; k++, u += 3, s += 8, d += DERIVED_SIZE, m += 2) {
      let out = 0;
      for (let end = HIGH; end <= LOW; end++) {
        // Upward: the clamp conducts from the output to `high`; downward: from `low` to the output.
        const direction = end === HIGH ? 1 : -1;
        const voltage = direction * (x[u]! - x[u + end]!);
        const place = m + end - HIGH;
        let evaluated = voltage;
        if (phase !== Phase.exact) {
          if (phase === Phase.limit) evaluated = limitJunction(derived, d + CLAMP, memory[place]!, voltage);
          else if (phase === Phase.start) evaluated = Math.min(voltage, 0);
          if (evaluated !== voltage) work.limited = true;
          memory[place] = evaluated;
        }
        evaluateJunction(derived, d + CLAMP, evaluated);
        const straight =
          derived[d + LEAK]! + derived[d + (end === HIGH ? HIGH_CONDUCTANCE : LOW_CONDUCTANCE)]!;
        const slope = junctionResult[1]!;
        const current = direction * (junctionResult[0]! + slope * (voltage - evaluated) + straight * voltage); // out of the output node
        out += current;
        residual[u + end] = -current;
        const at = s + 4 * (end - HIGH);
        jacobian[at] = jacobian[at + 3] = slope + straight;
        jacobian[at + 1] = jacobian[at + 2] = -(slope + straight);
      }
      residual[u] = out;
    }
  },

  read(at) {
    const { unknowns: v, derived } = at;
    const clamp = (voltage: number): number => {
      evaluateJunction(derived, CLAMP, voltage);
      return junctionResult[0]!;
    };
    return {
      level: levels[derived[LEVEL]!] ?? 'open',
      output: v[OUT]! - v[LOW]!,
      outputCurrent: -at.currents[OUT]!,
      highClampCurrent: clamp(v[OUT]! - v[HIGH]!),
      lowClampCurrent: clamp(v[LOW]! - v[OUT]!),
      power: absorbedPower(at),
    };
  },
};

/** Terminals in the order out, high, low. */
export const logicOutput = (
  name: string,
  nodes: readonly [out: number, high: number, low: number],
  parameters: LogicOutputParameters,
): Element<LogicOutputOperating> => ({
  name,
  law: logicOutputLaw,
  nodes,
  values: Float64Array.of(
    levels.indexOf(parameters.level),
    parameters.highResistance ?? 50,
    parameters.lowResistance ?? 50,
    parameters.clampSaturationCurrent ?? INTEGRATED_SATURATION_CURRENT,
  ),
});
