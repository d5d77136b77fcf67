/**
 * From facts to the parameters of a MOSFET, for one law: V_T0 is what makes the device carry the test current at
 * V_GS(th), gain factor and series resistance are what meets the other figures best (least squares of their logarithms;
 * a figure that is a bound counts only where it is passed). The typical part and the two extreme parts are fitted alike.
 */
import { REFERENCE_TEMPERATURE } from '../elements/constants.ts';
import { conflictsOf } from './conflicts.ts';
import type { Fact, FitReport, FitResult, FreeParameter, Grade } from './fact.ts';
import { grades, gradeWord } from './fact.ts';
import { fitJunction, forwardTargets } from './junctionFit.ts';
import { forwardComparisons, freeOfJunction, withoutCurrent } from './junctionReport.ts';
import type { Attempt, MosfetDefaults } from './mosfetChannelFit.ts';
import { fitChannel, startChannel, thresholdOf } from './mosfetChannelFit.ts';
import type { ChannelParameters, MosfetLaw } from './mosfetModel.ts';
import { onResistance } from './mosfetModel.ts';
import type { FittedMosfet } from './mosfetReport.ts';
import { comparisonsOf, thresholdComparisons } from './mosfetReport.ts';
import type { Measured, MosfetFacts } from './mosfetTargets.ts';
import { measuredFacts, SMALL_CURRENT, targetsOf } from './mosfetTargets.ts';

export interface MosfetFit {
  readonly law: MosfetLaw;
  /** n-channel coordinates: a depletion device has a negative threshold. */
  readonly parts: Readonly<Record<Grade, FittedMosfet>>;
  readonly report: FitReport;
  /** R_DS(on) at 150 °C over that at 25 °C of the typical part, to be shown beside the usual 1.6 … 2. */
  readonly hotOnResistanceRatio: number | undefined;
}

/** 150 °C, K. */
const HOT = 423.15;

export function fitMosfet(
  facts: MosfetFacts,
  law: MosfetLaw,
  defaults: MosfetDefaults,
): FitResult<MosfetFit> {
  const [threshold] = facts.gateThreshold;
  if (threshold === undefined) {
    return { ok: false, reasons: ['Without a gate threshold (gateThreshold) no MOSFET can be fitted.'] };
  }
  const { measured, unused } = measuredFacts(facts, law);
  const fit = fitAll(facts, law, defaults, threshold, measured);
  if (fit === undefined) {
    return {
      ok: false,
      reasons: ['No device of this law carries the test current at the stated gate threshold.'],
    };
  }
  const free = [...fit.free];
  const parts = recordOf((grade): FittedMosfet => {
    const bodyDiode = fitJunction(forwardTargets(facts.bodyDiodeForward, grade, 'bound'), defaults.bodyDiode);
    if (grade === 'typical') free.push(...freeOfJunction(bodyDiode, grade, 'bodyDiode.'));
    return { ...fit.channels[grade], bodyDiode: bodyDiode.junction };
  });
  const comparisons = [
    ...thresholdComparisons(facts, law, threshold, parts),
    ...comparisonsOf(facts, measured, parts),
    ...forwardComparisons(
      'bodyDiodeForward',
      facts.bodyDiodeForward,
      (grade) => parts[grade].bodyDiode,
      'bound',
    ),
  ];
  const [first] = facts.onResistance;
  const hotGate = first?.at.gateToSource ?? (facts.mode === 'depletion' ? 0 : undefined);
  const hotCurrent = first?.at.drainCurrent ?? SMALL_CURRENT;
  return {
    ok: true,
    fit: {
      law,
      parts,
      report: {
        comparisons,
        free,
        conflicts: conflictsOf(comparisons),
        unused: [...unused, ...withoutCurrent('bodyDiodeForward', facts.bodyDiodeForward)],
      },
      hotOnResistanceRatio:
        first === undefined || hotGate === undefined
          ? undefined
          : onResistance(law, parts.typical, hotGate, hotCurrent, HOT) /
            onResistance(law, parts.typical, hotGate, hotCurrent, REFERENCE_TEMPERATURE),
    },
  };
}

const recordOf = <Value>(of: (grade: Grade) => Value): Record<Grade, Value> => ({
  low: of('low'),
  typical: of('typical'),
  high: of('high'),
});

function fitAll(
  facts: MosfetFacts,
  law: MosfetLaw,
  defaults: MosfetDefaults,
  threshold: Fact<'drainCurrent'>,
  measured: readonly Measured[],
):
  | { readonly channels: Readonly<Record<Grade, ChannelParameters>>; readonly free: readonly FreeParameter[] }
  | undefined {
  const free: FreeParameter[] = [];
  const targets = recordOf((grade) => targetsOf(measured, grade, facts.mode));
  const decides = (grade: Grade) => targets[grade].some(({ bound }) => bound === 'equal');
  const fitGrade = (grade: Grade, series: boolean, start?: ChannelParameters) =>
    fitChannel(facts.mode, law, defaults, threshold, grade, targets[grade], series, start);

  // --- Series resistance stays out unless some grade cannot do without, and then is in all: one structure a device ---
  const fitted = (series: boolean) => {
    const found = new Map<Grade, Attempt>();
    for (const grade of grades.filter(decides)) {
      const attempt = fitGrade(grade, series);
      if (attempt === undefined) return undefined;
      found.set(grade, attempt);
    }
    return found;
  };
  const costOf = (found: ReadonlyMap<Grade, Attempt>) =>
    [...found.values()].reduce((sum, { cost }) => sum + cost, 0);
  let chosen = fitted(false);
  let hasSeries = false;
  if (chosen === undefined || costOf(chosen) > 1e-12) {
    const withSeries = fitted(true);
    if (withSeries !== undefined && (chosen === undefined || costOf(withSeries) < 0.999 * costOf(chosen))) {
      chosen = withSeries;
      hasSeries = true;
    }
  }
  if (chosen === undefined) return undefined;

  // --- Grades that nothing decides take gain and series resistance of the nearest that something does ---
  const lender: Readonly<Record<Grade, readonly Grade[]>> = {
    typical: ['high', 'low'],
    high: ['typical', 'low'],
    low: ['typical', 'high'],
  };
  const channels: Partial<Record<Grade, ChannelParameters>> = {};
  for (const grade of grades) {
    const own = chosen.get(grade);
    const from = lender[grade].find((other) => chosen.has(other));
    const lent = from === undefined ? undefined : chosen.get(from)?.channel;
    const attempt = own ?? fitGrade(grade, hasSeries, lent ?? startChannel(defaults));
    if (attempt === undefined) return undefined;
    channels[grade] = attempt.channel;
    const { value, borrowed } = thresholdOf(threshold, grade);
    if (borrowed !== undefined) {
      free.push({
        parameter: 'threshold',
        grade,
        value,
        reason: `no ${gradeWord(grade)} gate threshold is stated: ${borrowed} is taken`,
      });
    }
    if (own === undefined) {
      free.push({
        parameter: 'gainFactor',
        grade,
        value: attempt.channel.gainFactor,
        reason:
          from === undefined
            ? 'no fact determines the gain: a default is taken'
            : `no figure of the ${gradeWord(grade)} part determines the gain: that of the ${gradeWord(from)} part is taken`,
      });
    }
    const equalities = targets[grade].filter(({ bound }) => bound === 'equal').length;
    if (!hasSeries && equalities < 2) {
      free.push({
        parameter: 'drainResistance',
        grade,
        value: 0,
        reason: 'the facts do not tell the channel from what is in series with it',
      });
    }
  }
  free.push({
    parameter: 'lengthModulation',
    grade: 'typical',
    value: defaults.lengthModulation,
    reason: 'no fact determines it: a default is taken',
  });
  const { low, typical, high } = channels;
  if (low === undefined || typical === undefined || high === undefined) return undefined;
  return { channels: { low, typical, high }, free };
}
