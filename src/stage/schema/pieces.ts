import * as z from 'zod';
import { describeFound } from '../../values/found.ts';
import type { Fault } from '../../values/result.ts';
import type { IssueParams } from '../../values/schema.ts';

/** Ids: `p1`, `w12`. They hold references together and are never shown before a name. */
export const idPattern = /^[a-z]+[1-9][0-9]*$/;
/** Names of parts and states: `R1`, `VBAT`, `lampOn`. */
export const namePattern = /^[A-Za-z][A-Za-z0-9_]*$/;
/** Keys of what is kept for the screen: names and ids joined by a few marks. */
const labelKeyPattern = /^[A-Za-z][A-Za-z0-9_./-]*$/;

const longestName = 60;

const text = (test: (value: string) => boolean, fault: Omit<Fault, 'found'>) =>
  z.custom<string>().superRefine((value: unknown, context) => {
    if (typeof value === 'string' && test(value)) return;
    context.addIssue({
      code: 'custom',
      message: fault.message,
      params: { fault: { ...fault, found: describeFound(value) } } satisfies IssueParams,
      continue: false,
    });
  });

export const id = text((value) => idPattern.test(value) && value.length <= longestName, {
  code: 'wrong-id',
  message: 'An id is small letters followed by a number, such as p1.',
  allowed: 'small letters and a number that does not start with 0',
});

export const name = text((value) => namePattern.test(value) && value.length <= longestName, {
  code: 'wrong-name',
  message: 'A name is a letter followed by letters, digits or underscores, such as R1.',
  allowed: `a letter, then letters, digits or _; at most ${longestName} characters`,
});

export const labelKey = text((value) => labelKeyPattern.test(value) && value.length <= 200, {
  code: 'wrong-key',
  message: 'This key must be a letter followed by letters, digits or the marks _ . / -.',
  allowed: 'a letter, then letters, digits and _ . / -',
});

export const freeText = (longest: number) =>
  text((value) => value.length <= longest, {
    code: 'wrong-text',
    message: `This must be text of at most ${longest} characters.`,
    allowed: `text of at most ${longest} characters`,
  });

/** Whole grid units. Far more than any sheet, and few enough for whatever counts them. */
export const coordinate = z.int().min(-10_000).max(10_000);
/** x to the right, y down. */
export const point = z.tuple([coordinate, coordinate]);
export const turn = z.literal([0, 90, 180, 270]);
