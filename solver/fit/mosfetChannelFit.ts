/** One grade of a MOSFET: gain factor and series resistance by least squares, V_T0 from the gate threshold. */
import { RESISTANCE_FLOOR } from '../elements/constants.ts';
import type { Fact, Grade } from './fact.ts';
import type { JunctionDefaults } from './junctionFit.ts';
import { leastSquares } from './leastSquares.ts';
import type { ChannelParameters, MosfetLaw } from './mosfetModel.ts';
import { thresholdFor } from './mosfetModel.ts';
import type { MosfetFacts, Target } from './mosfetTargets.ts';
import { USUAL_DRAIN_VOLTAGE, USUAL_TEST_CURRENT } from './mosfetTargets.ts';
import { findRoot } from './root.ts';

/** What no data sheet determines, or this one does not; n-channel coordinates. */
export interface MosfetDefaults {
  /** A/V². */
  readonly gainFactor: number;
  /** 1/V. */
  readonly lengthModulation: number;
  readonly slopeFactor: number;
  /** V/K. */
  readonly thresholdTemperatureCoefficient: number;
  readonly bodyDiode: JunctionDefaults;
}

export interface Attempt {
  readonly channel: ChannelParameters;
  readonly cost: number;
}

/** Gain factors between which a fit is sought, A/V². */
const GAIN_RANGE = [1e-9, 1e5] as const;
/** The size of the threshold that a grade has, and the end that it was borrowed from where it is not stated. */
export function thresholdOf(
  fact: Fact,
  grade: Grade,
): { readonly value: number; readonly borrowed?: string } {
  const own = fact[grade];
  if (own !== undefined) return { value: own };
  if (fact.typical !== undefined) return { value: fact.typical, borrowed: 'the typical one' };
  if (fact.low !== undefined && fact.high !== undefined) {
    return { value: (fact.low + fact.high) / 2, borrowed: 'the middle of minimum and maximum' };
  }
  return { value: fact.high ?? fact.low ?? 0, borrowed: 'the only one stated' };
}

export const startChannel = (defaults: MosfetDefaults): ChannelParameters => ({
  threshold: 0,
  gainFactor: defaults.gainFactor,
  drainResistance: 0,
  sourceResistance: 0,
  lengthModulation: defaults.lengthModulation,
  slopeFactor: defaults.slopeFactor,
  thresholdTemperatureCoefficient: defaults.thresholdTemperatureCoefficient,
});

/** Fits one grade. Without any figure to be equal to, `start` stands, moved only where it passes a bound. */
export function fitChannel(
  mode: MosfetFacts['mode'],
  law: MosfetLaw,
  defaults: MosfetDefaults,
  threshold: Fact<'drainCurrent'>,
  grade: Grade,
  targets: readonly Target[],
  series: boolean,
  start?: ChannelParameters,
): Attempt | undefined {
  const size = thresholdOf(threshold, grade).value;
  const gate = mode === 'enhancement' ? size : -size;
  const drain = mode === 'enhancement' ? size : USUAL_DRAIN_VOLTAGE;
  const testCurrent = threshold.at.drainCurrent ?? USUAL_TEST_CURRENT;

  const channelOf = (gainFactor: number, drainResistance: number): ChannelParameters | undefined => {
    const rest = {
      ...startChannel(defaults),
      gainFactor,
      drainResistance,
      sourceResistance: series ? RESISTANCE_FLOOR : 0,
    };
    const found = thresholdFor(law, rest, gate, drain, testCurrent, threshold.at.temperature);
    return found === undefined ? undefined : { ...rest, threshold: found };
  };
  const residualsOf = (channel: ChannelParameters | undefined) =>
    targets.map(({ stated, bound, model }) => {
      if (channel === undefined) return 1e3;
      const misfit = Math.log(Math.max(model(channel), 1e-300) / stated);
      if (bound === 'at-most') return Math.max(misfit, 0);
      return bound === 'at-least' ? Math.min(misfit, 0) : misfit;
    });

  const [first] = targets.filter(({ bound }) => bound === 'equal');
  const resistances = targets.flatMap(({ fact, stated }) => (fact === 'onResistance' ? [stated] : []));
  const greatest = Math.max(Math.min(...resistances, 1e6), 2 * RESISTANCE_FLOOR);
  const shareOf = (resistance: number) => resistance / greatest;
  const [lowest, highest] = GAIN_RANGE.map(Math.log);
  let best: Attempt | undefined;
  for (const share of series ? [0.05, 0.3, 0.6, 0.9] : [0]) {
    const resistance = start?.drainResistance ?? share * greatest;
    const excess = (logGain: number) => {
      const [misfit = 0] =
        first === undefined ? [] : residualsOfOne(channelOf(Math.exp(logGain), resistance), first);
      return misfit;
    };
    const logGain =
      first === undefined
        ? Math.log(start?.gainFactor ?? defaults.gainFactor)
        : (findRoot(excess, lowest ?? 0, highest ?? 0) ?? Math.log(defaults.gainFactor));
    const box = {
      low: [lowest ?? 0, shareOf(RESISTANCE_FLOOR)].slice(0, series ? 2 : 1),
      high: [highest ?? 0, 1].slice(0, series ? 2 : 1),
    };
    const at = ([x = 0, y = 0]: readonly number[]) =>
      channelOf(Math.exp(x), series ? Math.max(y * greatest, RESISTANCE_FLOOR) : 0);
    const found = leastSquares(
      (x) => residualsOf(at(x)),
      series ? [logGain, shareOf(resistance)] : [logGain],
      box,
    );
    const channel = at(found.x);
    if (channel !== undefined && (best === undefined || found.cost < best.cost)) {
      best = { channel, cost: found.cost };
    }
  }
  return best;
}

const residualsOfOne = (channel: ChannelParameters | undefined, { model, stated }: Target) =>
  channel === undefined ? [NaN] : [Math.log(Math.max(model(channel), 1e-300) / stated)];
