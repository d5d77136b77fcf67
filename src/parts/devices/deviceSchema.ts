/** What every device schema has in common: a title, a source, and exactly one of model and facts. */
import * as z from 'zod';
import type { QuantityName } from '../../values/quantities.ts';
import { plainQuantity, quantity, shortText } from '../../values/schema.ts';
import { refined } from './fact.ts';

/** A model parameter that may be left out; it may carry a spread. */
export const parameter = (of: QuantityName) => z.exactOptional(quantity(of));

/** A model parameter that may be left out and has no spread. */
export const plainParameter = (of: QuantityName) => z.exactOptional(plainQuantity(of));

export const deviceText = {
  title: z.exactOptional(shortText()),
  /** Where the model or the ratings come from. */
  source: z.exactOptional(shortText()),
};

/** Refuses a device that holds both a model and facts, or neither. */
export const modelOrFacts = <Schema extends z.ZodObject>(schema: Schema): Schema =>
  refined(schema, (device) => {
    const held = ['model', 'facts'].filter((key) => Object.hasOwn(device, key));
    if (held.length === 1) return [];
    return [
      {
        code: held.length === 0 ? 'no-model' : 'model-and-facts',
        message: 'A device holds either a model or facts.',
        found: held.length === 0 ? 'neither' : 'both',
        allowed: 'model or facts',
      },
    ];
  });
