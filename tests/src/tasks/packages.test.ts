import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { missingPackages } from '../../../src/tasks/packages.mjs';
import { inProject } from '../../../src/tasks/paths.mjs';

describe('package-lock.json', () => {
  it('names no host, so that it installs from any mirror of the registry', () => {
    const lock = JSON.parse(readFileSync(inProject('package-lock.json'), 'utf8')) as {
      packages: Record<string, { resolved?: string; version?: string }>;
    };
    const entries = Object.entries(lock.packages);
    expect(entries.length).toBeGreaterThan(100);
    expect(entries.filter(([, entry]) => entry.resolved !== undefined)).toEqual([]);
    expect(entries.filter(([, entry]) => /[:/]/.test(entry.version ?? ''))).toEqual([]);
  });
});

describe('missingPackages', () => {
  const wanted = {
    packages: {
      '': { version: '0.1.0' },
      'node_modules/one': { version: '1.0.0', integrity: 'sha512-a' },
      'node_modules/other-system': { version: '1.0.0', optional: true },
    },
  };

  it('misses nothing where every package is there and only optional ones are not', () => {
    const there = { packages: { 'node_modules/one': { version: '1.0.0', integrity: 'sha512-a' } } };
    expect(missingPackages(wanted, there)).toEqual([]);
  });

  it('names a package that is absent, of another version, or of other contents', () => {
    expect(missingPackages(wanted, {})).toEqual(['node_modules/one']);
    for (const found of [
      { version: '1.0.1', integrity: 'sha512-a' },
      { version: '1.0.0', integrity: 'sha512-b' },
    ]) {
      expect(missingPackages(wanted, { packages: { 'node_modules/one': found } })).toEqual([
        'node_modules/one',
      ]);
    }
  });

  it('takes an optional package of another version for missing', () => {
    const there = {
      packages: {
        'node_modules/one': { version: '1.0.0', integrity: 'sha512-a' },
        'node_modules/other-system': { version: '0.9.0' },
      },
    };
    expect(missingPackages(wanted, there)).toEqual(['node_modules/other-system']);
  });
});
