import { shorten } from './found.ts';
import { failure, success } from './result.ts';
import type { Result } from './result.ts';

/** Works out a checked expression of numbers; NaN or an infinity where it has no finite value. */
type Evaluator = (expression: string) => number;

let evaluator: Evaluator | undefined;

/** Whether text holds an operator or a bracket, so that only arithmetic can make a value of it. */
export const looksLikeArithmetic = (text: string): boolean => /[-+*/()\u2212\u00d7\u00f7]/.test(text);

/**
 * Loads what works arithmetic out, once; after it `parseValue` reads arithmetic at once. It stays out of the
 * page's first script: whoever reads a file or a field that holds arithmetic waits for this first.
 */
export async function prepareArithmetic(): Promise<void> {
  evaluator ??= (await import('./arithmetic-evaluator.ts')).evaluate;
}

/** Numbers, + − × ÷ * / and brackets in the order of a sum; anything else is refused before it is worked out. */
const allowedCharacters = /^[\d.eE\s+\-*/()\u2212\u00d7\u00f7]*$/;
/** Two operands with no operator between them. */
const missingOperator = /[\d.)]\s*\(|\)\s*[\d.]|[\d.]\s+[\d.]/;

export function evaluateArithmetic(text: string): Result<number> {
  const refuse = (code: string, message: string) =>
    failure({
      code,
      message,
      found: `"${shorten(text)}"`,
      allowed: 'plain numbers with + − × ÷ * / and brackets',
    });
  if (!allowedCharacters.test(text)) {
    return refuse('not-arithmetic', 'Arithmetic is of plain numbers, without units, prefixes or names.');
  }
  if (missingOperator.test(text)) {
    return refuse('not-arithmetic', 'A sign is missing between two numbers or brackets.');
  }
  if (evaluator === undefined) {
    return refuse('arithmetic-not-ready', 'Arithmetic is not loaded yet: try again in a moment.');
  }
  const expression = text.replaceAll('\u2212', '-').replaceAll('\u00d7', '*').replaceAll('\u00f7', '/');
  const value = evaluator(expression);
  if (Number.isNaN(value)) return refuse('not-arithmetic', 'This arithmetic cannot be worked out.');
  return success(value);
}
