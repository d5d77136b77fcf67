import { fromPlaywright, fromVitest } from './counts.mjs';
import { installed } from './packages.mjs';

/**
 * One part of the checks.
 *
 * @typedef {object} Part
 * @property {string} name what `npm run test:NAME` and the summary call it
 * @property {(report: string) => readonly string[]} command given the file for a report in JSON
 * @property {(report: any) => import('./counts.mjs').Counts} [count] reads that report; a part without one counts one
 * @property {boolean} [needsBrowser]
 */

/**
 * @param {string} name
 * @param {readonly string[]} folders
 * @returns {Part}
 */
const vitest = (name, folders) => ({
  name,
  command: (report) => [
    ...[installed('vitest'), 'run', ...folders],
    ...['--reporter=default', '--reporter=json', `--outputFile.json=${report}`],
  ],
  count: fromVitest,
});

/** @type {readonly Part[]} in the order in which they run: the quick ones first */
export const parts = [
  { name: 'format', command: () => [installed('prettier'), '--check', '.'] },
  { name: 'lint', command: () => [installed('eslint'), '.'] },
  { name: 'types', command: () => [installed('tsc'), '-p', '.', '--noEmit'] },
  vitest('unit', ['tests/src/', 'tests/solver/', 'tests/symbols/']),
  vitest('published', ['tests/published/']),
  vitest('properties', ['tests/properties/']),
  {
    name: 'e2e',
    command: () => [installed('playwright'), 'test', '--config', 'e2e/playwright.config.ts'],
    count: fromPlaywright,
    needsBrowser: true,
  },
];
