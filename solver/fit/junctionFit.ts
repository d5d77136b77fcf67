/** Fits Shockley's law to forward voltages at currents, through the solver's own junction. SI units, kelvin. */
import { deriveShockley, evaluateJunction, JUNCTION_SIZE, junctionResult } from '../elements/junction.ts';
import type { Bound, Fact, Grade } from './fact.ts';
import { leastSquares } from './leastSquares.ts';
import { findRoot } from './root.ts';

/** At 25 °C. */
export interface JunctionParameters {
  /** A. */
  readonly saturationCurrent: number;
  readonly emissionCoefficient: number;
  /** Ω. */
  readonly seriesResistance: number;
  /** eV. */
  readonly bandGap: number;
}

const derived = new Float64Array(JUNCTION_SIZE);

/** Forward voltage at a current (A), V. */
export function forwardVoltage(junction: JunctionParameters, current: number, temperature: number): number {
  const { saturationCurrent, emissionCoefficient, seriesResistance, bandGap } = junction;
  deriveShockley(saturationCurrent, emissionCoefficient, seriesResistance, bandGap, temperature, derived, 0);
  const excess = (voltage: number) => {
    evaluateJunction(derived, 0, voltage);
    return (junctionResult[0] ?? 0) - current;
  };
  return findRoot(excess, 0, 1e4) ?? 0;
}

export interface ForwardTarget {
  readonly index: number;
  readonly figure: Grade;
  readonly bound: Bound;
  /** V. */
  readonly stated: number;
  /** A. */
  readonly current: number;
  /** K. */
  readonly temperature: number;
}

/**
 * What a part of this grade has to meet, of the facts that state their current. A figure that is a fact's only one is
 * taken for every grade, or as a mere bound where `soleFigure` says so.
 */
export const forwardTargets = (
  facts: readonly Fact<'current'>[],
  grade: Grade,
  soleFigure: 'value' | 'bound',
): readonly ForwardTarget[] =>
  facts.flatMap((fact, index) => {
    const { current, temperature } = fact.at;
    if (current === undefined || !(current > 0)) return [];
    const target = (figure: Grade, bound: Bound, stated: number): readonly ForwardTarget[] => [
      { index, figure, bound, stated, current, temperature },
    ];
    const own = fact[grade];
    const isSole = fact.typical === undefined && (fact.low === undefined) !== (fact.high === undefined);
    if (isSole && soleFigure === 'bound') {
      return fact.high === undefined
        ? target('low', 'at-least', fact.low ?? 0)
        : target('high', 'at-most', fact.high);
    }
    if (own !== undefined) return target(grade, 'equal', own);
    if (fact.typical !== undefined) return target('typical', 'equal', fact.typical);
    if (fact.low !== undefined && fact.high !== undefined) {
      return target('typical', 'equal', (fact.low + fact.high) / 2);
    }
    return fact.high === undefined
      ? target('low', 'equal', fact.low ?? 0)
      : target('high', 'equal', fact.high);
  });

export interface JunctionDefaults extends JunctionParameters {
  /** Limits of the emission coefficient: outside of them the series resistance has to explain the voltages. */
  readonly emissionRange: readonly [number, number];
}

export interface JunctionFit {
  readonly junction: JunctionParameters;
  /** Which parameters the facts determined. */
  readonly determined: readonly (keyof JunctionParameters)[];
}

/** Root mean square misfit below which nothing further needs to be freed. */
const CLOSE = 1e-7;

/**
 * One voltage determines I_S, two the emission coefficient too, three the series resistance; two that no emission
 * coefficient within its limits explains free the series resistance at the limit. What is not determined keeps its
 * default.
 */
export function fitJunction(targets: readonly ForwardTarget[], defaults: JunctionDefaults): JunctionFit {
  const equal = targets.filter(({ bound }) => bound === 'equal');
  const start = saturationCurrentFor(equal[0] ?? targets[0], defaults, equal.length === 0);
  const [lowest, highest] = defaults.emissionRange;
  const greatestSeries = Math.min(...targets.map(({ stated, current }) => stated / current), 1e6);
  const attempts = equal.length >= 3 ? [3] : equal.length === 2 ? [2, 3] : [1];

  let best:
    { readonly junction: JunctionParameters; readonly cost: number; readonly unknowns: number } | undefined;
  for (const unknowns of attempts) {
    if (best !== undefined && Math.sqrt(best.cost) < CLOSE) break;
    const junctionOf = ([logCurrent = 0, emission, series]: readonly number[]): JunctionParameters => ({
      saturationCurrent: Math.exp(logCurrent),
      emissionCoefficient: emission ?? defaults.emissionCoefficient,
      seriesResistance: series === undefined ? defaults.seriesResistance : series * greatestSeries,
      bandGap: defaults.bandGap,
    });
    const residuals = (x: readonly number[]) =>
      targets.map(({ stated, current, temperature, bound }) => {
        const misfit = forwardVoltage(junctionOf(x), current, temperature) / stated - 1;
        if (bound === 'at-most') return Math.max(misfit, 0);
        return bound === 'at-least' ? Math.min(misfit, 0) : misfit;
      });
    for (const series of unknowns === 3 ? [0, 0.3, 0.7] : [0]) {
      const found = leastSquares(
        residuals,
        [Math.log(start), defaults.emissionCoefficient, series].slice(0, unknowns),
        {
          low: [Math.log(1e-40), lowest, 0].slice(0, unknowns),
          high: [Math.log(1), highest, 1].slice(0, unknowns),
        },
      );
      if (best === undefined || found.cost < best.cost) {
        best = { junction: junctionOf(found.x), cost: found.cost, unknowns };
      }
    }
  }
  const junction = best?.junction ?? defaults;
  const names = ['saturationCurrent', 'emissionCoefficient', 'seriesResistance'] as const;
  return { junction, determined: equal.length === 0 ? [] : names.slice(0, best?.unknowns ?? 0) };
}

/** The saturation current that meets one voltage with the defaults for the rest, A. */
function saturationCurrentFor(
  target: ForwardTarget | undefined,
  defaults: JunctionDefaults,
  isOnlyBound: boolean,
): number {
  if (target === undefined || isOnlyBound) return defaults.saturationCurrent;
  const excess = (logCurrent: number) =>
    forwardVoltage(
      { ...defaults, saturationCurrent: Math.exp(logCurrent) },
      target.current,
      target.temperature,
    ) - target.stated;
  const found = findRoot(excess, Math.log(1e-40), Math.log(1));
  return found === undefined ? defaults.saturationCurrent : Math.exp(found);
}
