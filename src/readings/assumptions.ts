import { DECLARED_LEAK } from '../../solver/index.ts';
import { formatQuantity } from '../values/format.ts';
import type { CompiledStage } from './compile.ts';

/** What the readings take for granted because nobody stated it, parts on which the same is assumed together. */
export const assumptionsOf = ({ document, conditions, parts, circuit }: CompiledStage): readonly string[] => {
  const byClause = new Map<string, string[]>();
  for (const part of parts) {
    for (const clause of part.kind.assumptions(part.context, conditions.law)) {
      byClause.set(clause, [...(byClause.get(clause) ?? []), part.name]);
    }
  }
  const leaks = circuit.elements.some(({ law }) => isSemiconductor(law.name));
  return [
    ...(document.conditions.ambient === undefined ? ['ambient 25 °C (not stated)'] : []),
    ...(document.conditions.law === undefined ? ['square law (not stated)'] : []),
    ...(conditions.selfHeating ? ['devices at ambient: self-heating is not worked out in this version'] : []),
    ...(leaks
      ? [`a leak of ${formatQuantity(DECLARED_LEAK, 'S', { trim: true })} across each junction and channel`]
      : []),
    ...[...byClause].map(([clause, names]) => `${names.join(', ')}: ${clause}`),
  ];
};

const isSemiconductor = (law: string): boolean =>
  ['mosfet', 'bipolar', 'diode', 'zener', 'logic-output'].includes(law);
