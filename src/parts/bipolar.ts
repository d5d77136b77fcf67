import { bipolar as element } from '../../solver/index.ts';
import type { BipolarOperating } from '../../solver/index.ts';
import { symbols } from '../../symbols/index.ts';
import { definePart } from './definePart.ts';
import { deviceOf, titleLine } from './deviceOf.ts';
import { bipolarAssumptions, bipolarDraws } from './devices/bipolarDraws.ts';
import { bipolarFromFigures } from './devices/bipolarParameters.ts';
import type { BipolarDevice } from './devices/bipolarSchema.ts';
import type { PartContext, Variant } from './kind.ts';

const deviceOfPart = (context: PartContext) => deviceOf(context, 'bipolar');

const variant = (polarity: BipolarDevice['polarity']): Variant => ({
  key: `bipolar-${polarity.replaceAll('-', '')}`,
  title: `Bipolar, ${polarity}`,
  values: {},
  device: { type: 'bipolar', polarity, model: { saturationCurrent: 1e-14, forwardGain: 200 } },
});

export const bipolar = definePart({
  kind: 'bipolar',
  title: 'Bipolar transistor',
  family: 'transistors',
  variants: [variant('n-p-n'), variant('p-n-p')],
  deviceTypes: ['bipolar'],
  takesDuty: true,
  fields: [],
  designator: () => 'Q',
  symbol: (context) => symbols[deviceOfPart(context).polarity === 'n-p-n' ? 'bipolar-npn' : 'bipolar-pnp'],
  text: titleLine,
  draws: (context) => bipolarDraws(deviceOfPart(context)),
  assumptions: (context) => bipolarAssumptions(deviceOfPart(context)),
  elements: (context) => {
    const { name, node, figures } = context;
    return [
      element(
        name,
        [node('collector'), node('base'), node('emitter')],
        bipolarFromFigures(deviceOfPart(context), figures),
      ),
    ];
  },
  readout: (context) => {
    const { amps } = context;
    const operating = context.operating(0) as BipolarOperating;
    return {
      shape: 'bipolar',
      figures: {
        region: operating.region,
        reversed: operating.reversed,
        baseToEmitter: operating.baseToEmitter,
        collectorToEmitter: operating.collectorToEmitter,
        collectorCurrent: operating.collectorCurrent,
        baseCurrent: operating.baseCurrent,
        transconductance: operating.transconductance,
        power: operating.power,
      },
      pinCurrents: { base: amps(0, 1), collector: amps(0, 0), emitter: amps(0, 2) },
    };
  },
});
