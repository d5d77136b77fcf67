import type * as z from 'zod';
import type { Fault } from '../../values/result.ts';
import { kindOf } from '../partContext.ts';
import type { State, StageDocument } from '../schema/stage.ts';
import { describeAllowed, faultsOf } from '../schema/faults.ts';
import { splitSetKey } from '../states.ts';
import { checkDuty } from './duties.ts';
import { faultAt, listed } from './fault.ts';

/** Each state speaks of parts, values and duties that there are. */
export const checkStates = (document: StageDocument): readonly Fault[] =>
  Object.entries(document.states).flatMap(([name, state]) => [
    ...checkSet(document, name, state),
    ...checkDuties(document, name, state),
  ]);

function checkSet(document: StageDocument, state: string, { set }: State): readonly Fault[] {
  return Object.entries(set ?? {}).flatMap(([key, value]) => {
    const path = ['states', state, 'set', key];
    const [id, of] = splitSetKey(key);
    const part = Object.hasOwn(document.parts, id) ? document.parts[id] : undefined;
    if (part === undefined) {
      const message = `There is no part ${id}: write the id of a part, a point and the name of a value.`;
      return [faultAt(path, 'no-such-part', message, `"${key}"`, listed(Object.keys(document.parts)))];
    }
    const shape = kindOf(part).values.shape as Readonly<Record<string, z.ZodType>>;
    // A label joins nodes, and what is joined is the same in every state.
    const settable = Object.keys(shape).filter((name) => name !== 'label');
    const schema = settable.includes(of) ? shape[of] : undefined;
    if (schema === undefined) {
      const message = `A ${part.kind} has no value "${of.slice(0, 60)}" that a state can set.`;
      return [faultAt(path, 'no-such-value', message, `"${key}"`, listed(settable))];
    }
    const result = schema.safeParse(value, { error: describeAllowed });
    if (result.success) return [];
    return faultsOf(
      result.error.issues.map((issue) => ({ ...issue, path: [...path, ...issue.path] })),
      document,
    );
  });
}

function checkDuties(document: StageDocument, state: string, { duties }: State): readonly Fault[] {
  return Object.entries(duties ?? {}).flatMap(([id, duty]) => {
    const path = ['states', state, 'duties', id];
    const part = Object.hasOwn(document.parts, id) ? document.parts[id] : undefined;
    const bearing = () => listed(Object.keys(document.parts).filter((other) => hasDuty(document, other)));
    if (part === undefined)
      return [faultAt(path, 'no-such-part', `There is no part ${id}.`, `"${id}"`, bearing())];
    if (!kindOf(part).takesDuty) {
      return [faultAt(path, 'no-duty', `A ${part.kind} has no duty.`, `"${id}"`, bearing())];
    }
    return checkDuty(document, path, id, duty);
  });
}

const hasDuty = (document: StageDocument, id: string): boolean => {
  const part = document.parts[id];
  return part !== undefined && kindOf(part).takesDuty;
};
