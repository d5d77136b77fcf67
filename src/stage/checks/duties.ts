import type { Fault } from '../../values/result.ts';
import { kindOf } from '../partContext.ts';
import type { Duty, StageDocument } from '../schema/stage.ts';
import { faultAt } from './fault.ts';

/** A limit that only one type of device knows, by the type. */
const limitOwners: Readonly<Record<string, string>> = { dropLimit: 'mosfet', forcedGain: 'bipolar' };

/** The limits of a duty are those its device knows. */
export function checkDuty(
  document: StageDocument,
  path: readonly (string | number)[],
  part: string,
  duty: Duty,
): readonly Fault[] {
  const of = document.parts[part];
  if (of === undefined || typeof duty === 'string') return [];
  const { deviceTypes } = kindOf(of);
  return Object.keys(duty).flatMap((key) => {
    const owner = limitOwners[key];
    if (owner === undefined || deviceTypes.some((type) => type === owner)) return [];
    const message = `A ${of.kind} has no ${key}: it is a limit of a ${owner} part.`;
    return [faultAt([...path, key], 'limit-does-not-fit', message, key, `limits of a ${of.kind}`)];
  });
}

export const checkPartDuties = (document: StageDocument): readonly Fault[] =>
  Object.entries(document.parts).flatMap(([id, part]) =>
    part.duty === undefined ? [] : checkDuty(document, ['parts', id, 'duty'], id, part.duty),
  );
