import type { DutyLimits } from '../../stage/schema/stage.ts';
import type { Duty } from '../../stage/schema/stage.ts';
import { bipolarFactShapes, mosfetFactShapes } from '../../parts/devices/conditions.ts';
import { factFigures } from '../../parts/devices/fact.ts';
import type { FactFigures } from '../../parts/devices/fact.ts';
import type { Device } from '../../parts/devices/device.ts';
import { resolvePlain } from '../../values/value-spec.ts';
import type { DeviceFacts, DutyTerms } from './terms.ts';

/** Where neither the duty nor the device states one. */
const defaultLeak = 1e-6; // A
const defaultForcedGain = 10;
const defaultSaturationVoltage = 0.2; // V
/** A leakage doubles about every 10 K (common practice). */
const leakDoubling = 10; // K

const largest = (fact: FactFigures): number => fact.high ?? fact.typical ?? fact.low ?? 0;

/** The largest leakage stated at the temperature nearest the ambient, brought to the ambient; A. */
const statedLeak = (facts: readonly FactFigures[], ambient: number): number | null => {
  if (facts.length === 0) return null;
  const distance = (fact: FactFigures): number => Math.abs(fact.at.temperature - ambient);
  const nearest = Math.min(...facts.map(distance));
  return Math.max(
    ...facts
      .filter((fact) => distance(fact) === nearest)
      .map((fact) => largest(fact) * 2 ** ((ambient - fact.at.temperature) / leakDoubling)),
  );
};

const leakFacts = (device: Device): readonly FactFigures[] => {
  if (device.type === 'mosfet') {
    const { figure, at } = mosfetFactShapes.drainLeakage;
    return factFigures(device.facts?.drainLeakage, figure, at);
  }
  if (device.type === 'bipolar') {
    const { figure, at } = bipolarFactShapes.collectorLeakage;
    return factFigures(device.facts?.collectorLeakage, figure, at);
  }
  return [];
};

const saturationVoltage = (device: Device): number => {
  if (device.type !== 'bipolar') return defaultSaturationVoltage;
  const { figure, at } = bipolarFactShapes.saturationVoltage;
  const stated = factFigures(device.facts?.saturationVoltage, figure, at).map(largest);
  return stated.length === 0 ? defaultSaturationVoltage : Math.max(...stated);
};

/**
 * What a part's duty asks in numbers; null where it has none.
 *
 * @param ambient °C
 */
export const dutyTerms = (duty: Duty | undefined, device: Device, ambient: number): DutyTerms | null => {
  const stated: DutyLimits | undefined = typeof duty === 'string' ? { kind: duty } : duty;
  if (stated === undefined) return null;
  switch (stated.kind) {
    case 'none':
      return null;
    case 'amplify':
      return {
        kind: 'amplify',
        signalPeak: stated.signalPeak === undefined ? 0 : resolvePlain(stated.signalPeak, 'voltageMagnitude'),
        ...(stated.currentWindow === undefined
          ? {}
          : {
              currentWindow: {
                low: resolvePlain(stated.currentWindow.low, 'current'),
                high: resolvePlain(stated.currentWindow.high, 'current'),
              },
            }),
        saturationVoltage: saturationVoltage(device),
      };
    case 'conduct':
      return {
        kind: 'conduct',
        ...(stated.dropLimit === undefined
          ? {}
          : { dropLimit: resolvePlain(stated.dropLimit, 'voltageMagnitude') }),
        forcedGain:
          stated.forcedGain === undefined
            ? defaultForcedGain
            : resolvePlain(stated.forcedGain, 'currentGain'),
      };
    case 'block':
      return {
        kind: 'block',
        leakLimit:
          stated.leakLimit === undefined
            ? (statedLeak(leakFacts(device), ambient) ?? defaultLeak)
            : resolvePlain(stated.leakLimit, 'currentMagnitude'),
      };
  }
};

/** What a device's data sheet says of it as a switch. */
export const deviceFacts = (device: Device): DeviceFacts => {
  const enteredBy = device.facts === undefined ? 'model' : 'facts';
  if (device.type === 'bipolar') return { enteredBy, polarity: device.polarity === 'n-p-n' ? 1 : -1 };
  if (device.type !== 'mosfet') return { enteredBy, polarity: 1 };
  const { figure, at } = mosfetFactShapes.onResistance;
  const resistances = factFigures(device.facts?.onResistance, figure, at);
  const drives = resistances.flatMap((fact) =>
    fact.high === undefined || fact.at.gateToSource === undefined ? [] : [fact.at.gateToSource],
  );
  return {
    enteredBy,
    polarity: device.channel === 'n' ? 1 : -1,
    ...(resistances.length === 0 ? {} : { largestOnResistance: Math.max(...resistances.map(largest)) }),
    ...(drives.length === 0 ? {} : { coveredFrom: Math.min(...drives) }),
  };
};
