import { spawnSync } from 'node:child_process';
import { ensurePackages } from './packages.mjs';
import { inProject } from './paths.mjs';

// npm run pictures: draws the README's picture anew, with the program itself. The date is the stage's own, so that the
// same drawing gives the same file.
await ensurePackages('to-errors');
const call = [
  'plate',
  'examples/echo-preamplifier.stage.json',
  '--out',
  'examples/echo-preamplifier.png',
  '--scale',
  '2',
];
const { status } = spawnSync(process.execPath, [inProject('src/tasks/restpoint.mjs'), ...call], {
  cwd: inProject('.'),
  stdio: 'inherit',
});
process.exitCode = status ?? 1;
