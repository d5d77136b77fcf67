import { amplifier as element } from '../../solver/index.ts';
import type { AmplifierOperating } from '../../solver/index.ts';
import { symbols } from '../../symbols/index.ts';
import { definePart } from './definePart.ts';
import { optional } from './field.ts';
import type { PartContext } from './kind.ts';
import { fieldAssumptions, figure, statedLine } from './values.ts';

/** With either supply wired the output is held between the two; with neither the amplifier is ideal. */
const isSupplied = ({ wired }: PartContext) => wired.has('high') || wired.has('low');

const gain = optional('gain', 'open-loop gain', 'gain', 1e6);
const offset = optional('offset', 'input offset', 'voltage', 0);
/** How close the output comes to each supply. */
const outputSwing = optional('outputSwing', 'output swing up to each supply within', 'voltageMagnitude', 0);

export const amplifier = definePart({
  kind: 'amplifier',
  title: 'Operational amplifier',
  family: 'sources',
  variants: [{ key: 'amplifier', title: 'Amplifier', values: {} }],
  fields: [gain, offset, outputSwing],
  designator: () => 'U',
  symbol: () => symbols.amplifier,
  text: (context) => statedLine(context, 'gain', 'gain').map((line) => `gain ${line}`),
  assumptions: (context) =>
    isSupplied(context)
      ? fieldAssumptions([gain, offset, outputSwing], context.values)
      : [
          ...fieldAssumptions([gain, offset], context.values),
          'output without limit and fed from nowhere (supplies not wired)',
        ],
  elements: (context) => {
    const { name, node, figures } = context;
    const parameters = { gain: figure(figures, 'gain'), offset: figure(figures, 'offset') };
    const inputsAndOutput = [node('plus'), node('minus'), node('out')] as const;
    return [
      isSupplied(context)
        ? element(name, [...inputsAndOutput, node('high'), node('low')], {
            ...parameters,
            outputMargin: figure(figures, 'outputSwing'),
          })
        : element(name, inputsAndOutput, parameters),
    ];
  },
  readout: (context) => {
    const { amps, operating } = context;
    const { input, output, outputCurrent, limited, power } = operating(0) as AmplifierOperating;
    const supplies = isSupplied(context) ? { high: amps(0, 3), low: amps(0, 4) } : { high: 0, low: 0 };
    return {
      shape: 'other',
      figures: { input, output, outputCurrent, limited, power },
      pinCurrents: { plus: amps(0, 0), minus: amps(0, 1), out: amps(0, 2), ...supplies },
    };
  },
});
