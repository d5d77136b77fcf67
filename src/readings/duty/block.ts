import { amperes } from '../words.ts';
import type { Condition } from './condition.ts';
import type { BlockTerms } from './terms.ts';

const atMost = (
  element: number,
  quantity: string,
  bound: number,
  say: (value: number) => string,
): Condition => ({
  limit: { element, quantity, sense: 'most', bound },
  loses: 'missed',
  whenNotSet: 'lost',
  say: (value) => [say(value)],
});

/** A MOSFET blocks while neither its drain current nor either junction, forward, passes its leak. Ratings apart. */
export const mosfetBlock = (element: number, { leakLimit }: BlockTerms): readonly Condition[] => [
  atMost(
    element,
    'currentMagnitude',
    leakLimit,
    (value) => `${amperes(value)} flows, more than the ${amperes(leakLimit)} it may leak`,
  ),
  atMost(
    element,
    'forwardJunction',
    leakLimit,
    (value) => `a body junction carries ${amperes(value)} forward, more than ${amperes(leakLimit)}`,
  ),
];

/** A bipolar transistor blocks while neither its collector nor its base current passes its leak. Ratings apart. */
export const bipolarBlock = (element: number, { leakLimit }: BlockTerms): readonly Condition[] => [
  atMost(
    element,
    'currentMagnitude',
    leakLimit,
    (value) => `${amperes(value)} flows, more than the ${amperes(leakLimit)} it may leak`,
  ),
  atMost(
    element,
    'baseMagnitude',
    leakLimit,
    (value) => `its junctions carry ${amperes(value)}, more than ${amperes(leakLimit)}`,
  ),
];
