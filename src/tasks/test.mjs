import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { ensureBrowser } from './browser.mjs';
import { none, settled, sum } from './counts.mjs';
import { ensurePackages } from './packages.mjs';
import { parts } from './parts.mjs';
import { run } from './run.mjs';

// npm test: every part, one after the other, whatever the one before it came to. npm run test:NAME -- …: that part
// alone, what follows being handed on to its tool (a path, a name of a test).
const [only, ...handedOn] = process.argv.slice(2);
const chosen = parts.filter(({ name }) => only === undefined || name === only);
if (chosen.length === 0) {
  console.error(`There is no part "${String(only)}": ${parts.map(({ name }) => name).join(', ')}.`);
  process.exit(1);
}

await ensurePackages();
const reports = mkdtempSync(join(tmpdir(), 'restpoint-checks-'));

/** @param {import('./parts.mjs').Part} part @returns {Promise<import('./counts.mjs').Counts>} */
const check = async ({ name, command, count, needsBrowser }) => {
  console.log(`\n── ${name}`);
  const env = { ...process.env };
  if (needsBrowser) {
    const browser = await ensureBrowser();
    if (browser === undefined) return settled(none, 1);
    console.log(`Browser: ${browser.path}`);
    env['CHROMIUM_PATH'] = browser.path;
  }
  const report = join(reports, `${name}.json`);
  env['PLAYWRIGHT_JSON_OUTPUT_FILE'] = report;
  const status = await run([...command(report), ...handedOn], { env });
  if (count === undefined) return status === 0 ? { ...none, passed: 1 } : settled(none, status);
  const counts = existsSync(report) ? count(JSON.parse(readFileSync(report, 'utf8'))) : none;
  return settled(counts, status);
};

const results = [];
for (const part of chosen) results.push({ name: part.name, counts: await check(part) });
rmSync(reports, { recursive: true, force: true });

console.log('');
for (const { name, counts } of results) {
  const skipped = counts.skipped > 0 ? `, ${counts.skipped} skipped` : '';
  console.log(`${name.padEnd(12)}${counts.passed} passed, ${counts.failed} failed${skipped}`);
}
const total = sum(results.map(({ counts }) => counts));
console.log(`${total.passed} passed, ${total.failed} failed`);
process.exitCode = total.failed > 0 ? 1 : 0;
