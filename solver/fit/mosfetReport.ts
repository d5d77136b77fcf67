/** Every stated figure of a MOSFET beside what the fitted parts give for it. */
import type { Comparison, Fact, Grade } from './fact.ts';
import { grades, misfitOf } from './fact.ts';
import type { JunctionParameters } from './junctionFit.ts';
import type { ChannelParameters, MosfetLaw } from './mosfetModel.ts';
import type { Measured, MosfetFacts } from './mosfetTargets.ts';
import { endOf, gateThreshold, isSoleMinimum, USUAL_TEST_CURRENT } from './mosfetTargets.ts';

export interface FittedMosfet extends ChannelParameters {
  readonly bodyDiode: JunctionParameters;
}

export function thresholdComparisons(
  facts: MosfetFacts,
  law: MosfetLaw,
  threshold: Fact<'drainCurrent'>,
  parts: Readonly<Record<Grade, FittedMosfet>>,
): readonly Comparison[] {
  const current = threshold.at.drainCurrent ?? USUAL_TEST_CURRENT;
  return grades.flatMap((grade): readonly Comparison[] => {
    const stated = threshold[grade];
    if (stated === undefined) return [];
    const fitted = Math.abs(gateThreshold(law, facts.mode, parts[grade], current, threshold.at.temperature));
    return [
      {
        fact: 'gateThreshold',
        index: 0,
        figure: grade,
        grade,
        bound: 'equal',
        stated,
        fitted,
        misfit: misfitOf('equal', stated, fitted),
      },
    ];
  });
}

export function comparisonsOf(
  facts: MosfetFacts,
  measured: readonly Measured[],
  parts: Readonly<Record<Grade, FittedMosfet>>,
): readonly Comparison[] {
  return measured.flatMap((of) =>
    grades.flatMap((grade): readonly Comparison[] => {
      const figure = endOf(of, grade, facts.mode);
      const stated = of.fact[figure];
      if (stated === undefined) return [];
      const bound = figure === 'low' && isSoleMinimum(of, measured) ? 'at-least' : 'equal';
      const fitted = of.model(parts[grade]);
      return [
        {
          fact: of.key,
          index: of.index,
          figure,
          grade,
          bound,
          stated,
          fitted,
          misfit: misfitOf(bound, stated, fitted),
        },
      ];
    }),
  );
}
