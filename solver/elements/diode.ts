/**
 * Diode, LED and Zener: Shockley's junction with emission coefficient and series resistance; in reverse, where a
 * breakdown is stated, an exponential through −I_Z at −V_Z with slope resistance Z_Z; the declared leak.
 */
import type { Element } from '../circuit.ts';
import { REFERENCE_TEMPERATURE, SILICON_BAND_GAP, thermalVoltage } from './constants.ts';
import {
  deriveJunction,
  evaluateJunction,
  JUNCTION_SIZE,
  junctionResult,
  limitJunction,
  saturationCurrentAt,
} from './junction.ts';
import { Phase, type ElementLaw } from './law.ts';
import { conductancePattern, readTwoTerminal, type TwoTerminalOperating } from './two-terminal.ts';

export type DiodeRegion = 'conducting' | 'blocking' | 'breakdown';

export interface DiodeParameters {
  /** I_S at 25 °C, A. */
  readonly saturationCurrent: number;
  /** 1. */
  readonly emissionCoefficient?: number;
  /** Ω; 0, with the junction's tangent at 10 mΩ all the same. */
  readonly seriesResistance?: number;
  /** eV; 1.12 (silicon). */
  readonly bandGap?: number;
  /** Change of the forward voltage at `coefficientCurrent`, V/K; in place of the band gap's. */
  readonly forwardTemperatureCoefficient?: number;
  /** A; 10 mA. */
  readonly coefficientCurrent?: number;
}

export interface ZenerParameters extends DiodeParameters {
  /** V_Z, V, a magnitude. */
  readonly breakdownVoltage: number;
  /** I_Z, A, a magnitude. */
  readonly breakdownCurrent: number;
  /** Z_Z at I_Z, Ω. */
  readonly breakdownResistance: number;
  /** V/K, of the magnitude V_Z; 0. */
  readonly breakdownTemperatureCoefficient?: number;
}

export interface DiodeOperating extends TwoTerminalOperating {
  readonly region: DiodeRegion;
}

/** Current above which a diode counts as conducting, or in reverse as broken down, A. */
const CONDUCTING_CURRENT = 1e-6;

const parameters = [
  'saturationCurrent',
  'emissionCoefficient',
  'seriesResistance',
  'bandGap',
  'forwardTemperatureCoefficient',
  'coefficientCurrent',
  'breakdownVoltage',
  'breakdownCurrent',
  'breakdownResistance',
  'breakdownTemperatureCoefficient',
];

/** ln I_S at a temperature, by the band gap or so that the forward voltage has the stated coefficient. */
function logSaturationCurrent(values: Float64Array, temperature: number): number {
  const emission = values[1]!;
  const coefficient = values[4]!;
  if (Number.isNaN(coefficient))
    return Math.log(saturationCurrentAt(values[0]!, emission, values[3]!, temperature));
  const logCurrent = Math.log(values[5]!);
  const forward = emission * thermalVoltage(REFERENCE_TEMPERATURE) * (logCurrent - Math.log(values[0]!));
  const hot = forward + coefficient * (temperature - REFERENCE_TEMPERATURE); // V at coefficientCurrent
  return logCurrent - hot / (emission * thermalVoltage(temperature));
}

/**
 * Breakdown as a junction that conducts in reverse, zero at zero: i = I_Z·(e^{v/a} − 1)/(e^{V_Z/a} − 1), with the scale
 * a such that the slope at V_Z is 1/Z_Z: a·(1 − e^{−V_Z/a}) = I_Z·Z_Z, found by repetition.
 */
function deriveBreakdown(values: Float64Array, temperature: number, derived: Float64Array, at: number): void {
  const voltage = Math.max(values[6]! + values[9]! * (temperature - REFERENCE_TEMPERATURE), 1e-3);
  const current = values[7]!;
  const drop = Math.min(current * values[8]!, 0.9 * voltage); // steeper than a resistor, or it is none
  let scale = drop;
  for (let pass = 0; pass < 60; pass++) scale = drop / -Math.expm1(-voltage / scale);
  const exponent = voltage / scale;
  // ln(I_Z/(e^x − 1))
  deriveJunction(Math.log(current) - exponent - Math.log(-Math.expm1(-exponent)), scale, 0, derived, at);
}

function diodeLaw(breakdown: boolean): ElementLaw<DiodeOperating> {
  const derivedSize = 1 + JUNCTION_SIZE * (breakdown ? 2 : 1);
  const forwardAt = 1;
  const reverseAt = 1 + JUNCTION_SIZE;
  return {
    name: breakdown ? 'zener' : 'diode',
    terminals: ['anode', 'cathode'],
    parameters: breakdown ? parameters : parameters.slice(0, 6),
    internals: [],
    branches: [],
    pattern: conductancePattern,
    senses: [],
    derivedSize,
    memorySize: 1,
    paths: () => [{ kind: 'junction', from: 0, to: 1 }],

    derive(values, { temperature, leak }, derived, at) {
      derived[at] = leak;
      deriveJunction(
        logSaturationCurrent(values, temperature),
        values[1]! * thermalVoltage(temperature),
        values[2]!,
        derived,
        at + forwardAt,
      );
      if (breakdown) deriveBreakdown(values, temperature, derived, at + reverseAt);
    },

    load(work, batch) {
      const { x, residual, jacobian, derived, memory, phase } = work;
      let { unknown: u, slot: s, derived: d, memory: m } = batch;
      for (let k = 0; k < batch.count; k++, u += 2, s += 4, d += derivedSize, m++) {
        const voltage = x[u]! - x[u + 1]!;
        let evaluated = voltage;
        if (phase !== Phase.exact) {
          if (phase === Phase.limit) {
            const from = memory[m]!;
            evaluated = limitJunction(derived, d + forwardAt, from, voltage);
            if (breakdown) evaluated = -limitJunction(derived, d + reverseAt, -from, -evaluated);
          } else if (phase === Phase.start) evaluated = 0;
          if (evaluated !== voltage) work.limited = true;
          memory[m] = evaluated;
        }
        evaluateJunction(derived, d + forwardAt, evaluated);
        let current = junctionResult[0]!;
        let conductance = junctionResult[1]! + derived[d]!;
        if (breakdown) {
          evaluateJunction(derived, d + reverseAt, -evaluated);
          current -= junctionResult[0]!;
          conductance += junctionResult[1]!;
        }
        // Linearised from the evaluated point to x.
        current += derived[d]! * evaluated + conductance * (voltage - evaluated);
        residual[u] = current;
        residual[u + 1] = -current;
        jacobian[s] = jacobian[s + 3] = conductance;
        jacobian[s + 1] = jacobian[s + 2] = -conductance;
      }
    },

    read(at) {
      const figures = readTwoTerminal(at);
      let reverse = 0;
      if (breakdown) {
        evaluateJunction(at.derived, reverseAt, -figures.voltage);
        reverse = junctionResult[0]!;
      }
      const region =
        figures.current > CONDUCTING_CURRENT
          ? 'conducting'
          : reverse > CONDUCTING_CURRENT
            ? 'breakdown'
            : 'blocking';
      return { ...figures, region };
    },
  };
}

const plainLaw = diodeLaw(false);
const zenerLaw = diodeLaw(true);

const junctionValues = (parameters: DiodeParameters): number[] => [
  parameters.saturationCurrent,
  parameters.emissionCoefficient ?? 1,
  parameters.seriesResistance ?? 0,
  parameters.bandGap ?? SILICON_BAND_GAP,
  parameters.forwardTemperatureCoefficient ?? NaN, // NaN: by the band gap
  parameters.coefficientCurrent ?? 0.01,
];

/** A diode or an LED. */
export const diode = (
  name: string,
  nodes: readonly [anode: number, cathode: number],
  parameters: DiodeParameters,
): Element<DiodeOperating> => ({
  name,
  law: plainLaw,
  nodes,
  values: Float64Array.from(junctionValues(parameters)),
});

export const zener = (
  name: string,
  nodes: readonly [anode: number, cathode: number],
  parameters: ZenerParameters,
): Element<DiodeOperating> => ({
  name,
  law: zenerLaw,
  nodes,
  values: Float64Array.from([
    ...junctionValues(parameters),
    parameters.breakdownVoltage,
    parameters.breakdownCurrent,
    parameters.breakdownResistance,
    parameters.breakdownTemperatureCoefficient ?? 0,
  ]),
});
