import type { Fault } from '../../values/result.ts';
import { kindOf } from '../partContext.ts';
import type { StageDocument } from '../schema/stage.ts';
import { splitSetKey } from '../states.ts';
import { faultAt } from './fault.ts';

/** Of rails of one name at most one holds a voltage, in every state. */
export function checkRails(document: StageDocument): readonly Fault[] {
  const faults: Fault[] = [];
  const isRail = (id: string) => {
    const part = document.parts[id];
    return part !== undefined && kindOf(part).joins === 'name';
  };
  const refuse = (path: readonly string[], name: string, holder: string, other: string) =>
    faults.push({
      ...faultAt(
        path,
        'two-voltages',
        `Rail ${name} has its voltage at ${holder} already: state it in one place only.`,
        `a voltage at ${holder} and at ${other}`,
        'one voltage for all rails of one name',
      ),
      parts: [holder, other],
    });

  const holders = new Map<string, string>();
  for (const [id, part] of Object.entries(document.parts)) {
    if (!isRail(id) || part.name === undefined || part.values?.voltage === undefined) continue;
    const holder = holders.get(part.name);
    if (holder === undefined) holders.set(part.name, id);
    else refuse(['parts', id, 'values', 'voltage'], part.name, holder, id);
  }
  for (const [state, { set }] of Object.entries(document.states)) {
    const here = new Map(holders);
    for (const key of Object.keys(set ?? {})) {
      const [id, of] = splitSetKey(key);
      const name = document.parts[id]?.name;
      // A rail that states a voltage itself was judged above.
      const judged = document.parts[id]?.values?.voltage !== undefined;
      if (of !== 'voltage' || name === undefined || judged || !isRail(id)) continue;
      const holder = here.get(name);
      if (holder !== undefined && holder !== id) refuse(['states', state, 'set', key], name, holder, id);
      here.set(name, holder ?? id);
    }
  }
  return faults;
}
