import type { Result } from '../../values/result.ts';
import { failure, success } from '../../values/result.ts';
import type { Draw } from '../kind.ts';
import { bipolarParameters } from './bipolarParameters.ts';
import type { BipolarDevice } from './bipolarSchema.ts';
import { parameterAssumptions, parameterDraws } from './parameter.ts';

export const bipolarDraws = (device: BipolarDevice): Result<readonly Draw[]> => {
  if (device.model === undefined) {
    return failure({
      code: 'not-fitted',
      message: 'Devices entered by facts are not fitted yet.',
      found: 'facts',
      allowed: 'a model',
    });
  }
  return success(parameterDraws(bipolarParameters, device.model));
};

export const bipolarAssumptions = (device: BipolarDevice): readonly string[] => [
  ...parameterAssumptions(bipolarParameters, device.model ?? {}),
  ...(device.model?.earlyVoltage === undefined ? ['no Early voltage (none stated)'] : []),
];
