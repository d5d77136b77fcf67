import { describe, expect, it } from 'vitest';
import { helpText } from '../../../src/cli/help.ts';
import { verbs } from '../../../src/cli/verbs.ts';

describe('helpText', () => {
  it('fits a terminal of 80 columns', () => {
    for (const verb of [null, ...verbs]) {
      for (const line of helpText(verb).split('\n')) expect(line.length, line).toBeLessThanOrEqual(80);
    }
  });

  it('names every verb, and every option of a verb', () => {
    for (const verb of verbs) {
      expect(helpText(null)).toContain(verb.name);
      for (const option of verb.options) expect(helpText(verb)).toContain(`--${option.name}`);
    }
  });
});
