import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import { prepareArithmetic } from '../../src/values/arithmetic.ts';
import type { Fault } from '../../src/values/result.ts';
import { readJson } from '../../src/stage/json/readJson.ts';
import { checkDocument, readStageAtOnce } from '../../src/stage/readStage.ts';
import type { JsonObject } from '../../src/stage/json/json.ts';
import { writeStage } from '../../src/stage/writeStage.ts';
import { damageKeys, damageMeaning, damageText, seeded } from './damage.ts';
import { soaking, stageFile } from './stageDocuments.ts';

beforeAll(() => prepareArithmetic());

const count = soaking ? 10_000 : 900;
/** Sound files to be damaged, a hundred of them, always the same. */
const sound = fc.sample(stageFile(8), { seed: 6, numRuns: 100 });

/** The language's own reader, as the judge of what JSON is. */
function judge(text: string): { readonly value: unknown } | undefined {
  try {
    return { value: JSON.parse(text) as unknown };
  } catch {
    return undefined;
  }
}

function expectNamesItsPlace(fault: Fault, text: string) {
  expect(fault.path, JSON.stringify(fault)).toMatch(/^(\$|[A-Za-z_[].*)/);
  expect(fault.message.length, JSON.stringify(fault)).toBeGreaterThan(10);
  expect(fault.message.length, JSON.stringify(fault)).toBeLessThan(500);
  if (fault.code !== 'more-faults') {
    expect(fault.found, JSON.stringify(fault)).toBeTypeOf('string');
    expect(fault.allowed, JSON.stringify(fault)).toBeTypeOf('string');
  }
  if (fault.code === 'broken-json') {
    const lines = text.replace(/^\ufeff/, '').split('\n');
    expect(fault.line).toBeGreaterThanOrEqual(1);
    expect(fault.line).toBeLessThanOrEqual(lines.length);
    expect(fault.column).toBeGreaterThanOrEqual(1);
    expect(fault.column).toBeLessThanOrEqual((lines[(fault.line ?? 0) - 1]?.length ?? 0) + 1);
  }
}

/** Opens a damaged file and checks what must hold of any answer. Says whether it was refused. */
function open(text: string): boolean {
  const result = readStageAtOnce(text);
  if (result.ok) {
    // The damage did no harm: then this is a sound document in every respect.
    const back = readStageAtOnce(writeStage(result.value));
    expect(back.ok && JSON.stringify(back.value) === JSON.stringify(result.value)).toBe(true);
    return false;
  }
  expect(Object.keys(result)).not.toContain('value');
  expect(result.faults.length).toBeGreaterThan(0);
  for (const fault of result.faults) expectNamesItsPlace(fault, text);
  return true;
}

describe('a damaged stage file is refused whole, with the place of the damage', () => {
  it('where its text is damaged', () => {
    let refused = 0;
    for (let seed = 0; seed < count / 2; seed += 1) {
      const random = seeded(seed);
      const file = sound[seed % sound.length] ?? {};
      const text = damageText(JSON.stringify(file, null, seed % 3), random);
      if (open(text)) refused += 1;
      const broken = judge(text.replace(/^\ufeff/, '')) === undefined;
      const result = readStageAtOnce(text);
      const saidBroken = !result.ok && result.faults.some(({ code }) => code === 'broken-json');
      expect(saidBroken, `seed ${seed}`).toBe(broken);
    }
    expect(refused).toBeGreaterThan(count / 4);
  });

  it('where what it says is damaged', () => {
    let refused = 0;
    for (let seed = 0; seed < count / 2; seed += 1) {
      const random = seeded(1_000_000 + seed);
      const file = sound[seed % sound.length] ?? {};
      if (open(JSON.stringify(damageMeaning(file, random)))) refused += 1;
    }
    expect(refused).toBeGreaterThan(count / 4);
  });

  it('where a key stands twice or is __proto__, always', () => {
    for (let seed = 0; seed < count / 10; seed += 1) {
      const random = seeded(2_000_000 + seed);
      const file = sound[seed % sound.length] ?? {};
      const text = damageKeys(JSON.stringify(file), random);
      const result = readStageAtOnce(text);
      const codes = result.ok ? [] : result.faults.map(({ code }) => code);
      expect(
        codes.some((code) => code === 'repeated-key' || code === 'forbidden-key'),
        `seed ${seed}`,
      ).toBe(true);
      expect(open(text)).toBe(true);
    }
  });
});

describe('any JSON at all', () => {
  it('is refused as a stage without a crash', () => {
    fc.assert(
      fc.property(fc.json({ maxDepth: 8 }), (text) => {
        expect(open(text)).toBe(true);
      }),
      { seed: 8259, numRuns: soaking ? 5000 : 500 },
    );
  });

  it('is read as the language reads it', () => {
    fc.assert(
      fc.property(fc.json({ maxDepth: 6 }), (text) => {
        const result = readJson(text);
        const expected = judge(text);
        // Keys that the language merges or loses are refused here, and only these.
        if (!result.ok) {
          expect(result.faults.every(({ code }) => code === 'repeated-key' || code === 'forbidden-key')).toBe(
            true,
          );
        } else {
          expect(JSON.stringify(result.value)).toBe(JSON.stringify(expected?.value));
        }
      }),
      { seed: 8259, numRuns: soaking ? 5000 : 1000 },
    );
  });

  it('in place of any section is refused without a crash', () => {
    const sections = [
      'conditions',
      'devices',
      'parts',
      'joints',
      'wires',
      'states',
      'questions',
      'view',
      'marks',
      'alternates',
    ];
    fc.assert(
      fc.property(fc.constantFrom(...sections), fc.jsonValue({ maxDepth: 4 }), (section, value) => {
        const file = { format: 'restpoint-stage', version: 1, [section]: value } as JsonObject;
        const result = checkDocument(file);
        const harmless = typeof value === 'object' && value !== null && !Array.isArray(value);
        if (!harmless) expect(result.ok).toBe(false);
        if (!result.ok) {
          for (const fault of result.faults)
            expect(fault.path?.startsWith(section), JSON.stringify(fault)).toBe(true);
        }
      }),
      { seed: 8259, numRuns: soaking ? 5000 : 500 },
    );
  });
});
