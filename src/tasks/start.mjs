import { buildAndServe } from './page.mjs';
import { ensurePackages } from './packages.mjs';

// npm start: from a fresh clone to the page in the browser.
await ensurePackages();
console.log('Building the page …');
const { address } = await buildAndServe({ folder: 'dist', port: 4173 });
console.log(`Restpoint is at ${address} (Ctrl+C ends it)`);
