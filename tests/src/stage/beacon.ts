import { readFileSync } from 'node:fs';
import { readStageAtOnce } from '../../../src/stage/readStage.ts';
import type { StageDocument } from '../../../src/stage/schema/stage.ts';

/** The worked example of the stage file's contract, as text, as data free to be spoiled, and as a document. */
export const beaconText = readFileSync(new URL('./kept/version-1.stage.json', import.meta.url), 'utf8');

export type Loose = Record<string, unknown>;

/** The example with things put at dotted paths; `undefined` takes a thing out. */
export function beaconWith(changes: Readonly<Record<string, unknown>>): string {
  const file = JSON.parse(beaconText) as Loose;
  for (const [path, value] of Object.entries(changes)) {
    const steps = path.split('/');
    const last = steps.pop() ?? '';
    const holder = steps.reduce<Loose>((at, step) => (at[step] ??= {}) as Loose, file);
    holder[last] = value;
  }
  return JSON.stringify(file);
}

export function documentOf(text: string): StageDocument {
  const result = readStageAtOnce(text);
  if (!result.ok) throw new Error(JSON.stringify(result.faults, null, 2));
  return result.value;
}

export const beacon = (changes: Readonly<Record<string, unknown>> = {}): StageDocument =>
  documentOf(beaconWith(changes));
