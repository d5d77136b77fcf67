import { describe, expect, it } from 'vitest';
import { keeps } from '../../../solver/questions/limit.ts';
import { junctionTemperature, ratingLimits } from '../../../src/readings/ratings.ts';

type Stated = Parameters<typeof ratingLimits>[2];

/** Ratings passed by a point made up here, with their words. */
const passed = (
  ratings: Stated,
  figures: Readonly<Record<string, number>>,
  {
    family = 'mosfet',
    ambient = 25,
    polarity = 1,
  }: { family?: 'mosfet' | 'bipolar' | 'diode'; ambient?: number; polarity?: 1 | -1 } = {},
) =>
  ratingLimits(family, 0, ratings, polarity, ambient).flatMap(({ rating, limit, say }) => {
    const figure = figures[limit.quantity];
    if (figure === undefined) throw new Error(`no ${limit.quantity}`);
    return keeps(limit, figure) ? [] : [[rating, say(figure)]];
  });

describe('ratings', () => {
  const atRest = { drop: 60, drive: 20, currentMagnitude: 0.3, power: 0.35 };

  it('are kept at their figure and passed beyond it', () => {
    const ratings: Stated = { drainToSource: 60, gateToSource: 20, drainCurrent: 0.3 };
    expect(passed(ratings, atRest)).toEqual([]);
    expect(passed(ratings, { ...atRest, drop: 62, currentMagnitude: 0.4 })).toEqual([
      ['drainToSource', 'rating passed: drain to source 62 V, rated 60 V'],
      ['drainCurrent', 'rating passed: drain current 400 mA, rated 300 mA'],
    ]);
  });

  it('of a diode bound its reverse voltage and its current each way', () => {
    const ratings: Stated = { reverseVoltage: 40, forwardCurrent: 1, zenerCurrent: 0.02 };
    const of = { family: 'diode' } as const;
    expect(passed(ratings, { voltage: -40, current: 0, power: 0 }, of)).toEqual([]);
    expect(passed(ratings, { voltage: -41, current: -0.03, power: 0 }, of).map(([rating]) => rating)).toEqual(
      ['reverseVoltage', 'zenerCurrent'],
    );
    expect(passed(ratings, { voltage: 0.9, current: 1.1, power: 0 }, of).map(([rating]) => rating)).toEqual([
      'forwardCurrent',
    ]);
  });

  it('of the emitter bound a base biased in reverse, for both polarities', () => {
    const ratings: Stated = { emitterToBase: 5 };
    const figures = { drop: 0, currentMagnitude: 0, power: 0 };
    expect(passed(ratings, { ...figures, baseToEmitter: -6 }, { family: 'bipolar' })).toHaveLength(1);
    expect(passed(ratings, { ...figures, baseToEmitter: 6 }, { family: 'bipolar' })).toEqual([]);
    expect(
      passed(ratings, { ...figures, baseToEmitter: 6 }, { family: 'bipolar', polarity: -1 }),
    ).toHaveLength(1);
  });

  it('of dissipation fall with the ambient by the stated derating', () => {
    // 0.35 W up to 25 °C, 2.8 mW/K: at 60 °C 0.35 − 35·0.0028 = 0.252 W.
    const ratings: Stated = {
      dissipation: { value: 0.35, upTo: 25, of: 'ambient', conditionStated: true },
      derating: 0.0028,
    };
    expect(passed(ratings, { power: 0.252 }, { ambient: 60 })).toEqual([]);
    expect(passed(ratings, { power: 0.26 }, { ambient: 60 })).toEqual([
      ['dissipation', 'rating passed: dissipation 260 mW, rated 252 mW at 60 °C ambient'],
    ]);
    expect(passed(ratings, { power: 0.35 }, { ambient: 0 })).toEqual([]);
  });

  it('of dissipation fall to nothing at the junction limit where no derating is stated (common practice)', () => {
    const ratings: Stated = {
      dissipation: { value: 0.5, upTo: 25, of: 'ambient', conditionStated: false },
      junctionTemperature: 150,
    };
    // Half of the way from 25 to 150 °C: half of the power.
    expect(passed(ratings, { power: 0.25 }, { ambient: 87.5 })).toEqual([]);
    expect(passed(ratings, { power: 0.26 }, { ambient: 87.5 })).toHaveLength(1);
  });

  it('of dissipation at a case are met by the case, warmed through what lies between it and the ambient', () => {
    // 20 W to 25 °C case, 0.16 W/K; 62 K/W to ambient of which 2 K/W inside: T_C = 25 + 60·P, so that
    // P ≤ 20 − 0.16·60·P, P ≤ 20/10.6 = 1.8868 W.
    const ratings: Stated = {
      dissipation: { value: 20, upTo: 25, of: 'case', conditionStated: true },
      derating: 0.16,
      junctionToCase: 2,
      junctionToAmbient: { value: 62 },
    };
    expect(passed(ratings, { power: 1.886 })).toEqual([]);
    expect(passed(ratings, { power: 1.888 })).toHaveLength(1);
  });

  it('of the junction bound the power through the thermal resistance', () => {
    // 5.58 mW through 357 K/W at 25 °C is 27 °C.
    const ratings: Stated = { junctionTemperature: 150, junctionToAmbient: { value: 357 } };
    expect(junctionTemperature(ratings, 25, 5.58e-3)).toBeCloseTo(26.992, 3);
    expect(passed(ratings, { power: 0.35 })).toEqual([]);
    expect(passed(ratings, { power: 0.36 })).toEqual([
      ['junctionTemperature', 'rating passed: junction temperature 153.5 °C, rated 150 °C'],
    ]);
  });
});
