/** What stands on what, found from the primitives alone: by their boxes, as the pens will draw them. */
import type { Box } from '../../../../symbols/art.ts';
import { boundsOf } from '../../../../src/drawing/bounds.ts';
import { boxOfPoints, grown, overlap, union } from '../../../../src/drawing/boxes.ts';
import type { Drawing, Primitive } from '../../../../src/drawing/primitives.ts';

interface Thing {
  readonly name: string;
  readonly group: 'line' | 'part' | 'junction' | 'text' | 'chip' | 'leader' | 'badge' | 'chevron' | 'sign';
  readonly box: Box;
  /** Things that belong together may touch: a chip and its text, a sign and its number. */
  readonly family: string;
}

/** Straight lines of a path, each with its own box; curves by their hull. */
const segments = (primitive: Extract<Primitive, { kind: 'path' }>): readonly Box[] => {
  const boxes: Box[] = [];
  let at: readonly [number, number] = [0, 0];
  let start = at;
  for (const command of primitive.commands) {
    if (command[0] === 'Z') boxes.push(boxOfPoints([at, start]));
    else if (command[0] === 'C') {
      const [, ax, ay, bx, by, x, y] = command;
      boxes.push(boxOfPoints([at, [ax, ay], [bx, by], [x, y]]));
      at = [x, y];
    } else {
      const next = [command[1], command[2]] as const;
      if (command[0] === 'L') boxes.push(boxOfPoints([at, next]));
      else start = next;
      at = next;
    }
  }
  return boxes.map((box) => grown(box, primitive.stroke === undefined ? 0 : primitive.width / 2));
};

const thingsOf = ({ primitives }: Drawing): readonly Thing[] => {
  const things: Thing[] = [];
  const badges = new Map<string, Box[]>();
  for (const primitive of primitives) {
    const { id, thing } = primitive;
    const root = id.split('/').slice(0, 2).join('/');
    const box = boundsOf(primitive);
    const add = (group: Thing['group'], family = root, where: Box = box) =>
      things.push({ name: id, group, box: where, family });
    if (primitive.kind === 'text') {
      // A tag's label lies in the tag's own outline, a chip's figure in its chip, a number in its sign.
      const isTag = thing === 'name' || thing === 'value';
      add('text', isTag ? `part/${primitive.of ?? ''}` : root);
    } else if (thing === 'badge' || thing === 'verdict') {
      badges.set(root, [...(badges.get(root) ?? []), box]);
    } else if (thing === 'wire' && primitive.kind === 'path') {
      for (const segment of segments(primitive)) add('line', id, segment);
    } else if (thing === 'part') {
      const family = `part/${primitive.of ?? ''}`;
      if (primitive.kind === 'path') for (const segment of segments(primitive)) add('part', family, segment);
      else add('part', family);
    } else if (thing === 'chip') add('chip');
    else if (thing === 'leader') add('leader');
    else if (thing === 'chevron') add('chevron');
    else if (thing === 'junction') add('junction', id);
    else if (thing === 'snag' || thing === 'caution') add('sign');
  }
  for (const [root, boxes] of badges) {
    const box = union(boxes);
    if (box !== undefined) things.push({ name: root, group: 'badge', box, family: `${root}/frame` });
  }
  return things;
};

/** A leader and a chevron stand on their own line; everything drawn by hand may meet everything else drawn by hand. */
const mayMeet = (a: Thing, b: Thing, tags: ReadonlySet<string>): boolean => {
  if (a.family === b.family && a.group !== 'badge') {
    const isOwnName = a.family.startsWith('part/') && (a.group === 'text') !== (b.group === 'text');
    return !isOwnName || tags.has(a.family);
  }
  const still = new Set(['line', 'part', 'junction']);
  if (still.has(a.group) && still.has(b.group)) return true;
  const pair = new Set([a.group, b.group]);
  return (
    (pair.has('leader') || pair.has('chevron')) &&
    (pair.has('line') || pair.has('junction') || pair.has('part'))
  );
};

/** Names of the things that overlap, pair by pair; empty where all is clear. */
export const overlaps = (drawing: Drawing, tagIds: readonly string[]): readonly string[] => {
  const tags = new Set(tagIds.map((id) => `part/${id}`));
  const things = thingsOf(drawing);
  return things.flatMap((a, index) =>
    things
      .slice(index + 1)
      .filter((b) => !mayMeet(a, b, tags) && overlap(a.box, b.box))
      .map((b) => `${a.name} on ${b.name}`),
  );
};

/** Leaders that cross a line, a part or a junction anywhere but where they start, and chevrons that stand on two lines. */
export const crossings = (drawing: Drawing): readonly string[] => {
  const things = thingsOf(drawing);
  const still = things.filter(({ group }) => group === 'line' || group === 'part' || group === 'junction');
  return drawing.primitives.flatMap((primitive) => {
    if (primitive.thing !== 'leader' || primitive.kind !== 'path') return [];
    const [first, last] = primitive.commands;
    if (first?.[0] !== 'M' || last?.[0] !== 'L') return [];
    const [dx, dy] = [Math.sign(last[1] - first[1]), Math.sign(last[2] - first[2])];
    // The line's own stroke and a junction's dot are left behind after 4 px.
    const rest = grown(
      boxOfPoints([
        [first[1] + 4 * dx, first[2] + 4 * dy],
        [last[1], last[2]],
      ]),
      0.6,
    );
    return still.filter(({ box }) => overlap(box, rest)).map(({ name }) => `${primitive.id} over ${name}`);
  });
};
