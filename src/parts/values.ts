/** A part's values read by key. They have passed the kind's schema; what is not there is undefined. */
import { formatQuantity } from '../values/format.ts';
import type { QuantityName } from '../values/quantities.ts';
import { formatStated } from '../values/value-text.ts';
import { resolveValue } from '../values/value-spec.ts';
import type { ValueSpec } from '../values/value-spec.ts';
import type { Field, QuantityField } from './field.ts';
import type { Draw, Figures, PartContext, Values } from './kind.ts';

export const specOf = (values: Values, key: string): ValueSpec | undefined =>
  values[key] as ValueSpec | undefined;

export const textOf = (values: Values, key: string): string | undefined => {
  const value = values[key];
  return typeof value === 'string' ? value : undefined;
};

/** The stated value as a line of text at the symbol; no line where nothing is stated. */
export const statedLine = (context: PartContext, key: string, of: QuantityName): readonly string[] => {
  const spec = specOf(context.values, key);
  return spec === undefined ? [] : [formatStated(spec, of)];
};

/** A line for the size of a small signal. */
export const signalLine = (context: PartContext, of: QuantityName): readonly string[] => {
  const spec = specOf(context.values, 'signal');
  if (spec === undefined) return [];
  return [`signal ${formatQuantity(resolveValue(spec, of).nominal, of, { trim: true })}`];
};

/** A value as the thing that can vary. */
export const drawOf = (key: string, of: QuantityName, spec: ValueSpec): Draw => {
  const { nominal, low, high, sigma } = resolveValue(spec, of);
  return {
    key,
    quantity: of,
    value: nominal,
    low,
    high,
    ...(sigma === undefined ? {} : { sigma }),
    stated: true,
  };
};

/** A default as the thing that can vary, though nothing says that it does. */
export const defaultDraw = (key: string, of: QuantityName, value: number): Draw => ({
  key,
  quantity: of,
  value,
  low: value,
  high: value,
  stated: false,
});

const isVaried = (field: Field): field is QuantityField => field.form === 'quantity' && field.varied;

/** What of these entries can vary: those that are stated, and those that have a default. */
export const fieldDraws = (fields: readonly Field[], values: Values): readonly Draw[] =>
  fields.filter(isVaried).flatMap((field) => {
    const spec = specOf(values, field.key);
    if (spec !== undefined) return [drawOf(field.key, field.quantity, spec)];
    if (field.fallback !== undefined) return [defaultDraw(field.key, field.quantity, field.fallback)];
    return [];
  });

/** `length modulation 0 (not stated)`; nought needs no unit. */
export const notStated = (label: string, value: number, of: QuantityName): string =>
  `${label} ${value === 0 ? '0' : formatQuantity(value, of, { trim: true })} (not stated)`;

/** What is assumed of these entries: defaults that stand in for what nobody stated. */
export const fieldAssumptions = (fields: readonly Field[], values: Values): readonly string[] =>
  fields
    .filter(isVaried)
    .flatMap(({ key, label, quantity, fallback }) =>
      fallback === undefined || specOf(values, key) !== undefined
        ? []
        : [notStated(label, fallback, quantity)],
    );

/**
 * The number at hand for a key.
 * @throws Error where there is none: a programmer's mistake, `draws` having named it.
 */
export const figure = (figures: Figures, key: string): number => {
  const value = figures[key];
  if (value === undefined) throw new Error(`no figure for ${key}`);
  return value;
};
