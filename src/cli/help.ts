import { wrapped } from './text/wrap.ts';
import { verbs } from './verbs.ts';
import type { OptionSpec, VerbSpec } from './verbs.ts';

const command = 'npm run --silent restpoint --';

const statuses = [
  'Exit status, the first that applies:',
  '  2  the file or the call is wrong',
  '  3  the circuit could not be settled',
  '  1  a duty missed or at risk, a rating passed, or a snag or caution of',
  '     severity stop, in any state computed',
  '  0  none of these',
];

const rows = (entries: readonly (readonly [string, string])[]): string[] => {
  const width = Math.max(...entries.map(([left]) => left.length));
  return entries.flatMap(([left, right]) => {
    const lines = wrapped(right, 80 - width - 4);
    return lines.map((line, index) => `  ${(index === 0 ? left : '').padEnd(width)}  ${line}`);
  });
};

const optionRow = (option: OptionSpec): readonly [string, string] => [
  option.value === undefined ? `--${option.name}` : `--${option.name} ${option.value}`,
  option.choices === undefined ? option.meaning : `${option.choices.join(', ')}: ${option.meaning}`,
];

/** The text of `--help`, for one verb or for the whole. */
export const helpText = (verb: VerbSpec | null): string => {
  if (verb === null) {
    return [
      'Restpoint puts a MOSFET switch or amplifier stage at its operating point.',
      '',
      `  ${command} VERB FILE [options]`,
      '',
      'Verbs:',
      ...rows(verbs.filter((entry) => entry.built).map((entry) => [entry.name, entry.gives])),
      '',
      'Not in this version:',
      ...rows(verbs.filter((entry) => !entry.built).map((entry) => [entry.name, entry.gives])),
      '',
      'VERB --help tells the options of a verb.',
      '',
      ...statuses,
      '',
    ].join('\n');
  }
  return [
    ...wrapped(`${verb.name}: ${verb.gives}`, 80),
    ...(verb.built ? [] : ['Not in this version.']),
    '',
    `  ${command} ${verb.name} FILE${verb.built ? ' [options]' : ''}`,
    '',
    ...rows(verb.options.map(optionRow)),
    '',
    ...statuses,
    '',
  ].join('\n');
};
