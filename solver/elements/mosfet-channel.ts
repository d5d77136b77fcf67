/**
 * What a channel law states: its current and slopes for an n-channel in normal roles (V_DS ≥ 0), to which the
 * frame brings every device by its polarity and by exchanging drain and source.
 */
import { REFERENCE_TEMPERATURE, thermalVoltage } from './constants.ts';
import type { Inversion } from './mosfet-operating.ts';

/** Order of a MOSFET's values. */
export const mosfetParameters = [
  'polarity',
  'threshold',
  'gainFactor',
  'lengthModulation',
  'bodyFactor',
  'surfacePotential',
  'slopeFactor',
  'thresholdTemperatureCoefficient',
  'drainResistance',
  'sourceResistance',
  'saturationCurrent',
  'emissionCoefficient',
  'seriesResistance',
  'bandGap',
] as const;

/** Places a channel takes in `derived`. */
export const CHANNEL_SIZE = 8;
/** Threshold of the n-channel equivalent without body effect, V. */
export const THRESHOLD = 0;
/** β at temperature, A/V². */
export const GAIN_FACTOR = 1;
export const LENGTH_MODULATION = 2;
export const BODY_FACTOR = 3;
export const SURFACE_POTENTIAL = 4;
export const SLOPE_FACTOR = 5;
export const THERMAL_VOLTAGE = 6;
/** √(2φ_F), √V. */
export const ROOT_SURFACE_POTENTIAL = 7;

/** Current and slopes of the channel evaluated last: I (A), ∂I/∂V_GS, ∂I/∂V_DS, ∂I/∂V_SB (S). */
export const channelResult = new Float64Array(4);

export interface ChannelState {
  /** V_T with body effect, V, of the n-channel equivalent. */
  readonly threshold: number;
  /** V_DSsat, V. */
  readonly saturationVoltage: number;
  readonly cutoff: boolean;
  readonly inversion?: Inversion;
  readonly inversionCoefficient?: number;
}

export interface Channel {
  /** Evaluates into `channelResult`; `at` is the channel's first place in `derived`. */
  evaluate(derived: Float64Array, at: number, vgs: number, vds: number, vsb: number): void;
  state(derived: Float64Array, at: number, vgs: number, vsb: number): ChannelState;
}

/** What both channel laws work out once per settle: V_T0(T) = V_T0 + a(T − T0), β(T) = β(T/T0)^−1.5. */
export function deriveChannel(
  values: Float64Array,
  temperature: number,
  derived: Float64Array,
  at: number,
): void {
  const polarity = values[0]!;
  derived[at + THRESHOLD] = polarity * (values[1]! + values[7]! * (temperature - REFERENCE_TEMPERATURE));
  derived[at + GAIN_FACTOR] = values[2]! * (temperature / REFERENCE_TEMPERATURE) ** -1.5;
  derived[at + LENGTH_MODULATION] = values[3]!;
  derived[at + BODY_FACTOR] = values[4]!;
  derived[at + SURFACE_POTENTIAL] = values[5]!;
  derived[at + SLOPE_FACTOR] = values[6]!;
  derived[at + THERMAL_VOLTAGE] = thermalVoltage(temperature);
  derived[at + ROOT_SURFACE_POTENTIAL] = Math.sqrt(values[5]!);
}

/**
 * √(2φ_F + V_SB), continued below V_SB = −φ_F along its tangent there: the root's own slope is infinite at −2φ_F,
 * and the junction conducts by then anyway.
 */
export function bodyRoot(surfacePotential: number, vsb: number): number {
  const half = surfacePotential / 2;
  if (vsb >= -half) return Math.sqrt(surfacePotential + vsb);
  return Math.sqrt(half) + (vsb + half) / (2 * Math.sqrt(half));
}

/** Slope of `bodyRoot` against V_SB. */
export const bodyRootSlope = (surfacePotential: number, vsb: number): number =>
  0.5 / Math.sqrt(Math.max(surfacePotential + vsb, surfacePotential / 2));

/** V_T = V_T0 + γ(√(2φ_F + V_SB) − √(2φ_F)), V. */
export function bodyThreshold(derived: Float64Array, at: number, vsb: number): number {
  const bodyFactor = derived[at + BODY_FACTOR]!;
  if (bodyFactor === 0) return derived[at + THRESHOLD]!;
  const root = bodyRoot(derived[at + SURFACE_POTENTIAL]!, vsb);
  return derived[at + THRESHOLD]! + bodyFactor * (root - derived[at + ROOT_SURFACE_POTENTIAL]!);
}
