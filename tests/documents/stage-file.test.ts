import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { catalogue } from '../../src/parts/catalogue.ts';
import {
  bipolarFactShapes,
  diodeFactShapes,
  mosfetFactShapes,
  zenerFactShapes,
} from '../../src/parts/devices/conditions.ts';
import type { PartContext } from '../../src/parts/kind.ts';
import { settleStage } from '../../src/readings/settleStage.ts';
import { readStage } from '../../src/stage/readStage.ts';

const page = readFileSync(new URL('../../src/stage/stage-file.md', import.meta.url), 'utf8');
const example = /```json\n(.*?)```/s.exec(page)?.[1] ?? '';

/** Rows of the table whose head is `kind`, each with its cells. */
const kindRows = (): readonly (readonly string[])[] => {
  const [, table = ''] = /\| kind \| pins \| values \|\n\|[-|]+\|\n((?:\|.*\n)+)/.exec(page) ?? [];
  return table
    .trim()
    .split('\n')
    .map((line) =>
      line
        .slice(1, -1)
        .split('|')
        .map((cell) => cell.trim()),
    );
};

/** The kind as it stands before anything is stated of it: its first cell in the drawers. */
const asFirstLaidDown = (kind: (typeof catalogue)[number]): PartContext => {
  const [variant] = kind.variants;
  if (variant === undefined) throw new Error(`${kind.kind} has no variant`);
  const { values, device, wired = [] } = variant;
  return { name: 'X1', values, wired: new Set(wired), ...(device === undefined ? {} : { device }) };
};

describe('src/stage/stage-file.md', () => {
  it('has an example that opens and settles in both of its states', async () => {
    const read = await readStage(example);
    if (!read.ok)
      throw new Error(read.faults.map(({ path, message }) => `${path ?? ''} ${message}`).join('\n'));
    const { states } = settleStage(read.value);
    expect(Object.entries(states).map(([name, { settled }]) => [name, settled])).toEqual([
      ['on', true],
      ['off', true],
    ]);
  });

  it('lists every kind of the catalogue and no other', () => {
    const listed = kindRows().map(([name = '']) => name.replaceAll('`', ''));
    expect([...listed].sort()).toEqual(catalogue.map(({ kind }) => kind).sort());
  });

  it.each(kindRows().map(([name = '', pins = '', values = '']) => [name.replaceAll('`', ''), pins, values]))(
    'states the pins and the values of %s as the catalogue does',
    (name, pins, values) => {
      const kind = catalogue.find((candidate) => candidate.kind === name);
      if (kind === undefined) throw new Error(`no kind ${name}`);
      const stated = Object.fromEntries(
        [...pins.replaceAll('−', '-').matchAll(/(\w+) \((-?\d), (-?\d)\)/g)].map(([, pin = '', x, y]) => [
          pin,
          [Number(x), Number(y)],
        ]),
      );
      // Every pin of the kind, not only those a plain symbol shows: the body of a MOSFET is one.
      const everyPin = kind.pins({ ...asFirstLaidDown(kind), wired: new Set(Object.keys(stated)) });
      expect(stated).toEqual(Object.fromEntries(Object.entries(everyPin)));
      const words = new Set(values.match(/\w+/g));
      expect(kind.fields.map(({ key }) => key).filter((key) => !words.has(key))).toEqual([]);
    },
  );

  it('lists every fact of every device, with the conditions it can carry', () => {
    const [, table = ''] = /\| type \| entries of `facts`[^\n]*\n\|[-|]+\|\n((?:\|.*\n)+)/.exec(page) ?? [];
    const rowOf = (type: string) => table.split('\n').find((row) => row.startsWith(`| \`${type}\``)) ?? '';
    const shapes = {
      mosfet: mosfetFactShapes,
      diode: diodeFactShapes,
      zener: zenerFactShapes,
      bipolar: bipolarFactShapes,
    };
    for (const [type, facts] of Object.entries(shapes)) {
      const row = type === 'zener' ? rowOf('diode') + rowOf(type) : rowOf(type);
      const words = new Set(row.match(/\w+/g));
      const names = Object.entries(facts).flatMap(([name, { at }]) => [name, ...Object.keys(at)]);
      expect(names.filter((name) => !words.has(name))).toEqual([]);
      expect(names.length).toBeGreaterThan(5);
    }
  });
});
