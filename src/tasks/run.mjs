import { spawn, spawnSync } from 'node:child_process';
import { projectFolder } from './paths.mjs';

/** npm is a script on some systems and can be started there only through a shell. */
const needsShell = process.platform === 'win32';

/**
 * Starts a command in the project's folder with its output shown as it comes, and waits for it.
 *
 * @param {readonly string[]} command the program and its arguments
 * @param {{ env?: NodeJS.ProcessEnv, output?: 'shown' | 'to-errors' }} [options] `to-errors` sends what the command
 *   says to standard error, for tasks whose standard output is data
 * @returns {Promise<number>} the exit status; 1 where the command could not be started or was ended by a signal
 */
export const run = (command, { env = process.env, output = 'shown' } = {}) =>
  new Promise((resolve) => {
    const [program = '', ...parameters] = command;
    const child = spawn(program, parameters, {
      cwd: projectFolder,
      env,
      shell: needsShell,
      stdio: ['ignore', output === 'shown' ? 'inherit' : 2, 'inherit'],
    });
    child.on('error', (error) => {
      console.error(`${program} could not be started: ${error.message}`);
      resolve(1);
    });
    child.on('close', (status) => resolve(status ?? 1));
  });

/**
 * Whether a command can be started and ends well; says nothing.
 *
 * @param {readonly string[]} command
 */
export const succeeds = (command) => {
  const [program = '', ...parameters] = command;
  const outcome = spawnSync(program, parameters, { stdio: 'ignore', timeout: 30_000, shell: needsShell });
  return outcome.status === 0;
};
