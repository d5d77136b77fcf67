import { defineConfig } from '@playwright/test';
import { findBrowser } from '../src/tasks/browser.mjs';

const browser = await findBrowser();

/** The built page, served by `serve.ts` on a free port, in the browser that was found. */
export default defineConfig({
  testDir: '.',
  globalSetup: './serve.ts',
  fullyParallel: true,
  forbidOnly: true,
  workers: 2,
  // Answers are tested, not speed: a machine busy with other work must not fail a test.
  timeout: 120_000,
  expect: { timeout: 30_000 },
  outputDir: '../test-results',
  use: {
    baseURL: process.env.RESTPOINT_PAGE ?? '',
    viewport: { width: 1280, height: 720 },
    trace: 'retain-on-failure',
    launchOptions: browser === undefined ? {} : { executablePath: browser.path, args: [...browser.flags] },
  },
});
