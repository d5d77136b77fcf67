/** Ways in which a stage file is damaged: by a bad disk or a bad hand, in its text or in what it says. */
import type { Json } from '../../src/stage/json/json.ts';

type Random = () => number;

/** A small generator of seeded numbers in [0, 1): mulberry32, a published generator of 32 bits of state. */
export function seeded(seed: number): Random {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}

const below = (random: Random, limit: number) => Math.floor(random() * limit);
const one = <Item>(random: Random, items: readonly [Item, ...Item[]]): Item =>
  items[below(random, items.length)] ?? items[0];

const scraps = [
  '{',
  '}',
  '[',
  ']',
  ',',
  ':',
  '"',
  '\\',
  '\u0000',
  '\ufeff',
  'null',
  '-',
  '1e999',
  '\\u12',
  '\ud800',
  "'",
  'é',
  '\n',
  '__proto__',
  '//',
] as const;

/** The text with a few characters lost, put in, turned about, or a stretch of it lost, doubled or cut off. */
export function damageText(text: string, random: Random): string {
  const at = below(random, text.length + 1);
  const length = 1 + below(random, one(random, [3, 40]));
  switch (below(random, 6)) {
    case 0:
      return text.slice(0, at);
    case 1:
      return text.slice(0, at) + text.slice(at + length);
    case 2:
      return text.slice(0, at) + one(random, scraps) + text.slice(at);
    case 3:
      return text.slice(0, at) + text.slice(at, at + length).repeat(2) + text.slice(at + length);
    case 4:
      return text.slice(0, at) + String.fromCharCode(below(random, 0x250)) + text.slice(at + 1);
    default: {
      const to = below(random, text.length + 1);
      return text.slice(0, at) + text.slice(to, to + length) + text.slice(at);
    }
  }
}

/** What may stand where something else belongs. */
const strangers: readonly [Json, ...Json[]] = [
  null,
  true,
  -1,
  0,
  0.5,
  1e308,
  -1e308,
  5e-324,
  '',
  'p1',
  'all',
  '4,7',
  '1/0',
  '((((',
  'constructor',
  'toString',
  'hasOwnProperty',
  '\ud800',
  'x'.repeat(5000),
  [],
  {},
  [[], [[]]],
  { value: 1 },
  { kind: 'resistor' },
  { kind: 'constructor' },
  { type: 'toString' },
  Array.from({ length: 300 }, () => 0),
];

interface Place {
  readonly holder: Record<string, Json> | Json[];
  readonly key: string;
}

/** Every value of a tree, by the object or list that holds it. */
function places(value: Json): readonly Place[] {
  if (typeof value !== 'object' || value === null) return [];
  const holder = value as Record<string, Json> | Json[];
  return Object.entries(holder).flatMap(([key, item]) => [{ holder, key }, ...places(item)]);
}

const set = ({ holder, key }: Place, value: Json) => {
  (holder as Record<string, Json>)[key] = value;
};
const get = ({ holder, key }: Place): Json => (holder as Record<string, Json>)[key] ?? null;

/** The file with one thing in it lost, exchanged, renamed, doubled or strange. The text stays JSON. */
export function damageMeaning(file: Json, random: Random): Json {
  const copy = JSON.parse(JSON.stringify(file)) as Json;
  const all = places(copy);
  const place = all[below(random, all.length)];
  const other = all[below(random, all.length)];
  if (place === undefined || other === undefined) return one(random, strangers);
  switch (below(random, 7)) {
    case 0:
    case 1:
      set(place, one(random, strangers));
      break;
    case 2:
      if (Array.isArray(place.holder)) place.holder.splice(Number(place.key), 1);
      // eslint-disable-next-line @typescript-eslint/no-dynamic-delete -- losing any key is the damage
      else delete place.holder[place.key];
      break;
    case 3:
      if (!Array.isArray(place.holder)) {
        const value = get(place);
        // eslint-disable-next-line @typescript-eslint/no-dynamic-delete -- as above
        delete place.holder[place.key];
        place.holder[one(random, ['toString', 'P1', 'p01', 'values', 'all', 'x'.repeat(300), '', '1'])] =
          value;
      }
      break;
    case 4:
      if (!Array.isArray(place.holder))
        place.holder[one(random, ['extra', 'name', 'kind', 'p1', 'constructor'])] = 1;
      else place.holder.push(one(random, strangers));
      break;
    case 5: {
      // A copy, so that the tree stays a tree.
      set(place, JSON.parse(JSON.stringify(get(other))) as Json);
      break;
    }
    default: {
      const value = get(place);
      if (typeof value === 'number') set(place, value * one(random, [-1, 1e6, 1e-6, 1e300]));
      else if (typeof value === 'string') set(place, value.slice(1));
      else set(place, one(random, strangers));
    }
  }
  return copy;
}

/** A key said twice, or `__proto__`, put into the text where an object begins. */
export function damageKeys(text: string, random: Random): string {
  const opens = [...text.matchAll(/\{(?=\s*("[^"]*"):)/g)];
  const open = opens[below(random, opens.length)];
  if (open === undefined) return `{"__proto__": ${text}}`;
  const at = open.index + 1;
  const key = random() < 0.5 ? '"__proto__"' : (/"[^"]*"/.exec(text.slice(at))?.[0] ?? '"format"');
  return `${text.slice(0, at)}${key}: null, ${text.slice(at)}`;
}
