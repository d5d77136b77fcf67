import { produce } from 'immer';
import type { Patch } from 'immer';
import { isObject, valueAt } from './json/json.ts';
import type { StageDocument } from './schema/stage.ts';

/** The keys of the object at a path, in their order. */
export interface KeyOrder {
  readonly path: readonly (string | number)[];
  readonly keys: readonly string[];
}

/** The orders that patches could lose: of every object that gains or loses a key. */
export function keyOrders(
  before: StageDocument,
  after: StageDocument,
  patches: readonly Patch[],
): { readonly before: readonly KeyOrder[]; readonly after: readonly KeyOrder[] } {
  const paths = new Map<string, readonly (string | number)[]>();
  for (const { op, path } of patches) {
    if (op === 'replace') continue;
    const holder = path.slice(0, -1);
    paths.set(JSON.stringify(holder), holder);
  }
  const orderIn = (document: StageDocument) =>
    [...paths.values()].flatMap((path) => {
      const value = valueAt(document, path);
      return isObject(value) ? [{ path, keys: Object.keys(value) }] : [];
    });
  return { before: orderIn(before), after: orderIn(after) };
}

/** The same document with keys in the orders given. Objects whose order is right already stay as they are. */
export const withKeyOrders = (document: StageDocument, orders: readonly KeyOrder[]): StageDocument =>
  produce(document, (draft) => {
    for (const { path, keys } of orders) {
      const present = valueAt(document, path);
      if (!isObject(present)) continue;
      const now = Object.keys(present);
      if (now.length !== keys.length || now.every((key, index) => key === keys[index])) continue;
      const holder = valueAt(draft, path) as Record<string, unknown>;
      const entries = keys.map((key) => [key, holder[key]] as const);
      // A key that is taken out and put in again goes to the end.
      for (const [key, value] of entries) {
        // eslint-disable-next-line @typescript-eslint/no-dynamic-delete -- keys of a record, not of a shape
        delete holder[key];
        holder[key] = value;
      }
    }
  });
