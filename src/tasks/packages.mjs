import { existsSync, readFileSync } from 'node:fs';
import { inProject } from './paths.mjs';
import { run } from './run.mjs';

/**
 * What of a lock file decides whether two folders of packages are the same.
 *
 * @typedef {{ version?: string, integrity?: string, optional?: boolean, link?: boolean }} LockedPackage
 * @typedef {{ packages?: Record<string, LockedPackage> }} LockFile
 */

/**
 * The packages that the lock file asks for and the folder does not hold in that version. npm writes what it installed
 * into `node_modules/.package-lock.json` as its very last step, so an installation that was broken off counts as none.
 * Optional packages may be absent: they are those of other systems.
 *
 * @param {LockFile} wanted package-lock.json
 * @param {LockFile} installed node_modules/.package-lock.json
 * @returns {string[]} names of folders, in the lock file's order
 */
export const missingPackages = (wanted, installed) =>
  Object.entries(wanted.packages ?? {})
    .filter(([folder, locked]) => {
      if (folder === '') return false;
      const found = installed.packages?.[folder];
      if (found === undefined) return locked.optional !== true;
      return found.version !== locked.version || found.integrity !== locked.integrity;
    })
    .map(([folder]) => folder);

/** @param {string} program that an installed package brings along */
export const installed = (program) => inProject(`node_modules/.bin/${program}`);

/** @returns {boolean} whether `node_modules` holds what the lock file names */
const areInstalled = () => {
  const record = inProject('node_modules/.package-lock.json');
  if (!existsSync(record)) return false;
  const [wanted, installed] = [inProject('package-lock.json'), record].map((path) =>
    JSON.parse(readFileSync(path, 'utf8')),
  );
  return missingPackages(wanted, installed).length === 0;
};

/**
 * Installs the packages of the lock file where they are not there yet. Ends the process with a sentence where that
 * fails: no task can go on without them.
 *
 * @param {'shown' | 'to-errors'} [output]
 */
export const ensurePackages = async (output = 'shown') => {
  if (areInstalled()) return;
  const say = output === 'shown' ? console.log : console.error;
  say('Installing the packages of package-lock.json …');
  const status = await run(['npm', 'ci', '--include=dev', '--no-audit', '--no-fund'], {
    // The browser is the business of browser.mjs, which looks for one that is there already.
    env: { ...process.env, PLAYWRIGHT_SKIP_BROWSER_DOWNLOAD: '1' },
    output,
  });
  if (status === 0) return;
  console.error('The packages could not be installed: see the lines of npm above. Nothing else was done.');
  process.exit(1);
};
