import type { Fault } from '../../values/result.ts';
import { baseName } from '../states.ts';
import { kindOf } from '../partContext.ts';
import type { StageDocument } from '../schema/stage.ts';
import { faultAt } from './fault.ts';

/** A word of the command line that stands for every state and part. */
export const allWord = 'all';

/** Names are one part's each, save those of rails and tags; two words are reserved. */
export function checkNames(document: StageDocument): readonly Fault[] {
  const faults: Fault[] = [];
  const base = baseName(document);
  const reserved = new Set([allWord, base]);
  const refuseReserved = (path: readonly string[], name: string) =>
    faults.push(
      faultAt(
        path,
        'reserved-name',
        `"${name}" is reserved${name === allWord ? '' : ' as the name of the base state'}: choose another name.`,
        `"${name}"`,
        `any name but ${[...reserved].join(' and ')}`,
      ),
    );

  const bearers = new Map<string, { readonly id: string; readonly shared: boolean }>();
  for (const [id, part] of Object.entries(document.parts)) {
    const { name } = part;
    if (name === undefined) continue;
    const path = ['parts', id, 'name'];
    if (reserved.has(name)) refuseReserved(path, name);
    const shared = kindOf(part).nameShared;
    const other = bearers.get(name);
    if (other === undefined) bearers.set(name, { id, shared });
    else if (!shared || !other.shared) {
      faults.push({
        ...faultAt(
          path,
          'name-used-twice',
          `Part ${other.id} is already named ${name}: give one of the two another name.`,
          `"${name}"`,
          'a name that no other part has',
        ),
        parts: [other.id, id],
      });
    }
  }
  if (base === allWord) refuseReserved(['base'], base);
  for (const name of Object.keys(document.states)) {
    if (reserved.has(name)) refuseReserved(['states', name], name);
  }
  return faults;
}
