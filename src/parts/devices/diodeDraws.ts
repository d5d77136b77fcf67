import type { DiodeFit } from '../../../solver/fit/index.ts';
import type { Result } from '../../values/result.ts';
import { success } from '../../values/result.ts';
import type { Draw } from '../kind.ts';
import { defaultDraw } from '../values.ts';
import {
  breakdownFit,
  diodeFactFigures,
  fitReportsOf,
  forwardFit,
  freeClauses,
  middleOf,
  zenerFactFigures,
} from './fitting.ts';
import type { AnyDiode } from './fitting.ts';
import { diodeParameters, zenerParameters } from './diodeParameters.ts';
import type { ZenerDevice } from './diodeSchema.ts';
import type { FactFigures } from './fact.ts';
import { gradeDraw } from './grade.ts';
import { parameterAssumptions, parameterDraws } from './parameter.ts';

const parametersOf = (device: AnyDiode) =>
  device.type === 'zener'
    ? zenerParameters
    : diodeParameters(device.type, device.model?.bandGap !== undefined);

const factDraw = (key: string, quantity: Draw['quantity'], of: FactFigures): Draw => {
  const value = middleOf(of);
  return { key, quantity, value, low: of.low ?? value, high: of.high ?? value, stated: true };
};

/** The forward law, at the typical part; the grade moves it together. */
const forwardDraws = (device: AnyDiode, { parts, current }: DiodeFit): readonly Draw[] => {
  const { typical, low, high } = parts;
  const hasSpread = [low, high].some(
    ({ saturationCurrent }) => saturationCurrent !== typical.saturationCurrent,
  );
  const [coefficient] = diodeFactFigures(device).forwardTemperatureCoefficient;
  const temperature = parameterDraws(diodeParameters(device.type, false), {}).filter(
    ({ key }) => key === 'bandGap' || key === 'forwardTemperatureCoefficient',
  );
  const stated = (key: string, quantity: Draw['quantity'], value: number): Draw => ({
    ...defaultDraw(key, quantity, value),
    stated: true,
  });
  return [
    gradeDraw(hasSpread),
    stated('saturationCurrent', 'saturationCurrent', typical.saturationCurrent),
    stated('emissionCoefficient', 'emissionCoefficient', typical.emissionCoefficient),
    stated('seriesResistance', 'seriesResistance', typical.seriesResistance),
    ...(coefficient === undefined
      ? temperature
      : [factDraw('forwardTemperatureCoefficient', 'voltageTemperatureCoefficient', coefficient)]),
    stated('coefficientCurrent', 'currentMagnitude', current),
  ];
};

const breakdownDraws = (device: ZenerDevice): Result<readonly Draw[]> => {
  const fit = breakdownFit(device);
  if (!fit.ok) return fit;
  const { voltage, current, resistance } = fit.value;
  const [coefficient] = zenerFactFigures(device).breakdownTemperatureCoefficient;
  const stated = (key: string, quantity: Draw['quantity'], value: number): Draw => ({
    ...defaultDraw(key, quantity, value),
    stated: true,
  });
  return success([
    {
      ...stated('breakdownVoltage', 'voltageMagnitude', voltage.typical),
      low: voltage.low,
      high: voltage.high,
    },
    stated('breakdownCurrent', 'currentMagnitude', current),
    stated('breakdownResistance', 'seriesResistance', resistance),
    coefficient === undefined
      ? defaultDraw('breakdownTemperatureCoefficient', 'voltageTemperatureCoefficient', 0)
      : factDraw('breakdownTemperatureCoefficient', 'voltageTemperatureCoefficient', coefficient),
  ]);
};

/** A Zener of whose forward law nothing is stated has the usual one. */
const hasForwardFacts = (device: AnyDiode) =>
  device.type !== 'zener' || device.facts?.forwardVoltage !== undefined;

export const diodeDraws = (device: AnyDiode): Result<readonly Draw[]> => {
  if (device.model !== undefined) return success(parameterDraws(parametersOf(device), device.model));
  const breakdown = device.type === 'zener' ? breakdownDraws(device) : success([]);
  if (!breakdown.ok) return breakdown;
  if (!hasForwardFacts(device)) {
    return success([...parameterDraws(diodeParameters('zener', false), {}), ...breakdown.value]);
  }
  const forward = forwardFit(device);
  return forward.ok ? success([...forwardDraws(device, forward.value), ...breakdown.value]) : forward;
};

export const diodeAssumptions = (device: AnyDiode): readonly string[] => {
  if (device.model !== undefined) return parameterAssumptions(parametersOf(device), device.model);
  const { facts } = device;
  const isDetermined = (key: string) => {
    if (key === 'bandGap' || key === 'forwardTemperatureCoefficient') {
      return facts?.forwardTemperatureCoefficient !== undefined;
    }
    if (key === 'breakdownTemperatureCoefficient') {
      return facts !== undefined && 'breakdownTemperatureCoefficient' in facts;
    }
    // What the fits settled or left open, they say themselves.
    return key.startsWith('breakdown') || hasForwardFacts(device);
  };
  return [
    ...parameterAssumptions(
      parametersOf(device).filter(({ key }) => !isDetermined(key)),
      {},
    ),
    ...freeClauses(fitReportsOf(device, 'square')),
  ];
};

/** The fit whose grades a diode's figures follow, where it was entered by facts that determine its forward law. */
export const diodeGrades = (device: AnyDiode): DiodeFit | undefined => {
  if (device.model !== undefined || !hasForwardFacts(device)) return undefined;
  const fit = forwardFit(device);
  return fit.ok ? fit.value : undefined;
};
