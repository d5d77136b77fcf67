/**
 * Potentiometer: a resistance of position·R from `a` to the wiper and (1 − position)·R from the wiper to `b`,
 * neither side below 1 mΩ. Both currents are unknowns of their own, so that an end position keeps its digits.
 */
import type { Element } from '../circuit.ts';
import { REFERENCE_TEMPERATURE, RESISTANCE_FLOOR } from './constants.ts';
import { absorbedPower, type ElementLaw } from './law.ts';

export interface PotentiometerParameters {
  /** End to end, Ω at 25 °C. */
  readonly resistance: number;
  /** 0 with the wiper at `a`, 1 with the wiper at `b`. */
  readonly position: number;
  /** 1/K; 0 where not given. */
  readonly temperatureCoefficient?: number;
}

export interface PotentiometerOperating {
  /** a less b, V. */
  readonly voltage: number;
  /** Wiper less b, V. */
  readonly wiperToB: number;
  /** Into a, A. */
  readonly current: number;
  /** Into the wiper, A. */
  readonly wiperCurrent: number;
  /** Absorbed, W. */
  readonly power: number;
}

export const potentiometerLaw: ElementLaw<PotentiometerOperating> = {
  name: 'potentiometer',
  terminals: ['a', 'b', 'wiper'],
  parameters: ['resistance', 'position', 'temperatureCoefficient'],
  internals: [],
  branches: ['from-a', 'to-b'],
  pattern: [
    [0, 3],
    [2, 3],
    [2, 4],
    [1, 4],
    [3, 0],
    [3, 2],
    [3, 3],
    [4, 2],
    [4, 1],
    [4, 4],
  ],
  senses: [],
  linear: true,
  derivedSize: 2,
  memorySize: 0,
  paths: () => [
    { kind: 'passive', from: 0, to: 2 },
    { kind: 'passive', from: 2, to: 1 },
  ],
  derive(values, { temperature }, derived, at) {
    const resistance = values[0]! * (1 + values[2]! * (temperature - REFERENCE_TEMPERATURE));
    derived[at] = Math.max(resistance * values[1]!, RESISTANCE_FLOOR);
    derived[at + 1] = Math.max(resistance * (1 - values[1]!), RESISTANCE_FLOOR);
  },
  load({ x, residual, jacobian, derived, linearKnown }, batch) {
    let { unknown: u, slot: s, derived: d } = batch;
    for (let k = 0; k < batch.count; k++, u += 5, s += 10, d += 2) {
      const fromA = x[u + 3]!;
      const toB = x[u + 4]!;
      residual[u] = fromA;
      residual[u + 1] = -toB;
      residual[u + 2] = toB - fromA;
      residual[u + 3] = x[u]! - x[u + 2]! - derived[d]! * fromA;
      residual[u + 4] = x[u + 2]! - x[u + 1]! - derived[d + 1]! * toB;
      if (linearKnown) continue;
      jacobian[s] = jacobian[s + 2] = jacobian[s + 4] = jacobian[s + 7] = 1;
      jacobian[s + 1] = jacobian[s + 3] = jacobian[s + 5] = jacobian[s + 8] = -1;
      jacobian[s + 6] = -derived[d]!;
      jacobian[s + 9] = -derived[d + 1]!;
    }
  },
  read: (at) => ({
    voltage: at.unknowns[0]! - at.unknowns[1]!,
    wiperToB: at.unknowns[2]! - at.unknowns[1]!,
    current: at.currents[0]!,
    wiperCurrent: at.currents[2]!,
    power: absorbedPower(at),
  }),
};

export const potentiometer = (
  name: string,
  nodes: readonly [a: number, b: number, wiper: number],
  { resistance, position, temperatureCoefficient = 0 }: PotentiometerParameters,
): Element<PotentiometerOperating> => ({
  name,
  law: potentiometerLaw,
  nodes,
  values: Float64Array.of(resistance, position, temperatureCoefficient),
});
