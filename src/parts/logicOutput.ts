import { logicOutput as element } from '../../solver/index.ts';
import type { LogicOutputOperating } from '../../solver/index.ts';
import { symbols } from '../../symbols/index.ts';
import { definePart } from './definePart.ts';
import { optional } from './field.ts';
import { fieldAssumptions, figure, textOf } from './values.ts';

const levels = ['high', 'low', 'open'] as const;
const usualResistance = 50;

const fields = [
  {
    form: 'choice',
    key: 'level',
    label: 'level',
    optional: false,
    choices: levels.map((value) => ({ value, label: value })),
  },
  optional('highResistance', 'resistance at high', 'resistance', usualResistance),
  optional('lowResistance', 'resistance at low', 'resistance', usualResistance),
] as const;

export const logicOutput = definePart({
  kind: 'logic-output',
  title: 'Logic output',
  family: 'sources',
  variants: [{ key: 'logic-output', title: 'Logic output', values: { level: 'high' } }],
  fields,
  designator: () => 'U',
  symbol: () => symbols['logic-output'],
  text: ({ values }) => [textOf(values, 'level') ?? ''],
  assumptions: ({ values }) => [
    ...fieldAssumptions(fields, values),
    'clamp diodes from output to high and from low to output',
  ],
  elements: ({ name, values, node, figures }) => [
    element(name, [node('out'), node('high'), node('low')], {
      level: levels.find((level) => level === values.level) ?? 'open',
      highResistance: figure(figures, 'highResistance'),
      lowResistance: figure(figures, 'lowResistance'),
    }),
  ],
  readout: ({ volts, amps, operating }) => {
    const { level, outputCurrent, power } = operating(0) as LogicOutputOperating;
    return {
      shape: 'other',
      figures: { level, output: volts('out'), outputCurrent, power },
      pinCurrents: { out: amps(0, 0), high: amps(0, 1), low: amps(0, 2) },
    };
  },
});
