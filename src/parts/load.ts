import { inductor, resistor } from '../../solver/index.ts';
import { symbols } from '../../symbols/index.ts';
import { definePart } from './definePart.ts';
import { optional, stated } from './field.ts';
import type { PartContext } from './kind.ts';
import { readTwoPin } from './readTwoPin.ts';
import { figure, statedLine } from './values.ts';

/**
 * What a stage drives. Letters of IEEE Std 315-1975 (from memory): DS lamp, K relay coil, B motor, HR heating element;
 * a general load stands for the rest of the equipment, an assembly, A.
 */
const forms = {
  general: { label: 'general', symbol: 'load', letters: 'A' },
  lamp: { label: 'lamp', symbol: 'lamp', letters: 'DS' },
  coil: { label: 'relay coil', symbol: 'coil', letters: 'K' },
  motor: { label: 'motor', symbol: 'motor', letters: 'B' },
  heater: { label: 'heater', symbol: 'heater', letters: 'HR' },
} as const;

type Form = keyof typeof forms;

const isForm = (form: unknown): form is Form => typeof form === 'string' && Object.hasOwn(forms, form);
const formOf = ({ values }: PartContext) => forms[isForm(values.form) ? values.form : 'general'];

export const load = definePart({
  kind: 'load',
  title: 'Load',
  family: 'loads',
  variants: [
    { key: 'load', title: 'Load', values: { resistance: 100 } },
    { key: 'lamp', title: 'Lamp', values: { resistance: 240, form: 'lamp' } },
    { key: 'coil', title: 'Relay coil', values: { resistance: 160, form: 'coil', inductance: '0.3' } },
    { key: 'motor', title: 'Motor', values: { resistance: 6, form: 'motor', inductance: '2m' } },
    { key: 'heater', title: 'Heater', values: { resistance: 12, form: 'heater' } },
  ],
  fields: [
    stated('resistance', 'resistance', 'resistance'),
    {
      form: 'choice',
      key: 'form',
      label: 'form',
      optional: true,
      fallback: 'general',
      choices: Object.entries(forms).map(([value, { label }]) => ({ value, label })),
    },
    // What a lamp draws at the first moment: no part of the operating point.
    { ...optional('coldResistance', 'cold resistance', 'resistance'), varied: false },
    optional('inductance', 'inductance', 'inductance'),
  ],
  designator: (context) => formOf(context).letters,
  symbol: (context) => symbols[formOf(context).symbol],
  text: (context) => statedLine(context, 'resistance', 'resistance'),
  assumptions: ({ values }) => (values.form === 'lamp' ? ['resistance taken hot'] : []),
  elements: ({ name, node, figures }) => {
    const nodes = [node('a'), node('b')] as const;
    const resistance = figure(figures, 'resistance');
    const { inductance } = figures;
    return [
      inductance === undefined
        ? resistor(name, nodes, { resistance })
        : inductor(name, nodes, { inductance, resistance }),
    ];
  },
  readout: readTwoPin(['a', 'b']),
});
