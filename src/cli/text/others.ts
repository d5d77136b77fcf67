import type { PartReading } from '../../readings/readings.ts';
import { figure } from './figures.ts';
import { table } from './table.ts';
import { isTransistor } from './transistors.ts';

const numberOf = (part: PartReading, key: string): number | null | undefined => {
  const value = (part as unknown as Readonly<Record<string, unknown>>)[key];
  return typeof value === 'number' || value === null ? value : undefined;
};

const wordOf = (part: PartReading, key: string): string => {
  const value = (part as unknown as Readonly<Record<string, unknown>>)[key];
  return typeof value === 'string' ? value : '';
};

/** Every part that is no transistor: voltage, current and power. Empty where there is none. */
export const otherLines = (parts: Readonly<Record<string, PartReading>>): readonly string[] => {
  const rows = Object.entries(parts)
    .filter(([, part]) => !isTransistor(part))
    .map(([name, part]) => [
      name,
      wordOf(part, 'region') === '' ? part.kind : `${part.kind}, ${wordOf(part, 'region')}`,
      figure(numberOf(part, 'voltage'), 'V'),
      figure(numberOf(part, 'current'), 'A'),
      figure(numberOf(part, 'power'), 'W'),
    ]);
  if (rows.length === 0) return [];
  return table(
    [
      { title: 'name', align: 'left' },
      { title: 'kind', align: 'left' },
      { title: 'voltage', align: 'right' },
      { title: 'current', align: 'right' },
      { title: 'power', align: 'right' },
    ],
    rows,
  );
};
