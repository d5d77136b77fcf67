import { voltageSource } from '../../solver/index.ts';
import { symbols } from '../../symbols/index.ts';
import { definePart } from './definePart.ts';
import { aside, optional } from './field.ts';
import { figure, signalLine, statedLine } from './values.ts';

/** Node 0 of every circuit. */
const reference = 0;

/**
 * A voltage against the reference. Of several rails of one name one states the voltage and is the source; the others
 * only stand for its node.
 */
export const rail = definePart({
  kind: 'rail',
  title: 'Rail',
  family: 'sources',
  variants: [{ key: 'rail', title: 'Rail', values: { voltage: 12 } }],
  nameShared: true,
  joins: 'name',
  fields: [optional('voltage', 'voltage', 'voltage'), aside('signal', 'signal', 'voltage')],
  // A rail is a named node and no item of equipment: the standard has no letters for it.
  designator: () => 'RAIL',
  symbol: () => symbols.rail,
  text: (context) => [
    ...(context.label === undefined ? [] : [context.label]),
    ...statedLine(context, 'voltage', 'voltage'),
    ...signalLine(context, 'voltage'),
  ],
  elements: ({ name, values, node, figures }) =>
    values.voltage === undefined
      ? []
      : [voltageSource(name, [node('node'), reference], { voltage: figure(figures, 'voltage') })],
  readout: ({ values, volts, amps }) => {
    const voltage = volts('node');
    if (values.voltage === undefined) return { shape: 'other', figures: { voltage }, pinCurrents: {} };
    const into = amps(0, 0);
    const current = into === 0 ? 0 : -into;
    return {
      shape: 'supply',
      figures: { voltage, current, power: -voltage * current, delivered: voltage * current },
      pinCurrents: { node: into },
    };
  },
});
