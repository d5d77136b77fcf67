/** The command line on this machine: files, streams, the clock. All else is in `run`. */
import { readFile, writeFile } from 'node:fs/promises';
import packageFile from '../../package.json' with { type: 'json' };
import { run } from './run.ts';

// A reader that has had enough (`| head`) closes the pipe; that is no failure of ours.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  if (error.code !== 'EPIPE') throw error;
});

process.exitCode = await run(process.argv.slice(2), {
  readText: (path) => readFile(path, 'utf8'),
  writeFile: (path, content) => writeFile(path, content),
  toOutput: (text) => process.stdout.write(text),
  toErrors: (text) => process.stderr.write(text),
  date: new Date().toISOString().slice(0, 10),
  program: `Restpoint ${packageFile.version}`,
});
