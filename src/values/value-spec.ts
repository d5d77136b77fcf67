import { checkPlain, checkValue } from './check-value.ts';
import type { QuantityName } from './quantities.ts';

/** A number in SI base units, or the text as a person typed it. */
export type PlainValue = number | string;

/** A value with its hard limits: a tolerance as a fraction, or the two limits themselves. */
export type SpreadValue =
  | { readonly value: PlainValue; readonly tolerance: number; readonly sigma?: PlainValue }
  | {
      readonly value: PlainValue;
      readonly low: PlainValue;
      readonly high: PlainValue;
      readonly sigma?: PlainValue;
    };

/** A value as the stage file holds it: as typed, with or without a spread. */
export type ValueSpec = PlainValue | SpreadValue;

/** What a value comes to, in SI base units (°C for temperatures). Without a spread low = nominal = high. */
export interface ResolvedValue {
  readonly nominal: number;
  readonly low: number;
  readonly high: number;
  /** Standard deviation, where one is given. */
  readonly sigma?: number;
  /** The fraction, where the spread was stated as one. */
  readonly tolerance?: number;
}

/**
 * What a value of a document that was read comes to.
 * @throws Error where the value was never checked: a programmer's mistake, not a person's.
 */
export function resolveValue(spec: ValueSpec, quantity: QuantityName): ResolvedValue {
  const result = checkValue(spec, quantity);
  if (!result.ok) throw new Error(`unchecked ${quantity}: ${result.faults[0]?.message ?? 'refused'}`);
  return result.value;
}

/** As `resolveValue`, for a value that has no spread. */
export function resolvePlain(value: PlainValue, quantity: QuantityName): number {
  const result = checkPlain(value, quantity);
  if (!result.ok) throw new Error(`unchecked ${quantity}: ${result.faults[0]?.message ?? 'refused'}`);
  return result.value;
}
