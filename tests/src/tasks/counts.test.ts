import { describe, expect, it } from 'vitest';
import { fromPlaywright, fromVitest, none, settled, sum } from '../../../src/tasks/counts.mjs';

describe('the counts of the checks', () => {
  it('are summed part by part', () => {
    const total = sum([
      { passed: 1, failed: 0, skipped: 0 },
      { passed: 40, failed: 2, skipped: 1 },
    ]);
    expect(total).toEqual({ passed: 41, failed: 2, skipped: 1 });
  });

  it('count a file of tests that could not be loaded as one failed', () => {
    const report = {
      numPassedTests: 3,
      numFailedTests: 1,
      testResults: [
        { status: 'failed', assertionResults: [] },
        { status: 'failed', assertionResults: [{ status: 'failed' }] },
        { status: 'passed', assertionResults: [{ status: 'passed' }] },
      ],
    };
    expect(fromVitest(report)).toEqual({ passed: 3, failed: 2, skipped: 0 });
  });

  it('count a test that passed only when repeated, and an error outside of tests, as failed', () => {
    const report = { stats: { expected: 5, unexpected: 1, flaky: 1, skipped: 2 }, errors: [{}] };
    expect(fromPlaywright(report)).toEqual({ passed: 5, failed: 3, skipped: 2 });
  });

  it('fail a part that ran no test', () => {
    expect(settled(none, 0)).toEqual({ passed: 0, failed: 1, skipped: 0 });
  });

  it('fail a part that ended badly without a failed test, and count no failure twice', () => {
    const held = { passed: 7, failed: 0, skipped: 0 };
    expect(settled(held, 0)).toEqual(held);
    expect(settled(held, 1).failed).toBe(1);
    expect(settled({ passed: 7, failed: 2, skipped: 0 }, 1).failed).toBe(2);
  });
});
