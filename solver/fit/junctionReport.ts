/** Every stated forward voltage beside what the fitted junctions give for it, and what the facts left open. */
import type { Comparison, Fact, FreeParameter, Grade, UnusedFact } from './fact.ts';
import { grades, misfitOf } from './fact.ts';
import type { JunctionFit, JunctionParameters } from './junctionFit.ts';
import { forwardTargets, forwardVoltage } from './junctionFit.ts';

export const forwardComparisons = (
  fact: string,
  facts: readonly Fact<'current'>[],
  junctionOf: (grade: Grade) => JunctionParameters,
  soleFigure: 'value' | 'bound',
): readonly Comparison[] =>
  grades.flatMap((grade) =>
    forwardTargets(facts, grade, soleFigure)
      .filter(({ figure }) => figure === grade)
      .map(({ index, figure, bound, stated, current, temperature }): Comparison => {
        const fitted = forwardVoltage(junctionOf(grade), current, temperature);
        return { fact, index, figure, grade, bound, stated, fitted, misfit: misfitOf(bound, stated, fitted) };
      }),
  );

/** What the facts of one grade left open. `prefix` stands before each parameter's name. */
export const freeOfJunction = (
  { junction, determined }: JunctionFit,
  grade: Grade,
  prefix: string,
): readonly FreeParameter[] =>
  (['saturationCurrent', 'emissionCoefficient', 'seriesResistance'] as const)
    .filter((parameter) => !determined.includes(parameter))
    .map((parameter) => ({
      parameter: `${prefix}${parameter}`,
      grade,
      value: junction[parameter],
      reason: 'the forward voltages do not determine it: a default is taken',
    }));

export const withoutCurrent = (fact: string, facts: readonly Fact<'current'>[]): readonly UnusedFact[] =>
  facts.flatMap(({ at }, index) =>
    at.current !== undefined && at.current > 0 ? [] : [{ fact, index, reason: 'its current is not stated' }],
  );
