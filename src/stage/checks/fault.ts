import type { Fault } from '../../values/result.ts';
import { pathText } from '../json/json.ts';

/** A fault at a place of the document. */
export const faultAt = (
  path: readonly (string | number)[],
  code: string,
  message: string,
  found: string,
  allowed: string,
): Fault => ({ code, message, path: pathText(path), found, allowed });

/** A short list of ids or names for `allowed`. */
export function listed(items: Iterable<string>, none = 'there is none'): string {
  const all = [...items];
  if (all.length === 0) return none;
  return all.length > 12 ? `${all.slice(0, 12).join(', ')} and ${all.length - 12} more` : all.join(', ');
}
