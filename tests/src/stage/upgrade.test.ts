import { describe, expect, it } from 'vitest';
import type { Step } from '../../../src/stage/upgrade.ts';
import { upgrade } from '../../../src/stage/upgrade.ts';

/** Steps of versions that never were, to show that steps are taken in turn. */
const steps = new Map<number, Step>([
  [1, (file) => ({ ...file, first: true })],
  [2, (file) => ({ ...file, second: Object.keys(file) })],
]);
const options = { target: 3, by: steps };

describe('upgrade', () => {
  it('takes an older file through every step in turn', () => {
    expect(upgrade({ format: 'restpoint-stage', version: 1 }, options)).toEqual({
      ok: true,
      value: {
        format: 'restpoint-stage',
        version: 3,
        first: true,
        second: ['format', 'version', 'first'],
      },
    });
    expect(upgrade({ format: 'restpoint-stage', version: 2 }, options)).toEqual({
      ok: true,
      value: { format: 'restpoint-stage', version: 3, second: ['format', 'version'] },
    });
  });
  it('leaves a file of the present version as it is', () => {
    const file = { format: 'restpoint-stage', version: 3 };
    const result = upgrade(file, options);
    expect(result.ok && result.value).toBe(file);
  });
  it('refuses a newer file, and says what to do', () => {
    const result = upgrade({ format: 'restpoint-stage', version: 4 }, options);
    expect(result.ok ? [] : result.faults).toMatchObject([
      { code: 'newer-version', path: 'version', found: '4', allowed: '1 to 3' },
    ]);
  });
});
