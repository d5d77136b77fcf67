import { success } from '../values/result.ts';
import { schemaOf } from './field.ts';
import type { PartKind } from './kind.ts';
import { fieldAssumptions, fieldDraws } from './values.ts';

type Defaulted =
  | 'nameNeeded'
  | 'nameShared'
  | 'deviceTypes'
  | 'takesDuty'
  | 'joins'
  | 'check'
  | 'pins'
  | 'draws'
  | 'assumptions'
  | 'principal';

/** A part kind from what is its own; for the rest, what holds of most kinds. */
export const definePart = (
  own: Omit<PartKind, Defaulted | 'values'> & Partial<Pick<PartKind, Defaulted>>,
): PartKind => ({
  nameNeeded: true,
  nameShared: false,
  deviceTypes: [],
  takesDuty: false,
  joins: 'nothing',
  principal: 0,
  values: schemaOf(own.fields),
  check: () => [],
  pins: (context) => own.symbol(context).pins,
  draws: ({ values }) => success(fieldDraws(own.fields, values)),
  assumptions: ({ values }) => fieldAssumptions(own.fields, values),
  ...own,
});
