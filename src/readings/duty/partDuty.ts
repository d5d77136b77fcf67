import type { Device } from '../../parts/devices/device.ts';
import { ratingsOf } from '../../parts/devices/ratings.ts';
import type { Ratings } from '../../parts/devices/ratings.ts';
import { resolvePlain } from '../../values/value-spec.ts';
import type { PlainValue } from '../../values/value-spec.ts';
import type { CompiledPart } from '../compile.ts';
import { powerRating, ratingLimits } from '../ratings.ts';
import type { RatingLimit } from '../ratings.ts';
import type { DutyKind } from '../readings.ts';
import { bipolarAmplify, mosfetAmplify } from './amplify.ts';
import { bipolarBlock, mosfetBlock } from './block.ts';
import { bipolarConduct, mosfetConduct } from './conduct.ts';
import type { Condition, DutyConditions } from './condition.ts';
import { deviceFacts, dutyTerms } from './fromDocument.ts';
import type { DeviceFacts, DutyTerms } from './terms.ts';

/** All that is asked of one part in one state, as plain data: its duty where it has one, and its ratings. */
export interface PartDuty {
  readonly part: CompiledPart;
  /** Place of its element in the circuit. */
  readonly element: number;
  readonly duty: DutyKind;
  /** Null where it has no duty. */
  readonly terms: DutyTerms | null;
  readonly facts: DeviceFacts;
  readonly asked: DutyConditions;
  readonly ratings: Ratings;
  readonly ratingLimits: readonly RatingLimit[];
}

const nothingAsked: DutyConditions = { conditions: [], remarks: [] };

const familyOf = (device: Device): 'mosfet' | 'bipolar' | 'diode' =>
  device.type === 'mosfet' || device.type === 'bipolar' ? device.type : 'diode';

const askedOf = (device: Device, element: number, terms: DutyTerms, facts: DeviceFacts): DutyConditions => {
  const bipolar = device.type === 'bipolar';
  switch (terms.kind) {
    case 'amplify':
      return {
        conditions: bipolar ? bipolarAmplify(element, terms) : mosfetAmplify(element, terms),
        remarks: [],
      };
    case 'conduct':
      return bipolar ? bipolarConduct(element, terms) : mosfetConduct(element, terms, facts);
    case 'block':
      return {
        conditions: bipolar ? bipolarBlock(element, terms) : mosfetBlock(element, terms),
        remarks: [],
      };
  }
};

const asCondition = ({ limit, say }: RatingLimit): Condition => ({
  limit,
  loses: 'missed',
  whenNotSet: 'kept',
  say: (quantity) => [say(quantity)],
});

const ofDevice = (part: CompiledPart, element: number, device: Device, ambient: number): PartDuty => {
  const terms = part.kind.takesDuty ? dutyTerms(part.part.duty, device, ambient) : null;
  const facts = deviceFacts(device);
  const ratings = ratingsOf(device);
  const limits = ratingLimits(familyOf(device), element, ratings, facts.polarity, ambient);
  const asked = terms === null ? nothingAsked : askedOf(device, element, terms, facts);
  return {
    part,
    element,
    duty: terms?.kind ?? 'none',
    terms,
    facts,
    asked:
      terms === null ? asked : { ...asked, conditions: [...asked.conditions, ...limits.map(asCondition)] },
    ratings,
    ratingLimits: limits,
  };
};

/**
 * What is asked of a part at an ambient (°C); null for a part of which nothing is.
 */
export const partDuty = (part: CompiledPart, ambient: number): PartDuty | null => {
  const { principal, device } = part;
  if (principal === null) return null;
  if (device !== undefined) return ofDevice(part, principal, device, ambient);
  const rating = part.part.values?.rating as PlainValue | undefined;
  if (rating === undefined) return null;
  return {
    part,
    element: principal,
    duty: 'none',
    terms: null,
    facts: { enteredBy: 'model', polarity: 1 },
    asked: nothingAsked,
    ratings: {},
    ratingLimits: [powerRating(principal, resolvePlain(rating, 'power'))],
  };
};
