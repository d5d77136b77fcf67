import { readFileSync, readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { catalogue } from '../../../src/parts/catalogue.ts';
import { deviceTypes } from '../../../src/parts/devices/device.ts';
import { readStage } from '../../../src/stage/readStage.ts';
import { currentVersion } from '../../../src/stage/schema/stage.ts';
import { writeStage } from '../../../src/stage/writeStage.ts';

/** Files as an earlier or the present program wrote them. They are kept for good: every later program opens them. */
const folder = new URL('./kept/', import.meta.url);
const files = readdirSync(folder);
const textOf = (file: string) => readFileSync(new URL(file, folder), 'utf8');

describe('kept stage files', () => {
  it.each(files)('%s is opened', async (file) => {
    const result = await readStage(textOf(file));
    expect(result.ok ? [] : result.faults).toEqual([]);
  });

  it('hold at least one of every version', () => {
    for (let version = 1; version <= currentVersion; version += 1) {
      expect(files.some((file) => file.startsWith(`version-${version}`))).toBe(true);
    }
  });

  it('of the present version stand in the canonical text, to the byte', async () => {
    const text = textOf('version-1-one-of-everything.stage.json');
    const result = await readStage(text);
    expect(result.ok && writeStage(result.value)).toBe(text);
  });

  it('hold a part of every kind and a device of every type', async () => {
    const result = await readStage(textOf('version-1-one-of-everything.stage.json'));
    if (!result.ok) throw new Error('refused');
    const kinds = new Set(Object.values(result.value.parts).map(({ kind }) => kind));
    expect([...kinds].sort()).toEqual(catalogue.map(({ kind }) => kind).sort());
    const types = new Set(Object.values(result.value.devices).map(({ type }) => type));
    expect([...types].sort()).toEqual([...deviceTypes].sort());
  });

  it('come back from writing with values as they were typed and keys in their order', async () => {
    const text = textOf('version-1.stage.json');
    const result = await readStage(text);
    if (!result.ok) throw new Error('refused');
    expect(JSON.stringify(JSON.parse(writeStage(result.value)))).toBe(JSON.stringify(JSON.parse(text)));
  });
});
