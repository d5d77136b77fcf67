import type { Limit } from '../../solver/questions/limit.ts';
import type { Ratings } from '../parts/devices/ratings.ts';
import { amperes, celsius, volts, watts } from './words.ts';

/** A rating as a limit on one quantity, with the words for the day it is passed. */
export interface RatingLimit {
  /** As in the stage file: `drainToSource`, `junctionTemperature`. */
  readonly rating: string;
  readonly limit: Limit;
  readonly say: (quantity: number) => string;
}

interface Shape {
  readonly rating: keyof Ratings;
  readonly quantity: string;
  /** Ratings are magnitudes: −1 where the quantity is negative when the rating applies. */
  readonly sign: 1 | -1;
  readonly title: string;
  readonly figure: (value: number) => string;
}

const shape = (
  rating: Shape['rating'],
  quantity: string,
  sign: Shape['sign'],
  title: string,
  figure: Shape['figure'],
): Shape => ({ rating, quantity, sign, title, figure });

const shapes: Readonly<Record<'mosfet' | 'bipolar' | 'diode', readonly Shape[]>> = {
  mosfet: [
    shape('drainToSource', 'drop', 1, 'drain to source', volts),
    shape('gateToSource', 'drive', 1, 'gate to source', volts),
    shape('drainCurrent', 'currentMagnitude', 1, 'drain current', amperes),
  ],
  diode: [
    shape('reverseVoltage', 'voltage', -1, 'reverse voltage', volts),
    shape('forwardCurrent', 'current', 1, 'forward current', amperes),
    shape('zenerCurrent', 'current', -1, 'Zener current', amperes),
  ],
  bipolar: [
    shape('collectorToEmitter', 'drop', 1, 'collector to emitter', volts),
    shape('collectorCurrent', 'currentMagnitude', 1, 'collector current', amperes),
    shape('emitterToBase', 'baseToEmitter', -1, 'emitter to base', volts),
  ],
};

/** How much a part may dissipate, W, and in words why it is that much. */
const allowedPower = (
  ratings: Ratings,
  ambient: number,
): { readonly bound: number; readonly why: string } | null => {
  const { dissipation, junctionTemperature, junctionToAmbient, junctionToCase } = ratings;
  if (dissipation === undefined) return null;
  // Derating that is not stated runs to nothing at the junction's limit (common practice).
  const span = junctionTemperature === undefined ? null : junctionTemperature - dissipation.upTo;
  const derating = ratings.derating ?? (span !== null && span > 0 ? dissipation.value / span : 0);
  if (dissipation.of === 'ambient') {
    const over = Math.max(0, ambient - dissipation.upTo);
    const bound = Math.max(0, dissipation.value - derating * over);
    return { bound, why: over > 0 && derating > 0 ? ` at ${celsius(ambient)} ambient` : '' };
  }
  // The case stands above the ambient by the power through what lies between them: P ≤ P0 − d·(T_A + P·R − T0).
  const outside =
    junctionToAmbient !== undefined && junctionToCase !== undefined
      ? Math.max(0, junctionToAmbient.value - junctionToCase)
      : null;
  if (outside === null) return { bound: dissipation.value, why: ', its case temperature not known' };
  const derated = (dissipation.value - derating * (ambient - dissipation.upTo)) / (1 + derating * outside);
  const bound = Math.max(0, Math.min(dissipation.value, derated));
  return {
    bound,
    why: bound < dissipation.value ? ` with its case warmed at ${celsius(ambient)} ambient` : '',
  };
};

/** T_J = T_A + P·R_θJA, °C; null where no thermal resistance to ambient is stated. */
export const junctionTemperature = (ratings: Ratings, ambient: number, power: number): number | null =>
  ratings.junctionToAmbient === undefined ? null : ambient + power * ratings.junctionToAmbient.value;

const powerLimits = (element: number, ratings: Ratings, ambient: number): readonly RatingLimit[] => {
  const allowed = allowedPower(ratings, ambient);
  const most = (bound: number): Limit => ({ element, quantity: 'power', sense: 'most', bound });
  const limits: RatingLimit[] = [];
  if (allowed !== null) {
    limits.push({
      rating: 'dissipation',
      limit: most(allowed.bound),
      say: (power) =>
        `rating passed: dissipation ${watts(power)}, rated ${watts(allowed.bound)}${allowed.why}`,
    });
  }
  const { junctionTemperature: hottest, junctionToAmbient } = ratings;
  if (hottest !== undefined && junctionToAmbient !== undefined) {
    limits.push({
      rating: 'junctionTemperature',
      limit: most((hottest - ambient) / junctionToAmbient.value),
      say: (power) =>
        `rating passed: junction temperature ${celsius(ambient + power * junctionToAmbient.value)}, ` +
        `rated ${celsius(hottest)}`,
    });
  }
  return limits;
};

/**
 * The ratings of a device as limits of its element.
 *
 * @param family whose quantities they bound: `mosfet`, `bipolar`, or `diode` for all two-pin devices
 * @param polarity −1 for a p-n-p transistor, whose base is reverse biased when it is positive
 * @param ambient °C
 */
export const ratingLimits = (
  family: 'mosfet' | 'bipolar' | 'diode',
  element: number,
  ratings: Ratings,
  polarity: 1 | -1,
  ambient: number,
): readonly RatingLimit[] => [
  ...shapes[family].flatMap(({ rating, quantity, sign: way, title, figure }): readonly RatingLimit[] => {
    const stated = ratings[rating];
    if (typeof stated !== 'number') return [];
    const sign = quantity === 'baseToEmitter' ? way * polarity : way;
    return [
      {
        rating,
        limit: { element, quantity, sense: sign === 1 ? 'most' : 'least', bound: sign * stated },
        say: (value) => `rating passed: ${title} ${figure(Math.abs(value))}, rated ${figure(stated)}`,
      },
    ];
  }),
  ...powerLimits(element, ratings, ambient),
];

/** The power rating of a resistor, W. */
export const powerRating = (element: number, rated: number): RatingLimit => ({
  rating: 'rating',
  limit: { element, quantity: 'power', sense: 'most', bound: rated },
  say: (power) => `rating passed: dissipation ${watts(power)}, rated ${watts(rated)}`,
});
