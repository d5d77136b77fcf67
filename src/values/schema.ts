import * as z from 'zod';
import { checkPlain, checkValue } from './check-value.ts';
import { quantityOf } from './quantities.ts';
import type { QuantityName } from './quantities.ts';
import { describeFound } from './found.ts';
import type { Fault, Result } from './result.ts';
import type { PlainValue, ValueSpec } from './value-spec.ts';

/** What a field of a part or device holds, for whoever edits, formats or varies it. */
export type FieldInfo =
  | { readonly type: 'quantity'; readonly quantity: QuantityName; readonly spread: boolean }
  | { readonly type: 'choice'; readonly choices: readonly string[] }
  | { readonly type: 'boolean' }
  | { readonly type: 'text' };

const fields = z.registry<FieldInfo>();

/** What a field holds, seen through `.optional()` and the like; undefined for a schema that is not a field. */
export function fieldOf(schema: z.core.$ZodType): FieldInfo | undefined {
  const info = fields.get(schema);
  if (info !== undefined) return info;
  if (schema instanceof z.ZodOptional || schema instanceof z.ZodExactOptional) {
    return fieldOf(schema.unwrap());
  }
  return undefined;
}

/** A zod issue's `params` where it was made here: the fault it stands for, without its path. */
export interface IssueParams {
  readonly fault: Fault;
}

const checked = <Value>(check: (value: unknown) => Result<unknown>) =>
  z.custom<Value>().superRefine((value, context) => {
    const result = check(value);
    if (result.ok) return;
    for (const fault of result.faults) {
      context.addIssue({
        code: 'custom',
        message: fault.message,
        path: fault.path === undefined ? [] : [fault.path],
        params: { fault } satisfies IssueParams,
        // Checks of the whole object run only on values that are right by themselves.
        continue: false,
      });
    }
  });

/** A value with or without a spread: a number, text, `{ value, tolerance }` or `{ value, low, high }`. */
export function quantity(name: QuantityName) {
  const schema = checked<ValueSpec>((value) => checkValue(value, name));
  schema.register(fields, { type: 'quantity', quantity: name, spread: true });
  return schema;
}

/** A value that has no spread: a number or text. */
export function plainQuantity(name: QuantityName) {
  const schema = checked<PlainValue>((value) => checkPlain(value, name));
  schema.register(fields, { type: 'quantity', quantity: name, spread: false });
  return schema;
}

/** One of a few words. */
export function choice<const Choices extends readonly [string, ...string[]]>(...choices: Choices) {
  const schema = checked<Choices[number]>((value) =>
    typeof value === 'string' && choices.includes(value)
      ? { ok: true, value }
      : {
          ok: false,
          faults: [
            {
              code: 'unknown-choice',
              message: `Choose one of: ${choices.join(', ')}.`,
              found: describeFound(value),
              allowed: choices.join(', '),
            },
          ],
        },
  );
  schema.register(fields, { type: 'choice', choices });
  return schema;
}

/** True or false. */
export function yesOrNo() {
  const schema = z.boolean();
  schema.register(fields, { type: 'boolean' });
  return schema;
}

/** Free text of one line, 1 … `longest` characters. */
export function shortText(longest = 200) {
  const schema = checked<string>((value) =>
    typeof value === 'string' && value.length > 0 && value.length <= longest
      ? { ok: true, value }
      : {
          ok: false,
          faults: [
            {
              code: 'wrong-text',
              message: `Write text of 1 to ${longest} characters.`,
              found: describeFound(value),
              allowed: `text of 1 to ${longest} characters`,
            },
          ],
        },
  );
  schema.register(fields, { type: 'text' });
  return schema;
}

/** The unit a field's numbers are written with; empty where it has none. */
export const unitOf = (info: FieldInfo): string =>
  info.type === 'quantity' ? quantityOf(info.quantity).unit : '';
