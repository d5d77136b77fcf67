import { potentiometer as element } from '../../solver/index.ts';
import { symbols } from '../../symbols/index.ts';
import { formatPercent } from '../values/format.ts';
import { resolveValue } from '../values/value-spec.ts';
import { definePart } from './definePart.ts';
import { stated } from './field.ts';
import { figure, specOf, statedLine } from './values.ts';

export const potentiometer = definePart({
  kind: 'potentiometer',
  title: 'Potentiometer',
  family: 'resistors',
  variants: [{ key: 'potentiometer', title: 'Potentiometer', values: { resistance: '10k', position: 0.5 } }],
  fields: [stated('resistance', 'resistance', 'resistance'), stated('position', 'position', 'fraction')],
  designator: () => 'R',
  symbol: () => symbols.potentiometer,
  text: (context) => {
    const position = specOf(context.values, 'position');
    return [
      ...statedLine(context, 'resistance', 'resistance'),
      ...(position === undefined ? [] : [`at ${formatPercent(resolveValue(position, 'fraction').nominal)}`]),
    ];
  },
  elements: ({ name, node, figures }) => [
    element(name, [node('a'), node('b'), node('wiper')], {
      resistance: figure(figures, 'resistance'),
      position: figure(figures, 'position'),
    }),
  ],
  readout: ({ volts, amps }) => {
    const pinCurrents = { a: amps(0, 0), b: amps(0, 1), wiper: amps(0, 2) };
    return {
      shape: 'other',
      figures: {
        voltage: volts('a') - volts('b'),
        wiperVoltage: volts('wiper') - volts('b'),
        current: pinCurrents.a,
        wiperCurrent: pinCurrents.wiper,
        // From b up: the same power, without the digits that a common voltage would cost.
        power: (volts('a') - volts('b')) * pinCurrents.a + (volts('wiper') - volts('b')) * pinCurrents.wiper,
      },
      pinCurrents,
    };
  },
});
