import type { Draw, Law, Values } from '../kind.ts';
import type { Result } from '../../values/result.ts';
import { failure, success } from '../../values/result.ts';
import { drawOf, specOf } from '../values.ts';
import { modelParameters } from './mosfetParameters.ts';
import type { MosfetDevice } from './mosfetSchema.ts';
import { parameterAssumptions, parameterDraws } from './parameter.ts';

/** A channel's width and length, where its device is a process and not a finished transistor. */
const sizeDraws = (device: MosfetDevice, values: Values): readonly Draw[] =>
  device.model?.processTransconductance === undefined
    ? []
    : ['width', 'length'].flatMap((key) => {
        const spec = specOf(values, key);
        return spec === undefined ? [] : [drawOf(key, 'length', spec)];
      });

export const mosfetDraws = (device: MosfetDevice, values: Values, law: Law): Result<readonly Draw[]> => {
  if (device.model === undefined) {
    return failure({
      code: 'not-fitted',
      message: 'Devices entered by facts are not fitted yet.',
      found: 'facts',
      allowed: 'a model',
    });
  }
  return success([
    ...parameterDraws(modelParameters(device, law), device.model),
    ...sizeDraws(device, values),
  ]);
};

export const mosfetAssumptions = (device: MosfetDevice, law: Law): readonly string[] =>
  parameterAssumptions(modelParameters(device, law), device.model ?? {});
