import { currentSource as element } from '../../solver/index.ts';
import { symbols } from '../../symbols/index.ts';
import { definePart } from './definePart.ts';
import { aside, stated } from './field.ts';
import { readSource } from './readTwoPin.ts';
import { figure, signalLine, statedLine } from './values.ts';

/** Its current flows through it from `from` to `to`. */
export const currentSource = definePart({
  kind: 'current-source',
  title: 'Current source',
  family: 'sources',
  variants: [{ key: 'current-source', title: 'Current source', values: { current: '1m' } }],
  fields: [stated('current', 'current', 'current'), aside('signal', 'signal', 'current')],
  designator: () => 'G',
  symbol: () => symbols['current-source'],
  text: (context) => [...statedLine(context, 'current', 'current'), ...signalLine(context, 'current')],
  elements: ({ name, node, figures }) => [
    element(name, [node('from'), node('to')], { current: figure(figures, 'current') }),
  ],
  readout: readSource(['from', 'to']),
});
