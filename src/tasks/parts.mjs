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
 * @param {readonly string[]} where which files of tests, as vitest's own options
 * @returns {Part}
 */
const vitest = (name, where) => ({
  name,
  command: (report) => [
    ...[installed('vitest'), 'run', ...where],
    ...['--reporter=default', '--reporter=json', `--outputFile.json=${report}`],
  ],
  count: fromVitest,
});

/** Folders of tests that are a part of their own. */
const ownParts = ['published', 'properties'];

/** @type {readonly Part[]} in the order in which they run: the quick ones first */
export const parts = [
  { name: 'format', command: () => [installed('prettier'), '--check', '.'] },
  { name: 'lint', command: () => [installed('eslint'), '.'] },
  { name: 'types', command: () => [installed('tsc'), '-p', '.', '--noEmit'] },
  // All that is no other part's, so that no test is left out by where it stands.
  vitest(
    'unit',
    ownParts.map((folder) => `--exclude=tests/${folder}/**`),
  ),
  ...ownParts.map((folder) => vitest(folder, [`--exclude=tests/!(${folder})/**`])),
  {
    name: 'e2e',
    command: () => [
      installed('playwright'),
      'test',
      '--config',
      'e2e/playwright.config.ts',
      '--reporter=list,json',
    ],
    count: fromPlaywright,
    needsBrowser: true,
  },
];
