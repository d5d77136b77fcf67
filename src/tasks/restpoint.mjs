import { ensurePackages } from './packages.mjs';
import { inProject } from './paths.mjs';

// npm run --silent restpoint -- VERB FILE …: the command line, straight from its sources. Standard output belongs to
// the command, so all that is said before it starts goes to standard error.
await ensurePackages('to-errors');
const { register } = await import('tsx/esm/api');
register();
const main = inProject('src/cli/main.ts');
process.argv[1] = main;
await import(main);
