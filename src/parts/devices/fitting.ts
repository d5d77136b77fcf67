/** A device's facts handed to the fits, once for each device and law, and what came of them. */
import { fitBipolar, fitBreakdown, fitDiode, fitMosfet } from '../../../solver/fit/index.ts';
import type {
  BipolarFit,
  BreakdownFit,
  DiodeFit,
  Fact,
  FitReport,
  FitResult,
  JunctionDefaults,
  MosfetFit,
} from '../../../solver/fit/index.ts';
import { ICE_POINT, SILICON_BAND_GAP } from '../../../solver/index.ts';
import type { Result } from '../../values/result.ts';
import { failure, success } from '../../values/result.ts';
import type { Law } from '../kind.ts';
import type { BipolarDevice } from './bipolarSchema.ts';
import { bipolarFactShapes, diodeFactShapes, mosfetFactShapes, zenerFactShapes } from './conditions.ts';
import type { FactShape } from './conditions.ts';
import type { Device } from './device.ts';
import type { DiodeDevice, LedDevice, ZenerDevice } from './diodeSchema.ts';
import type { FactFigures } from './fact.ts';
import { factsInFigures } from './factSchema.ts';
import { bodySaturationCurrent, polarityOf, thresholdCoefficient } from './mosfetParameters.ts';
import type { MosfetDevice } from './mosfetSchema.ts';

/** Stated figures as the fits take them: temperatures in kelvin. */
const inKelvin = <Condition extends string>(
  facts: readonly FactFigures<Condition>[],
): readonly Fact<Condition>[] =>
  facts.map(({ low, typical, high, at }) => ({
    ...(low === undefined ? {} : { low }),
    ...(typical === undefined ? {} : { typical }),
    ...(high === undefined ? {} : { high }),
    at: { ...at, temperature: at.temperature + ICE_POINT },
  }));

/** The figure that stands for a fact: the typical one, else the middle, else the only one. */
export const middleOf = ({ low, typical, high }: FactFigures | Fact): number => {
  if (typical !== undefined) return typical;
  return low !== undefined && high !== undefined ? (low + high) / 2 : (low ?? high ?? 0);
};

const resultOf = <Fit>(result: FitResult<Fit>): Result<Fit> =>
  result.ok
    ? success(result.fit)
    : failure(
        ...result.reasons.map((message) => ({
          code: 'facts-too-few',
          message,
          path: 'facts',
          found: 'facts that determine no device',
          allowed: 'the facts that the message names, or a model',
        })),
      );

/** Remembers what was worked out for an object that never changes, by a key. */
const remembered = <Of extends object, Value>(work: (of: Of, key: string) => Value) => {
  const known = new WeakMap<Of, Map<string, Value>>();
  return (of: Of, key: string): Value => {
    const byKey = known.get(of) ?? new Map<string, Value>();
    known.set(of, byKey);
    const found = byKey.get(key) ?? work(of, key);
    byKey.set(key, found);
    return found;
  };
};

/** Gain factor of a device of whose gain nothing is stated, A/V². */
const usualGainFactor = 0.1;

export const mosfetFactFigures = (device: MosfetDevice) =>
  factsInFigures(mosfetFactShapes, device.facts ?? {});

/** Documents are immutable, so a device's object stands for what it says. */
const fitOfMosfet = remembered((device: MosfetDevice, law: string): Result<MosfetFit> => {
  const facts = mosfetFactFigures(device);
  const [coefficient] = facts.thresholdTemperatureCoefficient;
  const polarity = polarityOf(device);
  return resultOf(
    fitMosfet(
      {
        mode: device.facts?.mode ?? 'enhancement',
        gateThreshold: inKelvin(facts.gateThreshold),
        onResistance: inKelvin(facts.onResistance),
        forwardTransconductance: inKelvin(facts.forwardTransconductance),
        zeroBiasCurrent: inKelvin(facts.zeroBiasCurrent),
        bodyDiodeForward: inKelvin(facts.bodyDiodeForward),
        hotOnResistanceRatio: inKelvin(facts.hotOnResistanceRatio),
      },
      law === 'smooth' ? 'smooth' : 'square',
      {
        gainFactor: usualGainFactor,
        lengthModulation: 0,
        slopeFactor: 1.3,
        thresholdTemperatureCoefficient:
          polarity * (coefficient === undefined ? thresholdCoefficient(device).value : middleOf(coefficient)),
        bodyDiode: {
          saturationCurrent: bodySaturationCurrent(device).value,
          emissionCoefficient: 1,
          seriesResistance: 0,
          bandGap: SILICON_BAND_GAP,
          emissionRange: [1, 2],
        },
      },
    ),
  );
});

export const mosfetFit = (device: MosfetDevice, law: Law): Result<MosfetFit> => fitOfMosfet(device, law);

export type AnyDiode = DiodeDevice | LedDevice | ZenerDevice;

/** Emission coefficients of common practice, where a single forward voltage does not determine one. */
const junctionDefaults: Readonly<Record<AnyDiode['type'], JunctionDefaults>> = {
  diode: {
    saturationCurrent: 1e-9,
    emissionCoefficient: 1.8,
    seriesResistance: 0,
    bandGap: SILICON_BAND_GAP,
    emissionRange: [1, 2.5],
  },
  led: {
    saturationCurrent: 1e-18,
    emissionCoefficient: 2,
    seriesResistance: 0,
    bandGap: SILICON_BAND_GAP,
    emissionRange: [1, 5],
  },
  zener: {
    saturationCurrent: 1e-14,
    emissionCoefficient: 1,
    seriesResistance: 0,
    bandGap: SILICON_BAND_GAP,
    emissionRange: [1, 2.5],
  },
};

export const diodeFactFigures = (device: AnyDiode) =>
  factsInFigures(device.type === 'zener' ? zenerFactShapes : diodeFactShapes, device.facts ?? {});

export const zenerFactFigures = (device: ZenerDevice) => factsInFigures(zenerFactShapes, device.facts ?? {});

const fitOfForward = remembered((device: AnyDiode): Result<DiodeFit> => {
  const facts = diodeFactFigures(device);
  return resultOf(
    fitDiode(
      {
        forwardVoltage: inKelvin(facts.forwardVoltage),
        reverseCurrent: inKelvin(facts.reverseCurrent),
      },
      junctionDefaults[device.type],
    ),
  );
});

export const forwardFit = (device: AnyDiode): Result<DiodeFit> => fitOfForward(device, '');

const fitOfBreakdown = remembered((device: ZenerDevice): Result<BreakdownFit> => {
  const facts = zenerFactFigures(device);
  return resultOf(
    fitBreakdown({
      breakdownVoltage: inKelvin(facts.breakdownVoltage),
      dynamicResistance: inKelvin(facts.dynamicResistance),
    }),
  );
});

export const breakdownFit = (device: ZenerDevice): Result<BreakdownFit> => fitOfBreakdown(device, '');

const fitOfBipolar = remembered((device: BipolarDevice): Result<BipolarFit> => {
  const facts = factsInFigures(bipolarFactShapes, device.facts ?? {});
  return resultOf(
    fitBipolar(
      {
        currentGain: inKelvin(facts.currentGain),
        baseToEmitter: inKelvin(facts.baseToEmitter),
        saturationVoltage: inKelvin(facts.saturationVoltage),
        outputConductance: inKelvin(facts.outputConductance),
      },
      { saturationCurrent: 1e-14, reverseGain: 1, gainTemperatureCoefficient: 0.006 },
    ),
  );
});

export const bipolarFit = (device: BipolarDevice): Result<BipolarFit> => fitOfBipolar(device, '');

/** What a device's fits have to say: each fact beside what the model gives, what was left open, what conflicts. */
export const fitReportsOf = (device: Device, law: Law): readonly FitReport[] => {
  if (device.facts === undefined) return [];
  const fits: readonly Result<{ readonly report: FitReport }>[] =
    device.type === 'mosfet'
      ? [mosfetFit(device, law)]
      : device.type === 'bipolar'
        ? [bipolarFit(device)]
        : device.type === 'zener'
          ? [breakdownFit(device), ...(device.facts.forwardVoltage === undefined ? [] : [forwardFit(device)])]
          : [forwardFit(device)];
  return fits.flatMap((fit) => (fit.ok ? [fit.value.report] : []));
};

/** Labels and units of a device's facts, for whoever shows a report. */
export const factShapesOf = (type: Device['type']): Readonly<Record<string, FactShape>> =>
  ({
    mosfet: mosfetFactShapes,
    bipolar: bipolarFactShapes,
    diode: diodeFactShapes,
    led: diodeFactShapes,
    zener: zenerFactShapes,
  })[type];

/** A clause for each parameter that the facts left open. */
export const freeClauses = (reports: readonly FitReport[]): readonly string[] => [
  ...new Set(
    reports.flatMap(({ free }) => free.map(({ parameter, reason }) => `${wordsOf(parameter)}: ${reason}`)),
  ),
];

/** `bodyDiode.saturationCurrent` as `body diode, saturation current`. */
const wordsOf = (parameter: string): string =>
  parameter
    .replaceAll('.', ', ')
    .replaceAll(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`)
    .replace('early voltage', 'Early voltage');
