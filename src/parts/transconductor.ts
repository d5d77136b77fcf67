import { transconductor as element } from '../../solver/index.ts';
import type { TransconductorOperating } from '../../solver/index.ts';
import { symbols } from '../../symbols/index.ts';
import { definePart } from './definePart.ts';
import { stated } from './field.ts';
import { figure, statedLine } from './values.ts';

/** A current from `from` to `to` through the part, per volt of plus − minus: a linear controlled source. */
export const transconductor = definePart({
  kind: 'transconductor',
  title: 'Transconductor',
  family: 'sources',
  variants: [{ key: 'transconductor', title: 'Transconductor', values: { transconductance: '1m' } }],
  fields: [stated('transconductance', 'transconductance', 'transconductance')],
  designator: () => 'U',
  symbol: () => symbols.transconductor,
  text: (context) => statedLine(context, 'transconductance', 'transconductance'),
  elements: ({ name, node, figures }) => [
    element(name, [node('plus'), node('minus'), node('from'), node('to')], {
      transconductance: figure(figures, 'transconductance'),
    }),
  ],
  readout: ({ volts, amps, operating }) => {
    const { input, current, power } = operating(0) as TransconductorOperating;
    return {
      shape: 'other',
      figures: { input, voltage: volts('from') - volts('to'), current, power },
      pinCurrents: { plus: amps(0, 0), minus: amps(0, 1), from: amps(0, 2), to: amps(0, 3) },
    };
  },
});
