/** Parameters of diodes, LEDs and Zeners at 25 °C, with the defaults of common practice. */
import { SILICON_BAND_GAP } from '../../../solver/index.ts';
import type { DiodeParameters, ZenerParameters } from '../../../solver/index.ts';
import type { DiodeFit, JunctionParameters } from '../../../solver/fit/index.ts';
import type { Figures } from '../kind.ts';
import { figure } from '../values.ts';
import type { DiodeDevice, LedDevice, ZenerDevice } from './diodeSchema.ts';
import { geometric, gradeKey, linear, scaledBy } from './grade.ts';
import type { Parameter } from './parameter.ts';

/** Change of an LED's forward voltage where neither band gap nor coefficient is stated, V/K (common practice). */
const ledCoefficient = -0.002;

export const diodeParameters = (
  type: (DiodeDevice | LedDevice | ZenerDevice)['type'],
  hasBandGap: boolean,
): readonly Parameter[] => [
  {
    key: 'saturationCurrent',
    label: 'saturation current',
    quantity: 'saturationCurrent',
    ...(type === 'zener'
      ? { fallback: { value: 1e-14, clause: 'forward saturation current 10 fA (not stated)' } }
      : {}),
  },
  {
    key: 'emissionCoefficient',
    label: 'emission coefficient',
    quantity: 'emissionCoefficient',
    fallback: { value: 1 },
  },
  {
    key: 'seriesResistance',
    label: 'series resistance',
    quantity: 'seriesResistance',
    fallback: { value: 0, clause: 'slope of the junction never below 10 mΩ' },
  },
  {
    key: 'bandGap',
    label: 'band gap',
    quantity: 'bandGap',
    ...(type === 'led'
      ? {}
      : { fallback: { value: SILICON_BAND_GAP, clause: 'band gap of silicon, 1.12 eV' } }),
  },
  ...(type === 'led' && !hasBandGap
    ? ([
        {
          key: 'forwardTemperatureCoefficient',
          label: 'temperature coefficient of the forward voltage',
          quantity: 'voltageTemperatureCoefficient',
          fallback: {
            value: ledCoefficient,
            clause: 'forward voltage falls 2 mV/K at 10 mA (not stated; common practice)',
          },
        },
      ] as const)
    : []),
];

export const zenerParameters: readonly Parameter[] = [
  ...diodeParameters('zener', false),
  { key: 'breakdownVoltage', label: 'breakdown voltage', quantity: 'voltageMagnitude' },
  { key: 'breakdownCurrent', label: 'breakdown current', quantity: 'currentMagnitude' },
  {
    key: 'breakdownResistance',
    label: 'breakdown resistance',
    quantity: 'seriesResistance',
    fallback: { value: 1 },
  },
  {
    key: 'breakdownTemperatureCoefficient',
    label: 'temperature coefficient of the breakdown voltage',
    quantity: 'voltageTemperatureCoefficient',
    fallback: { value: 0 },
  },
];

export const diodeFromFigures = (atHand: Figures, fit?: DiodeFit): DiodeParameters => {
  const figures = fit === undefined ? atHand : { ...atHand, ...atGrade(atHand, fit) };
  const { bandGap, forwardTemperatureCoefficient, coefficientCurrent } = figures;
  return {
    saturationCurrent: figure(figures, 'saturationCurrent'),
    emissionCoefficient: figure(figures, 'emissionCoefficient'),
    seriesResistance: figure(figures, 'seriesResistance'),
    ...(bandGap === undefined ? {} : { bandGap }),
    ...(forwardTemperatureCoefficient === undefined ? {} : { forwardTemperatureCoefficient }),
    ...(coefficientCurrent === undefined ? {} : { coefficientCurrent }),
  };
};

export const zenerFromFigures = (figures: Figures, fit?: DiodeFit): ZenerParameters => ({
  ...diodeFromFigures(figures, fit),
  breakdownVoltage: figure(figures, 'breakdownVoltage'),
  breakdownCurrent: figure(figures, 'breakdownCurrent'),
  breakdownResistance: figure(figures, 'breakdownResistance'),
  breakdownTemperatureCoefficient: figure(figures, 'breakdownTemperatureCoefficient'),
});

/** What was fitted, for the grade at hand, moved as the figures at hand are moved from those of the typical part. */
const atGrade = (figures: Figures, { parts }: DiodeFit): Figures => {
  const grade = figure(figures, gradeKey);
  const moved = (key: Exclude<keyof JunctionParameters, 'bandGap'>, between: typeof linear) => {
    const three = { low: parts.low[key], typical: parts.typical[key], high: parts.high[key] };
    return scaledBy(between(three, grade), figure(figures, key), three.typical);
  };
  return {
    saturationCurrent: moved('saturationCurrent', geometric),
    emissionCoefficient: moved('emissionCoefficient', linear),
    seriesResistance: moved('seriesResistance', linear),
  };
};
