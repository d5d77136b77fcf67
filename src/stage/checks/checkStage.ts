import type { Fault } from '../../values/result.ts';
import type { StageDocument } from '../schema/stage.ts';
import { checkDevices } from './devices.ts';
import { checkPartDuties } from './duties.ts';
import { checkNames } from './names.ts';
import { checkRails } from './rails.ts';
import { checkStates } from './states.ts';
import { checkWires } from './wires.ts';

/** What the schema cannot tell: whether the pieces of a document fit together. */
export const checkStage = (document: StageDocument): readonly Fault[] => {
  const devices = checkDevices(document);
  return [
    ...checkNames(document),
    ...devices,
    ...checkPartDuties(document),
    // The pins of a part follow from its device: its wires can be judged once the devices fit.
    ...(devices.length > 0 ? [] : checkWires(document)),
    ...checkRails(document),
    ...checkStates(document),
  ];
};
