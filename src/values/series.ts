/**
 * Preferred values of IEC 60063. E48, E96 and E192 are the rounded geometric series of three figures (with the
 * one exception of the standard, 9.20 in E192); E24 and its sub-series are the standard's own two-figure table,
 * which is not everywhere the rounded series.
 */
export const seriesNames = ['E3', 'E6', 'E12', 'E24', 'E48', 'E96', 'E192'] as const;
export type SeriesName = (typeof seriesNames)[number];

/** IEC 60063, E24, in tenths. */
const e24 = [10, 11, 12, 13, 15, 16, 18, 20, 22, 24, 27, 30, 33, 36, 39, 43, 47, 51, 56, 62, 68, 75, 82, 91];

const everyNth = (step: number) => e24.filter((_, index) => index % step === 0).map((value) => value * 10);

/** Three figures, as hundredths: round(100·10^(i/count)). */
const geometric = (count: number) =>
  Array.from({ length: count }, (_, index) => {
    const rounded = Math.round(100 * 10 ** (index / count));
    return count === 192 && rounded === 919 ? 920 : rounded; // the standard's exception
  });

/** One decade, in hundredths: 100 … 999. */
const decades: Readonly<Record<SeriesName, readonly number[]>> = {
  E3: everyNth(8),
  E6: everyNth(4),
  E12: everyNth(2),
  E24: everyNth(1),
  E48: geometric(48),
  E96: geometric(96),
  E192: geometric(192),
};

/** The values of one decade, 1 … 9.99. */
export const seriesValues = (series: SeriesName): readonly number[] =>
  decades[series].map((hundredths) => hundredths / 100);

/** Hundredths times a power of ten as the nearest double, so that 4.7 kΩ is 4700 and not 4699.999… */
const exactly = (hundredths: number, decade: number) => Number(`${hundredths}e${decade - 2}`);

/** A value of the series as its place: which decade, which of the decade's values. */
interface Place {
  readonly decade: number;
  readonly index: number;
}

const valueAt = (series: SeriesName, { decade, index }: Place): number => {
  const values = decades[series];
  const wrapped = ((index % values.length) + values.length) % values.length;
  return exactly(values[wrapped] ?? 100, decade + Math.floor(index / values.length));
};

/** The place of the largest value of the series that is not above `value`. */
function placeBelow(series: SeriesName, value: number): Place {
  if (!(value > 0) || !Number.isFinite(value)) throw new RangeError(`no preferred value near ${value}`);
  // The logarithm may land one off at a decade's edge; the search starts a decade low and walks up.
  const decade = Math.floor(Math.log10(value)) - 1;
  let index = 0;
  while (valueAt(series, { decade, index: index + 1 }) <= value) index += 1;
  return { decade, index };
}

const step = (place: Place, by: number): Place => ({ decade: place.decade, index: place.index + by });

/** The largest value of the series at or below `value` (> 0). */
export const preferredAtOrBelow = (series: SeriesName, value: number): number =>
  valueAt(series, placeBelow(series, value));

/** The smallest value of the series at or above `value` (> 0). */
export function preferredAtOrAbove(series: SeriesName, value: number): number {
  const place = placeBelow(series, value);
  const below = valueAt(series, place);
  return below === value ? below : valueAt(series, step(place, 1));
}

/** The neighbours of `value` (> 0) in the series: the next below and the next above, both other than `value`. */
export function neighbours(
  series: SeriesName,
  value: number,
): { readonly down: number; readonly up: number } {
  const place = placeBelow(series, value);
  const onValue = valueAt(series, place) === value;
  return { down: valueAt(series, step(place, onValue ? -1 : 0)), up: valueAt(series, step(place, 1)) };
}

/** The value of the series nearest to `value` (> 0) in ratio; the lower of two that are equally near. */
export function nearestPreferred(series: SeriesName, value: number): number {
  const place = placeBelow(series, value);
  const below = valueAt(series, place);
  const above = valueAt(series, step(place, 1));
  return value / below <= above / value ? below : above;
}

/** Every value of the series in [low, high], both > 0, rising. */
export function preferredBetween(series: SeriesName, low: number, high: number): readonly number[] {
  const found: number[] = [];
  let place = placeBelow(series, low);
  for (let value = valueAt(series, place); value <= high; value = valueAt(series, place)) {
    if (value >= low) found.push(value);
    place = step(place, 1);
  }
  return found;
}

/** Whether `value` is one of the series', to the digit. */
export const isPreferred = (series: SeriesName, value: number): boolean =>
  preferredAtOrBelow(series, value) === value;
