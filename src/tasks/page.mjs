import { inProject } from './paths.mjs';

/**
 * Builds the page and serves what was built, on this machine alone. Needs the packages to be installed.
 *
 * @param {{ folder: string, port: number }} options `folder` of the project that takes the built page; the first free
 *   port from `port` on is taken
 * @returns {Promise<{ address: string, close: () => Promise<void> }>}
 */
export const buildAndServe = async ({ folder, port }) => {
  const { build, preview } = await import('vite');
  /** @type {import('vite').InlineConfig} */
  const common = {
    configFile: inProject('vite.config.ts'),
    logLevel: 'warn',
    build: { outDir: inProject(folder), emptyOutDir: true },
  };
  await build(common);
  const server = await preview({ ...common, preview: { host: '127.0.0.1', port, strictPort: false } });
  const address = server.resolvedUrls?.local[0];
  if (address === undefined) throw new Error('The server of the page has no address.');
  return { address, close: () => server.close() };
};
