import { RESISTANCE_FLOOR, inductor as element } from '../../solver/index.ts';
import { symbols } from '../../symbols/index.ts';
import { definePart } from './definePart.ts';
import { optional, stated } from './field.ts';
import { readTwoPin } from './readTwoPin.ts';
import { figure, statedLine } from './values.ts';

/** Its winding resistance at direct current. */
export const inductor = definePart({
  kind: 'inductor',
  title: 'Inductor',
  family: 'stores',
  variants: [{ key: 'inductor', title: 'Inductor', values: { inductance: '1m', resistance: 1 } }],
  fields: [
    stated('inductance', 'inductance', 'inductance'),
    optional('resistance', 'winding resistance', 'resistance', RESISTANCE_FLOOR),
  ],
  designator: () => 'L',
  symbol: () => symbols.inductor,
  text: (context) => [
    ...statedLine(context, 'inductance', 'inductance'),
    ...statedLine(context, 'resistance', 'resistance'),
  ],
  elements: ({ name, node, figures }) => [
    element(name, [node('a'), node('b')], {
      inductance: figure(figures, 'inductance'),
      resistance: figure(figures, 'resistance'),
    }),
  ],
  readout: readTwoPin(['a', 'b']),
});
