import { RESISTANCE_FLOOR, contact } from '../../solver/index.ts';
import { symbols } from '../../symbols/index.ts';
import { definePart } from './definePart.ts';
import { optional } from './field.ts';
import { readTwoPin } from './readTwoPin.ts';
import { figure } from './values.ts';

export const switchPart = definePart({
  kind: 'switch',
  title: 'Switch',
  family: 'wiring',
  variants: [
    { key: 'switch-open', title: 'Switch, open', values: { closed: false } },
    { key: 'switch-closed', title: 'Switch, closed', values: { closed: true } },
  ],
  fields: [
    { form: 'yes-no', key: 'closed', label: 'closed', optional: false },
    optional('onResistance', 'on-resistance', 'resistance', RESISTANCE_FLOOR),
    optional('leakage', 'leakage', 'currentMagnitude', 0),
  ],
  designator: () => 'S',
  symbol: ({ values }) => symbols[values.closed === true ? 'switch-closed' : 'switch-open'],
  text: () => [],
  elements: ({ name, values, node, figures }) => [
    contact(name, [node('a'), node('b')], {
      closed: values.closed === true,
      onResistance: figure(figures, 'onResistance'),
      leakage: figure(figures, 'leakage'),
    }),
  ],
  readout: readTwoPin(['a', 'b']),
});
