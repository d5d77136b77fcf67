import type { Result } from '../../values/result.ts';
import { success } from '../../values/result.ts';
import type { Draw } from '../kind.ts';
import { defaultDraw } from '../values.ts';
import { bipolarParameters } from './bipolarParameters.ts';
import type { BipolarDevice } from './bipolarSchema.ts';
import { bipolarFit, fitReportsOf, freeClauses } from './fitting.ts';
import { parameterAssumptions, parameterDraws } from './parameter.ts';

interface Three {
  readonly low: number;
  readonly typical: number;
  readonly high: number;
}

const threeDraw = (key: string, quantity: Draw['quantity'], { low, typical, high }: Three): Draw => ({
  key,
  quantity,
  value: typical,
  low,
  high,
  stated: true,
});

const gainCoefficient = bipolarParameters.filter(({ key }) => key === 'gainTemperatureCoefficient');

export const bipolarDraws = (device: BipolarDevice): Result<readonly Draw[]> => {
  if (device.model !== undefined) return success(parameterDraws(bipolarParameters, device.model));
  const fit = bipolarFit(device);
  if (!fit.ok) return fit;
  const { saturationCurrent, forwardGain, reverseGain, earlyVoltage } = fit.value;
  return success([
    threeDraw('saturationCurrent', 'saturationCurrent', saturationCurrent),
    threeDraw('forwardGain', 'currentGain', forwardGain),
    { ...defaultDraw('reverseGain', 'currentGain', reverseGain), stated: true },
    ...(earlyVoltage === undefined
      ? []
      : [{ ...defaultDraw('earlyVoltage', 'earlyVoltage', earlyVoltage), stated: true }]),
    ...parameterDraws(gainCoefficient, {}),
  ]);
};

export const bipolarAssumptions = (device: BipolarDevice): readonly string[] => {
  if (device.model === undefined) {
    return [...parameterAssumptions(gainCoefficient, {}), ...freeClauses(fitReportsOf(device, 'square'))];
  }
  return [
    ...parameterAssumptions(bipolarParameters, device.model),
    ...(device.model.earlyVoltage === undefined ? ['no Early voltage (none stated)'] : []),
  ];
};
