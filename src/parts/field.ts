/**
 * The entries of a part's `values`, said once: for the schema of the stage file and for the forms on the screen.
 */
import * as z from 'zod';
import type { QuantityName } from '../values/quantities.ts';
import { choice, plainQuantity, quantity, shortText, yesOrNo } from '../values/schema.ts';

interface Entry {
  readonly key: string;
  readonly label: string;
  readonly optional: boolean;
}

/** A number with a unit, as typed. */
export interface QuantityField extends Entry {
  readonly form: 'quantity';
  readonly quantity: QuantityName;
  /** What holds where nothing is stated, SI. */
  readonly fallback?: number;
  /** Whether a tolerance, or low and high, may be stated. */
  readonly spread: boolean;
  /** Whether it has to do with the operating point, so that a spread or a question may vary it. */
  readonly varied: boolean;
}

export interface ChoiceField extends Entry {
  readonly form: 'choice';
  readonly choices: readonly { readonly value: string; readonly label: string }[];
  readonly fallback?: string;
}

export interface YesNoField extends Entry {
  readonly form: 'yes-no';
}

export interface TextField extends Entry {
  readonly form: 'text';
}

export type Field = QuantityField | ChoiceField | YesNoField | TextField;

/** A quantity that must be stated. */
export const stated = (key: string, label: string, of: QuantityName): QuantityField => ({
  form: 'quantity',
  key,
  label,
  quantity: of,
  optional: false,
  spread: true,
  varied: true,
});

/** A quantity that may be left out, with what then holds. */
export const optional = (key: string, label: string, of: QuantityName, fallback?: number): QuantityField => ({
  ...stated(key, label, of),
  optional: true,
  ...(fallback === undefined ? {} : { fallback }),
});

/** A quantity that does not move the operating point: a rating, the size of a signal. */
export const aside = (key: string, label: string, of: QuantityName): QuantityField => ({
  ...optional(key, label, of),
  spread: false,
  varied: false,
});

const schemaOfField = (field: Field): z.ZodType => {
  switch (field.form) {
    case 'quantity':
      return field.spread ? quantity(field.quantity) : plainQuantity(field.quantity);
    case 'choice': {
      const [first = '', ...others] = field.choices.map(({ value }) => value);
      return choice(first, ...others);
    }
    case 'yes-no':
      return yesOrNo();
    case 'text':
      return shortText();
  }
};

/** The strict schema of a part's `values`: these entries and no others. */
export const schemaOf = (fields: readonly Field[]): z.ZodObject =>
  z.strictObject(
    Object.fromEntries(
      fields.map((field) => {
        const schema = schemaOfField(field);
        return [field.key, field.optional ? z.exactOptional(schema) : schema];
      }),
    ),
  );
