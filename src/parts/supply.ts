import { voltageSource } from '../../solver/index.ts';
import { symbols } from '../../symbols/index.ts';
import { definePart } from './definePart.ts';
import { aside, optional, stated } from './field.ts';
import type { PartContext } from './kind.ts';
import { readSource } from './readTwoPin.ts';
import { figure, signalLine, statedLine } from './values.ts';

const isBattery = ({ values }: PartContext) => values.form === 'battery';
/** A supply with a signal, a battery apart, is there for its signal: it is drawn and named as a generator. */
const isGenerator = ({ values }: PartContext) => values.form !== 'battery' && values.signal !== undefined;

export const supply = definePart({
  kind: 'supply',
  title: 'Supply',
  family: 'sources',
  variants: [
    { key: 'supply', title: 'Supply', values: { voltage: 12 } },
    { key: 'battery', title: 'Battery', values: { voltage: 12, form: 'battery', resistance: '50m' } },
    { key: 'signal-source', title: 'Signal source', values: { voltage: 0, signal: '10m' } },
  ],
  fields: [
    stated('voltage', 'voltage', 'voltage'),
    {
      form: 'choice',
      key: 'form',
      label: 'form',
      optional: true,
      fallback: 'general',
      choices: [
        { value: 'general', label: 'general' },
        { value: 'battery', label: 'battery' },
      ],
    },
    optional('resistance', 'internal resistance', 'resistance'),
    aside('signal', 'signal', 'voltage'),
  ],
  designator: (context) => {
    if (isBattery(context)) return 'BT';
    return isGenerator(context) ? 'G' : 'PS';
  },
  symbol: (context) => {
    if (isBattery(context)) return symbols.battery;
    return isGenerator(context) ? symbols['signal-source'] : symbols.supply;
  },
  text: (context) => [
    ...statedLine(context, 'voltage', 'voltage'),
    ...statedLine(context, 'resistance', 'resistance'),
    ...signalLine(context, 'voltage'),
  ],
  assumptions: ({ values }) =>
    values.resistance === undefined ? ['no internal resistance (none stated)'] : [],
  elements: ({ name, node, figures }) => [
    voltageSource(name, [node('plus'), node('minus')], {
      voltage: figure(figures, 'voltage'),
      ...(figures.resistance === undefined ? {} : { resistance: figures.resistance }),
    }),
  ],
  readout: readSource(['plus', 'minus']),
});
