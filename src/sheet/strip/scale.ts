/** The slider's axis: two decades, logarithmic, centred on the value with which it was opened. Magnitudes, SI. */
import type { Stock } from '../../desk/desk.ts';
import { quantityOf, type QuantityName } from '../../values/quantities.ts';
import { nearestPreferred, neighbours, preferredBetween } from '../../values/series.ts';

export interface Axis {
  readonly low: number;
  readonly high: number;
}

/** A decade to each side, as far as the quantity's range goes. */
export const axisAbout = (value: number, quantity: QuantityName): Axis => {
  const [least, most] = quantityOf(quantity).range;
  const largest = Math.max(Math.abs(least), Math.abs(most));
  const smallest = least > 0 ? least : 0;
  return { low: Math.max(value / 10, smallest), high: Math.min(value * 10, largest) };
};

/** 0 at the low end, 1 at the high end. The inverse of `valueAt`. */
export const placeOf = ({ low, high }: Axis, value: number): number =>
  Math.log(value / low) / Math.log(high / low);

/** The inverse of `placeOf`. */
export const valueAt = ({ low, high }: Axis, place: number): number =>
  low * (high / low) ** Math.min(1, Math.max(0, place));

const rounded = (value: number): number => Number(value.toPrecision(3));

/** What a slider may stop at: a stocked value, or any of three figures; inside the axis. */
export const allowedNear = (axis: Axis, value: number, { stocked, series }: Stock): number => {
  const near = stocked ? nearestPreferred(series, value) : rounded(value);
  if (near > axis.high * (1 + 1e-9)) return stocked ? neighbours(series, near).down : rounded(axis.high);
  if (near < axis.low * (1 - 1e-9)) return stocked ? neighbours(series, near).up : rounded(axis.low);
  return near;
};

/** The next value up or down: of the series, or by a hundredth. */
export const nextValue = (axis: Axis, value: number, way: 'up' | 'down', stock: Stock): number => {
  if (stock.stocked) {
    const next = neighbours(stock.series, value)[way];
    return next > axis.high * (1 + 1e-9) || next < axis.low * (1 - 1e-9) ? value : next;
  }
  return allowedNear(axis, way === 'up' ? value * 1.01 : value / 1.01, stock);
};

export interface Tick {
  /** 0 … 1. */
  readonly at: number;
  readonly length: 13 | 8 | 5;
}

/** A tick a value: longest for E6, shorter for what E12 and E24 add. */
export const ticksOf = (axis: Axis): readonly Tick[] => {
  const e6 = new Set(preferredBetween('E6', axis.low, axis.high));
  const e12 = new Set(preferredBetween('E12', axis.low, axis.high));
  return preferredBetween('E24', axis.low, axis.high).map((value) => ({
    at: placeOf(axis, value),
    length: e6.has(value) ? 13 : e12.has(value) ? 8 : 5,
  }));
};

/** Values written under the axis: E3, at most seven or eight in two decades. */
export const namedOn = (axis: Axis): readonly number[] => preferredBetween('E3', axis.low, axis.high);
