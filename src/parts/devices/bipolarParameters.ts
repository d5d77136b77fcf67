/** Parameters of bipolar transistors at 25 °C, with the defaults of common practice. */
import type { BipolarParameters } from '../../../solver/index.ts';
import type { Figures } from '../kind.ts';
import { figure } from '../values.ts';
import type { BipolarDevice } from './bipolarSchema.ts';
import type { Parameter } from './parameter.ts';

/** Of h_FE, 1/K (common practice). */
const gainCoefficient = 0.006;

export const bipolarParameters: readonly Parameter[] = [
  { key: 'saturationCurrent', label: 'saturation current', quantity: 'saturationCurrent' },
  { key: 'forwardGain', label: 'forward gain', quantity: 'currentGain' },
  { key: 'reverseGain', label: 'reverse gain', quantity: 'currentGain', fallback: { value: 1 } },
  { key: 'earlyVoltage', label: 'Early voltage', quantity: 'earlyVoltage' },
  {
    key: 'gainTemperatureCoefficient',
    label: 'temperature coefficient of the gain',
    quantity: 'temperatureCoefficient',
    fallback: { value: gainCoefficient, clause: 'current gain rises 0.6 %/K (common practice)' },
  },
];

export const bipolarFromFigures = (device: BipolarDevice, figures: Figures): BipolarParameters => {
  const { earlyVoltage } = figures;
  return {
    polarity: device.polarity === 'n-p-n' ? 1 : -1,
    saturationCurrent: figure(figures, 'saturationCurrent'),
    forwardGain: figure(figures, 'forwardGain'),
    reverseGain: figure(figures, 'reverseGain'),
    ...(earlyVoltage === undefined ? {} : { earlyVoltage }),
    gainTemperatureCoefficient: figure(figures, 'gainTemperatureCoefficient'),
  };
};
