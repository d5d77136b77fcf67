/** The value of a part that is edited on the sheet. */
import type { QuantityField } from '../parts/field.ts';
import { specOf } from '../parts/values.ts';
import { kindOf } from '../stage/partContext.ts';
import type { StageDocument } from '../stage/schema/stage.ts';
import { inState } from '../stage/states.ts';
import { resolveValue, type ResolvedValue, type ValueSpec } from '../values/value-spec.ts';
import type { ValuePlace } from './edits/setValue.ts';

export interface PartValue extends ValuePlace {
  /** As a form names it: `resistance`. */
  readonly label: string;
  /** As the document states it in the state that is shown. */
  readonly spec: ValueSpec;
  readonly resolved: ResolvedValue;
}

/** The first quantity of a part that is stated and moves the operating point; else the first that is stated at all. */
export const mainValueOf = (document: StageDocument, state: string, id: string): PartValue | undefined => {
  const part = (inState(document, state) ?? document).parts[id];
  if (part === undefined) return undefined;
  const values = part.values ?? {};
  const stated = kindOf(part)
    .fields.filter((field): field is QuantityField => field.form === 'quantity')
    .filter(({ key }) => specOf(values, key) !== undefined);
  const field = stated.find(({ varied }) => varied) ?? stated[0];
  const spec = field === undefined ? undefined : specOf(values, field.key);
  if (field === undefined || spec === undefined) return undefined;
  const { key, quantity, label } = field;
  return { part: id, key, quantity, label, spec, resolved: resolveValue(spec, quantity) };
};
