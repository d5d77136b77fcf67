/** From facts to the breakdown of a Zener: an exponential through V_Z at I_Z, whose slope there is Z_Z. */
import { conflictsOf } from './conflicts.ts';
import type {
  Comparison,
  Conflict,
  Fact,
  FitReport,
  FitResult,
  FreeParameter,
  Grade,
  UnusedFact,
} from './fact.ts';
import { grades, misfitOf } from './fact.ts';

/** SI units, kelvin; any list save the first may be empty. */
export interface BreakdownFacts {
  readonly breakdownVoltage: readonly Fact<'current'>[];
  readonly dynamicResistance: readonly Fact<'current'>[];
}

export interface BreakdownFit {
  /** V_Z, V: each part's own. */
  readonly voltage: Readonly<Record<Grade, number>>;
  /** I_Z, A. */
  readonly current: number;
  /** Z_Z at I_Z, Ω, at least the floor of a stated zero. */
  readonly resistance: number;
  readonly report: FitReport;
}

/** I_Z where none is stated, A (common practice for small parts). */
const USUAL_CURRENT = 5e-3;
/** Rise of V_Z for an e-fold current where no fact tells, as a share of V_Z (common practice). */
const USUAL_RISE = 0.01;

export function fitBreakdown(facts: BreakdownFacts): FitResult<BreakdownFit> {
  const [first, ...others] = facts.breakdownVoltage;
  if (first === undefined) {
    return { ok: false, reasons: ['Without a breakdown voltage (breakdownVoltage) no Zener can be fitted.'] };
  }
  const current = first.at.current ?? USUAL_CURRENT;
  const typical = middleOf(first);
  const voltage = {
    low: first.low ?? first.typical ?? first.high ?? typical,
    typical,
    high: first.high ?? first.typical ?? first.low ?? typical,
  };
  const free: FreeParameter[] = [];
  const contrary: Conflict[] = [];
  const unused: UnusedFact[] = [];
  const rise = riseOf(facts, others, typical, current, free, contrary, unused);
  const resistance = rise / current;
  const comparisons = comparisonsOf(facts, voltage, current, rise);
  return {
    ok: true,
    fit: {
      voltage,
      current,
      resistance,
      report: { comparisons, free, conflicts: [...contrary, ...conflictsOf(comparisons)], unused },
    },
  };
}

const middleOf = ({ low, typical, high }: Fact): number => {
  if (typical !== undefined) return typical;
  return low !== undefined && high !== undefined ? (low + high) / 2 : (low ?? high ?? 0);
};

/** Rise of the voltage for an e-fold current, V: I·Z of the law, the same at every current. */
function riseOf(
  facts: BreakdownFacts,
  others: readonly Fact<'current'>[],
  voltage: number,
  current: number,
  free: FreeParameter[],
  contrary: Conflict[],
  unused: UnusedFact[],
): number {
  const rises: number[] = [];
  const bounds: number[] = [];
  facts.dynamicResistance.forEach(({ low, typical, high, at }, index) => {
    if (at.current === undefined || at.current <= 0) {
      unused.push({ fact: 'dynamicResistance', index, reason: 'its current is not stated' });
      return;
    }
    const stated = typical ?? (low !== undefined && high !== undefined ? (low + high) / 2 : undefined);
    if (stated !== undefined) rises.push(stated * at.current);
    else if (high !== undefined) bounds.push(high * at.current);
  });
  if (rises.length === 0) {
    others.forEach((other, place) => {
      const index = place + 1;
      if (other.at.current === undefined || other.at.current === current) {
        unused.push({ fact: 'breakdownVoltage', index, reason: 'its current is not another one' });
        return;
      }
      const slope = (middleOf(other) - voltage) / Math.log(other.at.current / current);
      if (slope > 0) rises.push(slope);
      else {
        contrary.push({
          facts: ['breakdownVoltage'],
          grade: 'typical',
          reason: 'the breakdown voltage falls as the current rises: the further figure is left out',
        });
      }
    });
  }
  const bound = Math.min(...bounds);
  if (rises.length > 0) {
    const mean = Math.exp(rises.reduce((sum, rise) => sum + Math.log(rise), 0) / rises.length);
    return Math.min(mean, bound);
  }
  const isBounded = bounds.length > 0;
  const rise = isBounded ? bound : USUAL_RISE * voltage;
  free.push({
    parameter: 'breakdownResistance',
    grade: 'typical',
    value: rise / current,
    reason: isBounded
      ? 'only its maximum is stated: the maximum is taken, which regulates worst'
      : 'no fact determines it: a default is taken',
  });
  return rise;
}

function comparisonsOf(
  { breakdownVoltage, dynamicResistance }: BreakdownFacts,
  voltage: Readonly<Record<Grade, number>>,
  current: number,
  rise: number,
): readonly Comparison[] {
  const entry = (
    fact: string,
    index: number,
    figure: Grade,
    bound: Comparison['bound'],
    stated: number,
    fitted: number,
  ): Comparison => ({
    fact,
    index,
    figure,
    grade: figure,
    bound,
    stated,
    fitted,
    misfit: misfitOf(bound, stated, fitted),
  });
  const voltages = breakdownVoltage.flatMap((fact, index) =>
    grades.flatMap((grade) => {
      const stated = fact[grade];
      if (stated === undefined) return [];
      const fitted = voltage[grade] + rise * Math.log((fact.at.current ?? current) / current);
      return [entry('breakdownVoltage', index, grade, 'equal', stated, fitted)];
    }),
  );
  const resistances = dynamicResistance.flatMap((fact, index) => {
    const { current: at } = fact.at;
    if (at === undefined || at <= 0) return [];
    return grades.flatMap((grade) => {
      const stated = fact[grade];
      if (stated === undefined) return [];
      const bound = { low: 'at-least', typical: 'equal', high: 'at-most' } as const;
      return [entry('dynamicResistance', index, grade, bound[grade], stated, rise / at)];
    });
  });
  return [...voltages, ...resistances];
}
