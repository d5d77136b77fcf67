/**
 * Bipolar transistor, n-p-n and p-n-p: transport form of Ebers and Moll (1954), Early voltage, declared leak.
 * I_T = (I_F − I_R)(1 + |V_CE|/V_A), I_C = I_T − I_R/β_R, I_B = I_F/β_F + I_R/β_R, with I_F and I_R Shockley's currents of
 * V_BE and V_BC at one saturation current.
 */
import type { Element } from '../circuit.ts';
import { REFERENCE_TEMPERATURE, SILICON_BAND_GAP } from './constants.ts';
import {
  deriveShockley,
  evaluateJunction,
  JUNCTION_SIZE,
  junctionResult,
  limitJunction,
} from './junction.ts';
import { absorbedPower, Phase, type ElementLaw, type ReadingPoint } from './law.ts';

export type BipolarRegion = 'cutoff' | 'active' | 'saturated';

export interface BipolarParameters {
  /** +1 n-p-n, −1 p-n-p. */
  readonly polarity: 1 | -1;
  /** I_S at 25 °C, A. */
  readonly saturationCurrent: number;
  /** β_F (h_FE) at 25 °C. */
  readonly forwardGain: number;
  /** β_R; 1. */
  readonly reverseGain?: number;
  /** V_A, V; infinite. */
  readonly earlyVoltage?: number;
  /** Of the forward gain, 1/K; 0.006 (common practice). */
  readonly gainTemperatureCoefficient?: number;
}

/** Voltages with true signs; currents in the device's normal direction (into collector and base for n-p-n). */
export interface BipolarOperating {
  readonly region: BipolarRegion;
  /** Collector and emitter have exchanged roles: s·V_CE < 0. */
  readonly reversed: boolean;
  readonly baseToEmitter: number;
  readonly collectorToEmitter: number;
  readonly collectorCurrent: number;
  readonly baseCurrent: number;
  /** h_FE at temperature, without the Early voltage's share. */
  readonly forwardGain: number;
  /** ∂I_C/∂V_BE, ∂I_C/∂V_CE, ∂I_B/∂V_BE, S, the other voltage of V_BE and V_CE held. */
  readonly transconductance: number;
  readonly outputConductance: number;
  readonly inputConductance: number;
  /** Absorbed, W. */
  readonly power: number;
}

const COLLECTOR = 0;
const BASE = 1;
const EMITTER = 2;

const POLARITY = 0;
const LEAK = 1;
const FORWARD_GAIN = 2;
const REVERSE_GAIN = 3;
/** 1/V_A, 1/V. */
const EARLY = 4;
const JUNCTION = 5;
const DERIVED_SIZE = JUNCTION + JUNCTION_SIZE;

/** I_C, I_B of the n-p-n equivalent and their slopes against V_BE and V_BC: cBE, cBC, bBE, bBC. */
const result = new Float64Array(6);

function evaluate(derived: Float64Array, d: number, vbe: number, vbc: number): void {
  const leak = derived[d + LEAK]!;
  const early = derived[d + EARLY]!;
  const forwardGain = derived[d + FORWARD_GAIN]!;
  const reverseGain = derived[d + REVERSE_GAIN]!;
  evaluateJunction(derived, d + JUNCTION, vbe);
  const forward = junctionResult[0]!;
  const forwardSlope = junctionResult[1]!;
  evaluateJunction(derived, d + JUNCTION, vbc);
  const reverse = junctionResult[0]!;
  const reverseSlope = junctionResult[1]!;
  const vce = vbe - vbc;
  const modulation = 1 + early * Math.abs(vce);
  const tilt = (forward - reverse) * early * Math.sign(vce); // ∂I_T/∂V_CE
  const reverseBase = reverse / reverseGain + leak * vbc;
  result[0] = (forward - reverse) * modulation - reverseBase;
  result[1] = forward / forwardGain + leak * vbe + reverseBase;
  result[2] = forwardSlope * modulation + tilt;
  result[3] = -reverseSlope * modulation - tilt - reverseSlope / reverseGain - leak;
  result[4] = forwardSlope / forwardGain + leak;
  result[5] = reverseSlope / reverseGain + leak;
}

/** Current below which a transistor counts as cut off, A. */
const CUTOFF_CURRENT = 1e-6;
/** Below this share of h_FE·I_B the collector current counts as saturated. */
const SATURATED_SHARE = 0.9;

function readBipolar(at: ReadingPoint): BipolarOperating {
  const { unknowns: v, derived, currents } = at;
  const polarity = derived[POLARITY]!;
  const vbe = polarity * (v[BASE]! - v[EMITTER]!);
  const vbc = polarity * (v[BASE]! - v[COLLECTOR]!);
  evaluate(derived, 0, vbe, vbc);
  const [, , cBE = 0, cBC = 0, bBE = 0, bBC = 0] = result;
  const collectorCurrent = polarity * currents[COLLECTOR]!;
  const baseCurrent = polarity * currents[BASE]!;
  const forwardGain = derived[FORWARD_GAIN]!;
  const cutoff = Math.abs(collectorCurrent) < CUTOFF_CURRENT && Math.abs(baseCurrent) < CUTOFF_CURRENT;
  return {
    region: cutoff
      ? 'cutoff'
      : collectorCurrent < SATURATED_SHARE * forwardGain * baseCurrent
        ? 'saturated'
        : 'active',
    reversed: vbe < vbc,
    baseToEmitter: v[BASE]! - v[EMITTER]!,
    collectorToEmitter: v[COLLECTOR]! - v[EMITTER]!,
    collectorCurrent,
    baseCurrent,
    forwardGain,
    transconductance: cBE + cBC, // V_BC = V_BE − V_CE moves along
    outputConductance: -cBC,
    inputConductance: bBE + bBC,
    power: absorbedPower(at),
  };
}

export const bipolarLaw: ElementLaw<BipolarOperating> = {
  name: 'bipolar',
  terminals: ['collector', 'base', 'emitter'],
  parameters: [
    'polarity',
    'saturationCurrent',
    'forwardGain',
    'reverseGain',
    'earlyVoltage',
    'gainTemperatureCoefficient',
  ],
  internals: [],
  branches: [],
  pattern: [COLLECTOR, BASE, EMITTER].flatMap((row) =>
    [COLLECTOR, BASE, EMITTER].map((column) => [row, column] as const),
  ),
  senses: [],
  derivedSize: DERIVED_SIZE,
  memorySize: 2,

  paths(values) {
    const npn = values[0]! > 0;
    const junction = (end: number) =>
      ({ kind: 'junction', from: npn ? BASE : end, to: npn ? end : BASE }) as const;
    return [junction(COLLECTOR), junction(EMITTER), { kind: 'channel', from: COLLECTOR, to: EMITTER }];
  },

  derive(values, { temperature, leak }, derived, at) {
    derived[at + POLARITY] = values[0]!;
    derived[at + LEAK] = leak;
    derived[at + FORWARD_GAIN] = values[2]! * (1 + values[5]! * (temperature - REFERENCE_TEMPERATURE));
    derived[at + REVERSE_GAIN] = values[3]!;
    derived[at + EARLY] = 1 / values[4]!;
    deriveShockley(values[1]!, 1, 0, SILICON_BAND_GAP, temperature, derived, at + JUNCTION);
  },

  load(work, batch) {
    const { x, residual, jacobian, derived, memory, phase } = work;
    let { unknown: u, slot: s, derived: d, memory: m } = batch;
    for (let k = 0; k < batch.count; k++, u += 3, s += 9, d += DERIVED_SIZE, m += 2) {
      const polarity = derived[d + POLARITY]!;
      const vbe = polarity * (x[u + BASE]! - x[u + EMITTER]!);
      const vbc = polarity * (x[u + BASE]! - x[u + COLLECTOR]!);
      let atBE = vbe;
      let atBC = vbc;
      if (phase !== Phase.exact) {
        if (phase === Phase.limit) {
          atBE = limitJunction(derived, d + JUNCTION, memory[m]!, vbe);
          atBC = limitJunction(derived, d + JUNCTION, memory[m + 1]!, vbc);
        } else if (phase === Phase.start) {
          atBE = Math.min(vbe, 0);
          atBC = Math.min(vbc, 0);
        }
        if (atBE !== vbe || atBC !== vbc) work.limited = true;
        memory[m] = atBE;
        memory[m + 1] = atBC;
      }
      evaluate(derived, d, atBE, atBC);
      const cBE = result[2]!;
      const cBC = result[3]!;
      const bBE = result[4]!;
      const bBC = result[5]!;
      // Linearised from the evaluated point to x.
      const collector = polarity * (result[0]! + cBE * (vbe - atBE) + cBC * (vbc - atBC));
      const base = polarity * (result[1]! + bBE * (vbe - atBE) + bBC * (vbc - atBC));
      residual[u + COLLECTOR] = collector;
      residual[u + BASE] = base;
      residual[u + EMITTER] = -(collector + base);
      // Rows against collector, base, emitter: V_BC falls with the collector, V_BE with the emitter.
      jacobian[s] = -cBC;
      jacobian[s + 1] = cBE + cBC;
      jacobian[s + 2] = -cBE;
      jacobian[s + 3] = -bBC;
      jacobian[s + 4] = bBE + bBC;
      jacobian[s + 5] = -bBE;
      jacobian[s + 6] = cBC + bBC;
      jacobian[s + 7] = -(cBE + cBC + bBE + bBC);
      jacobian[s + 8] = cBE + bBE;
    }
  },

  read: readBipolar,
};

/** Terminals in the order collector, base, emitter. */
export const bipolar = (
  name: string,
  nodes: readonly [collector: number, base: number, emitter: number],
  parameters: BipolarParameters,
): Element<BipolarOperating> => ({
  name,
  law: bipolarLaw,
  nodes,
  values: Float64Array.of(
    parameters.polarity,
    parameters.saturationCurrent,
    parameters.forwardGain,
    parameters.reverseGain ?? 1,
    parameters.earlyVoltage ?? Infinity,
    parameters.gainTemperatureCoefficient ?? 0.006,
  ),
});
