import type { ScenePart } from '../drawing/scene.ts';

/** Height of a line of parts, pixels: parts whose middles lie in one of them are read from left to right. */
const line = 72;

/** Ids of the parts as a page is read: line by line from the top, each from the left. Grounds say nothing and are left out. */
export const readingOrder = (parts: readonly ScenePart[]): readonly string[] =>
  parts
    .filter(({ joins }) => joins !== 'reference')
    .map(({ id, origin: [x, y] }) => ({ id, x, row: Math.floor(y / line) }))
    .sort((one, other) => one.row - other.row || one.x - other.x)
    .map(({ id }) => id);

/** The neighbour of an id in a list; undefined past its ends. From the near end where the id is not in it. */
export const neighbourIn = (
  order: readonly string[],
  id: string | undefined,
  way: 1 | -1,
): string | undefined => {
  const at = id === undefined ? -1 : order.indexOf(id);
  if (at === -1) return way === 1 ? order[0] : order.at(-1);
  return at + way < 0 ? undefined : order[at + way];
};
