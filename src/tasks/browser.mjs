import { existsSync, readFileSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { installed } from './packages.mjs';
import { run, succeeds } from './run.mjs';

/**
 * The browser that tasks and end-to-end checks drive.
 *
 * @typedef {object} Browser
 * @property {string} path of the program
 * @property {readonly string[]} flags it is started with
 */

/** A system's browser: no sandbox (we may be root in a container), no GPU, and nothing of its own on the network. */
export const systemFlags = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

const systemNames = ['chromium', 'chromium-browser', 'google-chrome'];

/** @param {string} name of a program looked for along PATH */
const onPath = (name) =>
  (process.env['PATH'] ?? '')
    .split(delimiter)
    .map((folder) => join(folder, name))
    .find((path) => existsSync(path));

/** A program that is there but cannot start (a stub, or libraries missing) is no browser. @param {string} path */
const starts = (path) => succeeds([path, '--version']);

/** @returns {Promise<Browser | undefined>} the one that the test runner has downloaded for itself */
const runnersOwn = async () => {
  const { chromium } = await import('@playwright/test');
  const path = chromium.executablePath();
  return existsSync(path) && starts(path) ? { path, flags: [] } : undefined;
};

/**
 * Looks for a browser: the one CHROMIUM_PATH names, the test runner's own, then the system's.
 *
 * @returns {Promise<Browser | undefined>}
 */
export const findBrowser = async () => {
  const named = process.env['CHROMIUM_PATH'];
  if (named !== undefined && named !== '') return { path: named, flags: systemFlags };
  const own = await runnersOwn();
  if (own !== undefined) return own;
  for (const name of systemNames) {
    const path = onPath(name);
    if (path !== undefined && starts(path)) return { path, flags: systemFlags };
  }
  return undefined;
};

/** Whether we may install Debian's own browser package without asking anybody. */
const isRootOnDebian = () => {
  if (process.getuid?.() !== 0 || !existsSync('/etc/os-release')) return false;
  return /^ID="?debian"?$/m.test(readFileSync('/etc/os-release', 'utf8'));
};

/**
 * Finds a browser or installs one. Needs the packages to be installed.
 *
 * @returns {Promise<Browser | undefined>} nothing where none could be had; what to do has then been said
 */
export const ensureBrowser = async () => {
  const found = await findBrowser();
  if (found !== undefined) return found;

  console.log('No Chromium found. Installing the test runner’s own …');
  const env = { ...process.env };
  delete env['PLAYWRIGHT_SKIP_BROWSER_DOWNLOAD'];
  await run([installed('playwright'), 'install', 'chromium'], { env });
  const own = await findBrowser();
  if (own !== undefined) return own;

  if (isRootOnDebian()) {
    console.log('That gave none. Installing Debian’s package …');
    const quietly = { env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' } };
    if ((await run(['apt-get', 'update'], quietly)) === 0) {
      await run(['apt-get', 'install', '-y', 'chromium'], quietly);
    }
    const systems = await findBrowser();
    if (systems !== undefined) return systems;
  }
  console.error(
    'No browser could be found or installed. Install Chromium, or set CHROMIUM_PATH to the program, and try again.',
  );
  return undefined;
};
