/**
 * A p-n junction: i = I_S·(e^{(v − i·R_s)/nU_T} − 1) (Shockley 1949), solved for i with Wright's omega where a series
 * resistance is stated, and continued by its tangent above the current where its slope resistance has fallen
 * to 10 mΩ. Temperature: I_S·(T/T0)^(3/n)·exp(−(E_g/nk)(1/T − 1/T0)).
 */
import {
  BOLTZMANN,
  ELEMENTARY_CHARGE,
  JUNCTION_GUARD_RESISTANCE,
  REFERENCE_TEMPERATURE,
  thermalVoltage,
} from './constants.ts';
import { wrightOmega } from './wright-omega.ts';

/** Places a junction takes in `derived`: I_S, nU_T, R_s, tangent's voltage and current, onset of limiting, ln I_S. */
export const JUNCTION_SIZE = 7;
const IS = 0;
const NUT = 1;
const RS = 2;
const TANGENT_VOLTAGE = 3;
const TANGENT_CURRENT = 4;
const ONSET = 5;
const LOG_IS = 6;

/** Saturation current at a temperature (K), A; the band gap in eV. */
export function saturationCurrentAt(
  saturationCurrent: number,
  emissionCoefficient: number,
  bandGap: number,
  temperature: number,
): number {
  const ratio = temperature / REFERENCE_TEMPERATURE;
  const activation = (bandGap * ELEMENTARY_CHARGE) / (emissionCoefficient * BOLTZMANN); // K
  return (
    saturationCurrent *
    ratio ** (3 / emissionCoefficient) *
    Math.exp(-activation * (1 / temperature - 1 / REFERENCE_TEMPERATURE))
  );
}

/** Lays down a junction of exponential scale `scale` (nU_T, V) in `derived`. */
export function deriveJunction(
  logSaturationCurrent: number,
  scale: number,
  seriesResistance: number,
  derived: Float64Array,
  at: number,
): void {
  const saturationCurrent = Math.exp(logSaturationCurrent);
  const room = JUNCTION_GUARD_RESISTANCE - seriesResistance; // Ω left to the exponential at the tangent
  const tangentSum = room > 0 ? scale / room : Infinity; // i + I_S there
  const tangentCurrent = tangentSum - saturationCurrent;
  derived[at + IS] = saturationCurrent;
  derived[at + NUT] = scale;
  derived[at + RS] = seriesResistance;
  derived[at + TANGENT_VOLTAGE] =
    room > 0
      ? scale * (Math.log(tangentSum) - logSaturationCurrent) + tangentCurrent * seriesResistance
      : Infinity;
  derived[at + TANGENT_CURRENT] = tangentCurrent;
  // Below about a microampere of slope nU_T the exponential is too flat to overshoot.
  derived[at + ONSET] = scale * (Math.log(scale / Math.SQRT2) - logSaturationCurrent);
  derived[at + LOG_IS] = logSaturationCurrent;
}

/** A junction of given saturation current at T0, at a temperature (K). */
export function deriveShockley(
  saturationCurrent: number,
  emissionCoefficient: number,
  seriesResistance: number,
  bandGap: number,
  temperature: number,
  derived: Float64Array,
  at: number,
): void {
  const current = saturationCurrentAt(saturationCurrent, emissionCoefficient, bandGap, temperature);
  deriveJunction(
    Math.log(current),
    emissionCoefficient * thermalVoltage(temperature),
    seriesResistance,
    derived,
    at,
  );
}

/** Current (A) and conductance (S) of the junction evaluated last. */
export const junctionResult = new Float64Array(2);

/** Evaluates the junction at `at` of `derived` at voltage `v` into `junctionResult`. */
export function evaluateJunction(derived: Float64Array, at: number, v: number): void {
  const saturationCurrent = derived[at + IS]!;
  const scale = derived[at + NUT]!;
  if (v === 0) {
    // A body tied to its source, as most are.
    junctionResult[0] = 0;
    junctionResult[1] = saturationCurrent / (scale + saturationCurrent * derived[at + RS]!);
    return;
  }
  if (v >= derived[at + TANGENT_VOLTAGE]!) {
    junctionResult[0] =
      derived[at + TANGENT_CURRENT]! + (v - derived[at + TANGENT_VOLTAGE]!) / JUNCTION_GUARD_RESISTANCE;
    junctionResult[1] = 1 / JUNCTION_GUARD_RESISTANCE;
    return;
  }
  if (v < -40 * scale) {
    junctionResult[0] = -saturationCurrent;
    junctionResult[1] = 0;
    return;
  }
  const resistance = derived[at + RS]!;
  if (resistance === 0) {
    const sum = Math.exp(v / scale + derived[at + LOG_IS]!); // i + I_S
    junctionResult[0] = sum - saturationCurrent;
    junctionResult[1] = sum / scale;
    return;
  }
  // With y = (i + I_S)·R_s/nU_T: y + ln y = ln(I_S·R_s/nU_T) + (v + I_S·R_s)/nU_T.
  const z =
    derived[at + LOG_IS]! + Math.log(resistance / scale) + (v + saturationCurrent * resistance) / scale;
  const sum = (wrightOmega(z) * scale) / resistance;
  junctionResult[0] = sum - saturationCurrent;
  junctionResult[1] = sum / (scale + sum * resistance);
}

/**
 * The voltage at which to evaluate next, coming from `from` and asked for `to`: the step is limited in current,
 * to the voltage at which the junction truly carries what its tangent at `from` promised.
 * Without series resistance v = v₀ + nU_T·ln(1 + dv/nU_T).
 */
export function limitJunction(derived: Float64Array, at: number, from: number, to: number): number {
  const onset = derived[at + ONSET]!;
  if (to <= onset || to <= from) return to;
  const tangent = derived[at + TANGENT_VOLTAGE]!;
  if (from >= tangent) return to;
  const scale = derived[at + NUT]!;
  const resistance = derived[at + RS]!;
  const base = Math.max(from, onset);
  if (resistance === 0) return base + scale * Math.log1p((to - base) / scale);
  evaluateJunction(derived, at, base);
  const sum = junctionResult[0]! + derived[at + IS]!;
  const step = junctionResult[1]! * (to - base); // A
  return base + scale * Math.log1p(step / sum) + step * resistance;
}
