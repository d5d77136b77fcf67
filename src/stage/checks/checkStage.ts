import type { Fault } from '../../values/result.ts';
import type { StageDocument } from '../schema/stage.ts';
import { checkDevices } from './devices.ts';
import { checkPartDuties } from './duties.ts';
import { checkNames } from './names.ts';
import { checkRails } from './rails.ts';
import { checkStates } from './states.ts';
import { checkWires } from './wires.ts';

/** What the schema cannot tell: whether the pieces of a document fit together. */
export const checkStage = (document: StageDocument): readonly Fault[] => [
  ...checkNames(document),
  ...checkDevices(document),
  ...checkPartDuties(document),
  ...checkWires(document),
  ...checkRails(document),
  ...checkStates(document),
];
