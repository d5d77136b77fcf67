import { capacitor as element } from '../../solver/index.ts';
import { symbols } from '../../symbols/index.ts';
import { definePart } from './definePart.ts';
import { stated } from './field.ts';
import { readTwoPin } from './readTwoPin.ts';
import { figure, statedLine } from './values.ts';

/** Open at direct current: it carries nothing at the operating point. */
export const capacitor = definePart({
  kind: 'capacitor',
  title: 'Capacitor',
  family: 'stores',
  variants: [{ key: 'capacitor', title: 'Capacitor', values: { capacitance: '100n' } }],
  fields: [stated('capacitance', 'capacitance', 'capacitance')],
  designator: () => 'C',
  symbol: () => symbols.capacitor,
  text: (context) => statedLine(context, 'capacitance', 'capacitance'),
  elements: ({ name, node, figures }) => [
    element(name, [node('a'), node('b')], { capacitance: figure(figures, 'capacitance') }),
  ],
  readout: readTwoPin(['a', 'b']),
});
