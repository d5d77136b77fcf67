/**
 * From facts to the parameters of a bipolar transistor (transport form of Ebers and Moll 1954): I_S from V_BE, the
 * forward gain from h_FE, the Early voltage from the output conductance, the reverse gain from V_CE(sat).
 */
import { REFERENCE_TEMPERATURE, SILICON_BAND_GAP, thermalVoltage } from '../elements/constants.ts';
import { saturationCurrentAt } from '../elements/junction.ts';
import { conflictsOf } from './conflicts.ts';
import type { Comparison, Fact, FitReport, FitResult, FreeParameter, Grade, UnusedFact } from './fact.ts';
import { grades, misfitOf } from './fact.ts';

/** SI units, kelvin; any list save the first may be empty. */
export interface BipolarFacts {
  readonly currentGain: readonly Fact<'collectorCurrent' | 'collectorToEmitter'>[];
  readonly baseToEmitter: readonly Fact<'collectorCurrent'>[];
  readonly saturationVoltage: readonly Fact<'collectorCurrent' | 'baseCurrent'>[];
  readonly outputConductance: readonly Fact<'collectorCurrent'>[];
}

export interface BipolarDefaults {
  readonly saturationCurrent: number;
  readonly reverseGain: number;
  /** Of the forward gain, 1/K. */
  readonly gainTemperatureCoefficient: number;
}

export interface BipolarFit {
  /** A; the low one goes with the high V_BE. */
  readonly saturationCurrent: Readonly<Record<Grade, number>>;
  readonly forwardGain: Readonly<Record<Grade, number>>;
  readonly reverseGain: number;
  /** V; undefined where no fact determines it: no Early effect. */
  readonly earlyVoltage: number | undefined;
  readonly report: FitReport;
}

/** V_CE of a gain where none is stated, V (common practice). */
const USUAL_COLLECTOR_VOLTAGE = 5;
/** Least reverse gain that is fitted: what is missing then is a resistance that this law does not have. */
const LEAST_REVERSE_GAIN = 1e-3;

type Model = Omit<BipolarFit, 'report'>;

export function fitBipolar(facts: BipolarFacts, defaults: BipolarDefaults): FitResult<BipolarFit> {
  const [gain] = facts.currentGain;
  if (gain === undefined) {
    return {
      ok: false,
      reasons: ['Without a current gain (currentGain) no bipolar transistor can be fitted.'],
    };
  }
  const free: FreeParameter[] = [];
  const unused: UnusedFact[] = [];
  const isFree = (parameter: string, value: number, reason: string) =>
    free.push({ parameter, grade: 'typical', value, reason });

  const earlyVoltage = earlyVoltageOf(facts, unused);
  if (earlyVoltage === undefined) isFree('earlyVoltage', Infinity, 'no fact determines it: no Early effect');

  const modulation = early(earlyVoltage, gain.at.collectorToEmitter ?? USUAL_COLLECTOR_VOLTAGE);
  const warmth = warmthOf(defaults, gain.at.temperature);
  const forwardGain = recordOf((grade) => figureOf(gain, grade) / modulation / warmth);

  const saturationCurrent = saturationCurrentsOf(facts, unused) ?? recordOf(() => defaults.saturationCurrent);
  if (facts.baseToEmitter.every(({ at }) => at.collectorCurrent === undefined)) {
    isFree('saturationCurrent', defaults.saturationCurrent, 'no fact determines it: a default is taken');
  }

  const reverseGain = reverseGainOf(facts, forwardGain.typical, defaults, unused);
  if (reverseGain === undefined) {
    isFree('reverseGain', defaults.reverseGain, 'no fact determines it: a default is taken');
  }
  const model = {
    saturationCurrent,
    forwardGain,
    reverseGain: reverseGain ?? defaults.reverseGain,
    earlyVoltage,
  };
  const comparisons = comparisonsOf(facts, model, defaults);
  return {
    ok: true,
    fit: { ...model, report: { comparisons, free, conflicts: conflictsOf(comparisons), unused } },
  };
}

const recordOf = (of: (grade: Grade) => number): Readonly<Record<Grade, number>> => ({
  low: of('low'),
  typical: of('typical'),
  high: of('high'),
});

/** The figure of a grade: its own, else the typical one, else the middle, else the only one. */
const figureOf = (fact: Fact, grade: Grade): number => {
  const own = fact[grade] ?? fact.typical;
  if (own !== undefined) return own;
  const { low, high } = fact;
  return low !== undefined && high !== undefined ? Math.sqrt(low * high) : (low ?? high ?? 0);
};

const early = (earlyVoltage: number | undefined, collectorToEmitter: number) =>
  earlyVoltage === undefined ? 1 : 1 + collectorToEmitter / earlyVoltage;

const warmthOf = ({ gainTemperatureCoefficient }: BipolarDefaults, temperature: number) =>
  1 + gainTemperatureCoefficient * (temperature - REFERENCE_TEMPERATURE);

/** I_S of the typical silicon junction at a temperature over that at 25 °C. */
const growth = (temperature: number) => saturationCurrentAt(1, 1, SILICON_BAND_GAP, temperature);

function earlyVoltageOf({ outputConductance }: BipolarFacts, unused: UnusedFact[]): number | undefined {
  let found: number | undefined;
  outputConductance.forEach((fact, index) => {
    const { collectorCurrent } = fact.at;
    if (collectorCurrent === undefined) {
      unused.push({ fact: 'outputConductance', index, reason: 'its collector current is not stated' });
      return;
    }
    found ??= collectorCurrent / figureOf(fact, 'typical');
  });
  return found;
}

function saturationCurrentsOf(
  { baseToEmitter }: BipolarFacts,
  unused: UnusedFact[],
): Readonly<Record<Grade, number>> | undefined {
  let found: Readonly<Record<Grade, number>> | undefined;
  baseToEmitter.forEach((fact, index) => {
    const { collectorCurrent, temperature } = fact.at;
    if (collectorCurrent === undefined) {
      unused.push({ fact: 'baseToEmitter', index, reason: 'its collector current is not stated' });
      return;
    }
    const at = (voltage: number) =>
      collectorCurrent / Math.expm1(voltage / thermalVoltage(temperature)) / growth(temperature);
    found ??= {
      low: at(figureOf(fact, 'high')),
      typical: at(figureOf(fact, 'typical')),
      high: at(figureOf(fact, 'low')),
    };
  });
  return found;
}

/** V_CE(sat) = U_T·ln[(1 + (1 + k)/β_R)/(1 − k/β_F)] at the forced gain k = I_C/I_B (Ebers and Moll 1954), V. */
export function saturationVoltage(
  forwardGain: number,
  reverseGain: number,
  forcedGain: number,
  temperature: number,
): number {
  const rest = 1 - forcedGain / forwardGain;
  if (rest <= 0) return Infinity;
  return thermalVoltage(temperature) * Math.log((1 + (1 + forcedGain) / reverseGain) / rest);
}

function reverseGainOf(
  facts: BipolarFacts,
  forwardGain: number,
  defaults: BipolarDefaults,
  unused: UnusedFact[],
): number | undefined {
  let found: number | undefined;
  facts.saturationVoltage.forEach(({ typical, high, at }, index) => {
    const { collectorCurrent, baseCurrent, temperature } = at;
    if (collectorCurrent === undefined || baseCurrent === undefined || baseCurrent <= 0) {
      unused.push({ fact: 'saturationVoltage', index, reason: 'its currents are not stated' });
      return;
    }
    const forcedGain = collectorCurrent / baseCurrent;
    const meeting = (voltage: number) => {
      const ratio = Math.exp(voltage / thermalVoltage(temperature)) * (1 - forcedGain / forwardGain) - 1;
      return ratio > 0 ? Math.max((1 + forcedGain) / ratio, LEAST_REVERSE_GAIN) : undefined;
    };
    if (typical !== undefined) found ??= meeting(typical);
    // A maximum alone is a bound: it is met by the default unless that passes it.
    else if (
      high !== undefined &&
      saturationVoltage(forwardGain, defaults.reverseGain, forcedGain, temperature) > high
    ) {
      found ??= meeting(high);
    }
  });
  return found;
}

function comparisonsOf(facts: BipolarFacts, model: Model, defaults: BipolarDefaults): readonly Comparison[] {
  const compare = <Of extends Fact>(
    fact: string,
    list: readonly Of[],
    fittedOf: (of: Of, grade: Grade) => number | undefined,
    boundOf: (of: Of, grade: Grade) => Comparison['bound'] = () => 'equal',
  ): readonly Comparison[] =>
    list.flatMap((of, index) =>
      grades.flatMap((grade) => {
        const stated = of[grade];
        const fitted = fittedOf(of, grade);
        if (stated === undefined || fitted === undefined) return [];
        const bound = boundOf(of, grade);
        return [
          {
            fact,
            index,
            figure: grade,
            grade,
            bound,
            stated,
            fitted,
            misfit: misfitOf(bound, stated, fitted),
          },
        ];
      }),
    );

  return [
    ...compare(
      'currentGain',
      facts.currentGain,
      ({ at }, grade) =>
        model.forwardGain[grade] *
        early(model.earlyVoltage, at.collectorToEmitter ?? USUAL_COLLECTOR_VOLTAGE) *
        warmthOf(defaults, at.temperature),
    ),
    ...compare('baseToEmitter', facts.baseToEmitter, ({ at }, grade) => {
      const { collectorCurrent, temperature } = at;
      if (collectorCurrent === undefined) return undefined;
      const other = { low: 'high', typical: 'typical', high: 'low' } as const;
      const saturationCurrent = model.saturationCurrent[other[grade]] * growth(temperature);
      return thermalVoltage(temperature) * Math.log1p(collectorCurrent / saturationCurrent);
    }),
    ...compare(
      'saturationVoltage',
      facts.saturationVoltage,
      ({ at }) => {
        const { collectorCurrent, baseCurrent, temperature } = at;
        if (collectorCurrent === undefined || baseCurrent === undefined || baseCurrent <= 0) return undefined;
        return saturationVoltage(
          model.forwardGain.typical,
          model.reverseGain,
          collectorCurrent / baseCurrent,
          temperature,
        );
      },
      (_, grade) => (({ low: 'at-least', typical: 'equal', high: 'at-most' }) as const)[grade],
    ),
    ...compare('outputConductance', facts.outputConductance, ({ at }, grade) =>
      grade === 'typical' && at.collectorCurrent !== undefined && model.earlyVoltage !== undefined
        ? at.collectorCurrent / model.earlyVoltage
        : undefined,
    ),
  ];
}
