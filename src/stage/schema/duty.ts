import * as z from 'zod';
import type { Fault } from '../../values/result.ts';
import { choice, plainQuantity } from '../../values/schema.ts';
import type { IssueParams } from '../../values/schema.ts';
import { resolvePlain } from '../../values/value-spec.ts';

const window = z
  .strictObject({ low: plainQuantity('current'), high: plainQuantity('current') })
  .superRefine(({ low, high }, context) => {
    if (resolvePlain(low, 'current') <= resolvePlain(high, 'current')) return;
    const fault: Fault = {
      code: 'spread-order',
      message: 'The low end of a window must not lie above its high end.',
      found: `low ${low}, high ${high}`,
      allowed: 'low ≤ high',
    };
    context.addIssue({ code: 'custom', message: fault.message, params: { fault } satisfies IssueParams });
  });

const limits = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('amplify'),
    /** V. */
    signalPeak: z.exactOptional(plainQuantity('voltageMagnitude')),
    currentWindow: z.exactOptional(window),
  }),
  z.strictObject({
    kind: z.literal('conduct'),
    /** Largest |V_DS| at rest, V. */
    dropLimit: z.exactOptional(plainQuantity('voltageMagnitude')),
    /** I_C/I_B at most, of a bipolar transistor. */
    forcedGain: z.exactOptional(plainQuantity('currentGain')),
  }),
  z.strictObject({
    kind: z.literal('block'),
    /** A. */
    leakLimit: z.exactOptional(plainQuantity('currentMagnitude')),
  }),
  z.strictObject({ kind: z.literal('none') }),
]);

/** What a transistor is for: a word, or an object with limits. */
export const duty = z.union([choice('amplify', 'conduct', 'block', 'none'), limits]);
