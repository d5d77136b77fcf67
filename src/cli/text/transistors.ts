import type { BipolarReading, DutyReading, MosfetReading, PartReading } from '../../readings/readings.ts';
import { figure, figureOrDash } from './figures.ts';
import { table } from './table.ts';
import type { Column } from './table.ts';
import { wrapped } from './wrap.ts';

const isMosfet = (part: PartReading): part is MosfetReading => part.kind === 'mosfet';
const isBipolar = (part: PartReading): part is BipolarReading => part.kind === 'bipolar';

type Named<Reading> = readonly [name: string, reading: Reading];

const left = (title: string): Column => ({ title, align: 'left' });
const right = (title: string): Column => ({ title, align: 'right' });

const regionWords = (region: string | null, reversed: boolean): string =>
  (region === null ? 'not set' : region.replace('-', ' ')) + (reversed ? ', reversed' : '');

const verdictWord = (reading: DutyReading): string => reading.verdict.replace('-', ' ');

const dutyCells = (reading: DutyReading): readonly string[] => [
  reading.duty,
  verdictWord(reading),
  reading.verdict === 'not-checked' ? '' : figureOrDash(reading.headroom, 'V'),
];

/** `label figure` pairs in one sentence, those without a figure left out. */
const details = (entries: readonly (readonly [label: string, text: string])[]): string =>
  entries
    .filter(([, text]) => text !== '')
    // A figure and its unit stay on one line.
    .map(([label, text]) => `${label} ${text.replaceAll(' ', '\u00a0')}`)
    .join(', ');

/** The row of each transistor, with its further figures and reasons under it. */
const withNotes = <Reading extends DutyReading>(
  columns: readonly Column[],
  parts: readonly Named<Reading>[],
  row: (part: Named<Reading>) => readonly string[],
  further: (reading: Reading) => string,
): readonly string[] => {
  const [head = '', ...rows] = table(columns, parts.map(row));
  return [
    head,
    ...parts.flatMap(([, reading], index) => [
      rows[index] ?? '',
      ...wrapped(further(reading), 70).map((line) => `      ${line}`),
      ...reading.reasons.flatMap((reason) =>
        wrapped(reason, 70).map((line, at) => `${at === 0 ? '    - ' : '      '}${line}`),
      ),
    ]),
  ];
};

const mosfetLines = (parts: readonly Named<MosfetReading>[]): readonly string[] =>
  withNotes(
    [
      left('name'),
      left('region'),
      left('duty'),
      left('verdict'),
      right('headroom'),
      right('V_GS'),
      right('V_DS'),
      right('I_D'),
    ],
    parts,
    ([name, reading]) => [
      name,
      regionWords(reading.region, reading.reversed),
      ...dutyCells(reading),
      figure(reading.gateToSource, 'V'),
      figure(reading.drainToSource, 'V'),
      figure(reading.drainCurrent, 'A'),
    ],
    (reading) =>
      details([
        ['threshold', figure(reading.threshold, 'V')],
        ['overdrive', figure(reading.overdrive, 'V')],
        ['g_m', figure(reading.transconductance, 'S')],
        ['g_ds', figure(reading.outputConductance, 'S')],
        ['power', figure(reading.power, 'W')],
        ['junction', reading.junctionTemperature === null ? '' : figure(reading.junctionTemperature, '°C')],
        ['inversion', reading.inversion ?? ''],
      ]),
  );

const bipolarLines = (parts: readonly Named<BipolarReading>[]): readonly string[] =>
  withNotes(
    [
      left('name'),
      left('region'),
      left('duty'),
      left('verdict'),
      right('headroom'),
      right('V_BE'),
      right('V_CE'),
      right('I_C'),
    ],
    parts,
    ([name, reading]) => [
      name,
      regionWords(reading.region, reading.reversed),
      ...dutyCells(reading),
      figure(reading.baseToEmitter, 'V'),
      figure(reading.collectorToEmitter, 'V'),
      figure(reading.collectorCurrent, 'A'),
    ],
    (reading) =>
      details([
        ['base current', figure(reading.baseCurrent, 'A')],
        ['g_m', figure(reading.transconductance, 'S')],
        ['power', figure(reading.power, 'W')],
        ['junction', reading.junctionTemperature === null ? '' : figure(reading.junctionTemperature, '°C')],
      ]),
  );

/** The transistors of a settled state: region, duty, verdict, headroom, figures and reasons. Empty where none is. */
export const transistorLines = (parts: Readonly<Record<string, PartReading>>): readonly string[] => {
  const entries = Object.entries(parts);
  const mosfets = entries.filter((entry): entry is [string, MosfetReading] => isMosfet(entry[1]));
  const bipolars = entries.filter((entry): entry is [string, BipolarReading] => isBipolar(entry[1]));
  return [
    ...(mosfets.length === 0 ? [] : mosfetLines(mosfets)),
    ...(mosfets.length === 0 || bipolars.length === 0 ? [] : ['']),
    ...(bipolars.length === 0 ? [] : bipolarLines(bipolars)),
  ];
};

export const isTransistor = (part: PartReading): boolean => isMosfet(part) || isBipolar(part);
