import type { Edit } from '../../stage/history.ts';
import { baseName } from '../../stage/states.ts';
import { checkValue } from '../../values/check-value.ts';
import { failure, success } from '../../values/result.ts';
import type { QuantityName } from '../../values/quantities.ts';
import type { PlainValue, ValueSpec } from '../../values/value-spec.ts';

/** One quantity of a part, as the document holds it. */
export interface ValuePlace {
  /** Id of the part. */
  readonly part: string;
  readonly key: string;
  readonly quantity: QuantityName;
}

/** The same spread about another value. Limits stated as figures stay where they are. */
export const withPlain = (spec: ValueSpec | undefined, value: PlainValue): ValueSpec =>
  typeof spec === 'object' ? { ...spec, value } : value;

/** The same value with another tolerance, a fraction; with none where it is 0. */
export const withTolerance = (spec: ValueSpec, tolerance: number): ValueSpec => {
  const value = typeof spec === 'object' ? spec.value : spec;
  if (tolerance === 0) return value;
  const sigma = typeof spec === 'object' && spec.sigma !== undefined ? { sigma: spec.sigma } : {};
  return { value, tolerance, ...sigma };
};

/**
 * States a value of a part. A value that a state has of its own is changed in that state, any other in the drawing
 * itself, which is where a person reads it.
 * @param state the state that is shown
 */
export const setValue =
  ({ part, key, quantity }: ValuePlace, spec: ValueSpec, state: string): Edit<undefined> =>
  (draft) => {
    const checked = checkValue(spec, quantity);
    if (!checked.ok) return checked;
    const edited = draft.parts[part];
    if (edited === undefined)
      return failure({ code: 'no-such-part', message: `There is no part ${part}.`, found: part });
    const own = state === baseName(draft) ? undefined : draft.states[state]?.set;
    const inState = `${part}.${key}`;
    const isOwn = own !== undefined && Object.hasOwn(own, inState);
    const said = isOwn ? own[inState] : edited.values?.[key];
    // What is stated already makes no step.
    if (JSON.stringify(said) === JSON.stringify(spec)) return success(undefined);
    if (isOwn) own[inState] = spec;
    else edited.values = { ...edited.values, [key]: spec };
    return success(undefined);
  };
