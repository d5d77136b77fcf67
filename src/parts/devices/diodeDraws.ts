import type { Result } from '../../values/result.ts';
import { failure, success } from '../../values/result.ts';
import type { Draw } from '../kind.ts';
import { diodeParameters, zenerParameters } from './diodeParameters.ts';
import type { DiodeDevice, LedDevice, ZenerDevice } from './diodeSchema.ts';
import { parameterAssumptions, parameterDraws } from './parameter.ts';

type AnyDiode = DiodeDevice | LedDevice | ZenerDevice;

const parametersOf = (device: AnyDiode) =>
  device.type === 'zener'
    ? zenerParameters
    : diodeParameters(device.type, device.model?.bandGap !== undefined);

export const diodeDraws = (device: AnyDiode): Result<readonly Draw[]> => {
  if (device.model === undefined) {
    return failure({
      code: 'not-fitted',
      message: 'Devices entered by facts are not fitted yet.',
      found: 'facts',
      allowed: 'a model',
    });
  }
  return success(parameterDraws(parametersOf(device), device.model));
};

export const diodeAssumptions = (device: AnyDiode): readonly string[] =>
  parameterAssumptions(parametersOf(device), device.model ?? {});
