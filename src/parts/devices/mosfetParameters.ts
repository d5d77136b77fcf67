/** A MOSFET's parameters at 25 °C, with the defaults of common practice, from its device and its own width and length. */
import { DISCRETE_SATURATION_CURRENT, INTEGRATED_SATURATION_CURRENT } from '../../../solver/index.ts';
import type { MosfetParameters } from '../../../solver/index.ts';
import type { FittedMosfet, MosfetFit } from '../../../solver/fit/index.ts';
import type { Figures, Law } from '../kind.ts';
import { figure } from '../values.ts';
import { geometric, gradeKey, linear, scaledBy } from './grade.ts';
import type { MosfetDevice } from './mosfetSchema.ts';
import type { Fallback, Parameter } from './parameter.ts';

export const polarityOf = (device: MosfetDevice): 1 | -1 => (device.channel === 'n' ? 1 : -1);

const isIntegrated = (device: MosfetDevice) => device.build === 'integrated';

/** Change of the threshold, V/K: common practice for a discrete part, and on a chip. */
export const thresholdCoefficient = (device: MosfetDevice): Fallback => {
  const sign = polarityOf(device);
  if (isIntegrated(device)) {
    return {
      value: -0.002 * sign,
      clause: 'the size of the threshold falls 2 mV/K (not stated; common practice on a chip)',
    };
  }
  const limits = [-0.006 * sign, -0.002 * sign];
  return {
    value: -0.004 * sign,
    low: Math.min(...limits),
    high: Math.max(...limits),
    clause: 'the size of the threshold falls 4 mV/K, 2 to 6 over the spread (not stated; common practice)',
  };
};

export const bodySaturationCurrent = (device: MosfetDevice): Fallback =>
  isIntegrated(device)
    ? {
        value: INTEGRATED_SATURATION_CURRENT,
        clause: 'saturation current of the junctions 1 fA (not stated; usual on a chip)',
      }
    : {
        value: DISCRETE_SATURATION_CURRENT,
        clause: 'saturation current of the body diode 1 pA (not stated; usual for a discrete part)',
      };

export const bodyDiodeParameters = (device: MosfetDevice): readonly Parameter[] => [
  {
    key: 'bodyDiode.saturationCurrent',
    label: 'saturation current of the body diode',
    quantity: 'saturationCurrent',
    fallback: bodySaturationCurrent(device),
  },
  {
    key: 'bodyDiode.emissionCoefficient',
    label: 'emission coefficient of the body diode',
    quantity: 'emissionCoefficient',
    fallback: { value: 1 },
  },
  {
    key: 'bodyDiode.seriesResistance',
    label: 'series resistance of the body diode',
    quantity: 'seriesResistance',
    fallback: { value: 0, clause: 'slope of the body diode never below 10 mΩ' },
  },
];

/** What both ways of entering a device leave to defaults unless stated. */
export const commonParameters = (device: MosfetDevice, law: Law): readonly Parameter[] => {
  const hasBodyFactor = device.model?.bodyFactor !== undefined;
  return [
    {
      key: 'lengthModulation',
      label: 'length modulation',
      quantity: 'lengthModulation',
      fallback: { value: 0 },
    },
    {
      key: 'bodyFactor',
      label: 'body factor',
      quantity: 'bodyFactor',
      fallback: { value: 0, silent: !isIntegrated(device) },
    },
    {
      key: 'surfacePotential',
      label: 'surface potential 2φ_F',
      quantity: 'surfacePotential',
      fallback: { value: 0.7, silent: !hasBodyFactor },
    },
    {
      key: 'slopeFactor',
      label: 'slope factor',
      quantity: 'slopeFactor',
      fallback: { value: 1.3, silent: law !== 'smooth' || hasBodyFactor },
    },
    {
      key: 'thresholdTemperatureCoefficient',
      label: 'temperature coefficient of the threshold',
      quantity: 'voltageTemperatureCoefficient',
      fallback: thresholdCoefficient(device),
    },
  ];
};

/** Of a device entered by its model. */
export const modelParameters = (device: MosfetDevice, law: Law): readonly Parameter[] => [
  { key: 'threshold', label: 'threshold', quantity: 'threshold' },
  { key: 'gainFactor', label: 'gain factor', quantity: 'gainFactor' },
  {
    key: 'processTransconductance',
    label: 'process transconductance',
    quantity: 'processTransconductance',
  },
  ...commonParameters(device, law),
  {
    key: 'drainResistance',
    label: 'drain resistance',
    quantity: 'seriesResistance',
    fallback: { value: 0, silent: isIntegrated(device) },
  },
  {
    key: 'sourceResistance',
    label: 'source resistance',
    quantity: 'seriesResistance',
    fallback: { value: 0, silent: isIntegrated(device) },
  },
  ...bodyDiodeParameters(device),
];

/** What the solver is told, from the numbers at hand. */
export const mosfetFromFigures = (
  device: MosfetDevice,
  atHand: Figures,
  law: Law,
  fit?: MosfetFit,
): MosfetParameters => {
  const figures = fit === undefined ? atHand : { ...atHand, ...atGrade(device, atHand, fit) };
  const gainFactor =
    figures.gainFactor ??
    (figure(figures, 'processTransconductance') * figure(figures, 'width')) / figure(figures, 'length');
  return {
    polarity: polarityOf(device),
    law,
    threshold: figure(figures, 'threshold'),
    gainFactor,
    lengthModulation: figure(figures, 'lengthModulation'),
    bodyFactor: figure(figures, 'bodyFactor'),
    surfacePotential: figure(figures, 'surfacePotential'),
    slopeFactor: figure(figures, 'slopeFactor'),
    thresholdTemperatureCoefficient: figure(figures, 'thresholdTemperatureCoefficient'),
    drainResistance: figure(figures, 'drainResistance'),
    sourceResistance: figure(figures, 'sourceResistance'),
    bodyDiode: {
      saturationCurrent: figure(figures, 'bodyDiode.saturationCurrent'),
      emissionCoefficient: figure(figures, 'bodyDiode.emissionCoefficient'),
      seriesResistance: figure(figures, 'bodyDiode.seriesResistance'),
    },
  };
};

/** What was fitted, for the grade at hand, moved as the figures at hand are moved from those of the typical part. */
const atGrade = (device: MosfetDevice, figures: Figures, { parts }: MosfetFit): Figures => {
  const grade = figure(figures, gradeKey);
  const of = (value: (part: FittedMosfet) => number) => ({
    low: value(parts.low),
    typical: value(parts.typical),
    high: value(parts.high),
  });
  const sign = polarityOf(device);
  const threshold = of((part) => part.threshold);
  const moved = (key: string, three: ReturnType<typeof of>, between: typeof linear) =>
    scaledBy(between(three, grade), figure(figures, key), three.typical);
  return {
    threshold: sign * (linear(threshold, grade) - threshold.typical) + figure(figures, 'threshold'),
    gainFactor: moved(
      'gainFactor',
      of((part) => part.gainFactor),
      geometric,
    ),
    drainResistance: moved(
      'drainResistance',
      of((part) => part.drainResistance),
      linear,
    ),
    sourceResistance: moved(
      'sourceResistance',
      of((part) => part.sourceResistance),
      linear,
    ),
    'bodyDiode.saturationCurrent': moved(
      'bodyDiode.saturationCurrent',
      of((part) => part.bodyDiode.saturationCurrent),
      geometric,
    ),
    'bodyDiode.emissionCoefficient': moved(
      'bodyDiode.emissionCoefficient',
      of((part) => part.bodyDiode.emissionCoefficient),
      linear,
    ),
    'bodyDiode.seriesResistance': moved(
      'bodyDiode.seriesResistance',
      of((part) => part.bodyDiode.seriesResistance),
      linear,
    ),
  };
};
