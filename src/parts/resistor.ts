import { resistor as element } from '../../solver/index.ts';
import { symbols } from '../../symbols/index.ts';
import { definePart } from './definePart.ts';
import { aside, optional, stated } from './field.ts';
import { readTwoPin } from './readTwoPin.ts';
import { figure, statedLine } from './values.ts';

export const resistor = definePart({
  kind: 'resistor',
  title: 'Resistor',
  family: 'resistors',
  variants: [{ key: 'resistor', title: 'Resistor', values: { resistance: '10k' } }],
  fields: [
    stated('resistance', 'resistance', 'resistance'),
    optional('temperatureCoefficient', 'temperature coefficient', 'temperatureCoefficient', 0),
    aside('rating', 'power rating', 'power'),
  ],
  designator: () => 'R',
  symbol: () => symbols.resistor,
  text: (context) => statedLine(context, 'resistance', 'resistance'),
  elements: ({ name, node, figures }) => [
    element(name, [node('a'), node('b')], {
      resistance: figure(figures, 'resistance'),
      temperatureCoefficient: figure(figures, 'temperatureCoefficient'),
    }),
  ],
  readout: readTwoPin(['a', 'b']),
});
