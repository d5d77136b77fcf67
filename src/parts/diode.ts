import { diode as junction, zener } from '../../solver/index.ts';
import type { DiodeOperating } from '../../solver/index.ts';
import { symbols } from '../../symbols/index.ts';
import { formatStated } from '../values/value-text.ts';
import { definePart } from './definePart.ts';
import { deviceOf, titleLine } from './deviceOf.ts';
import { diodeAssumptions, diodeDraws, diodeGrades } from './devices/diodeDraws.ts';
import { diodeFromFigures, zenerFromFigures } from './devices/diodeParameters.ts';
import type { PartContext } from './kind.ts';
import { readTwoPins } from './readTwoPin.ts';

const deviceOfPart = (context: PartContext) => deviceOf(context, 'diode', 'led', 'zener');

/** IEEE Std 315-1975 (from memory): D a diode, DS a lamp and what lights like one, VR a voltage regulator. */
const letters = { diode: 'D', led: 'DS', zener: 'VR' } as const;

const breakdownLine = (context: PartContext): readonly string[] => {
  const device = deviceOfPart(context);
  if (device.type !== 'zener') return [];
  const [fact] = device.facts?.breakdownVoltage ?? [];
  const stated = device.model?.breakdownVoltage ?? fact?.typical ?? fact?.high ?? fact?.low;
  return stated === undefined ? [] : [formatStated(stated, 'voltageMagnitude')];
};

export const diode = definePart({
  kind: 'diode',
  title: 'Diode',
  family: 'diodes',
  variants: [
    {
      key: 'diode',
      title: 'Diode',
      values: {},
      device: { type: 'diode', model: { saturationCurrent: 1e-9, emissionCoefficient: 1.8 } },
    },
    {
      key: 'led',
      title: 'LED',
      values: {},
      device: {
        type: 'led',
        model: { saturationCurrent: 1e-18, emissionCoefficient: 2, seriesResistance: 5 },
      },
    },
    {
      key: 'zener',
      title: 'Zener',
      values: {},
      device: {
        type: 'zener',
        model: { breakdownVoltage: 10, breakdownCurrent: '5m', breakdownResistance: 10 },
      },
    },
  ],
  deviceTypes: ['diode', 'led', 'zener'],
  fields: [],
  designator: (context) => letters[deviceOfPart(context).type],
  symbol: (context) => symbols[deviceOfPart(context).type],
  text: (context) => [...titleLine(context), ...breakdownLine(context)],
  draws: (context) => diodeDraws(deviceOfPart(context)),
  assumptions: (context) => diodeAssumptions(deviceOfPart(context)),
  elements: (context) => {
    const { name, node, figures } = context;
    const nodes = [node('anode'), node('cathode')] as const;
    const device = deviceOfPart(context);
    const grades = diodeGrades(device);
    return [
      device.type === 'zener'
        ? zener(name, nodes, zenerFromFigures(figures, grades))
        : junction(name, nodes, diodeFromFigures(figures, grades)),
    ];
  },
  readout: (context) => {
    const { figures, pinCurrents } = readTwoPins(context, ['anode', 'cathode']);
    const { region } = context.operating(0) as DiodeOperating;
    return { shape: 'diode', figures: { ...figures, region }, pinCurrents };
  },
});
