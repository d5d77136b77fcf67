import { buildAndServe } from '../src/tasks/page.mjs';

/**
 * Builds and serves the page once for all tests. The address reaches the workers by the environment, which is what
 * they share with this process; the folder is not the one of `npm start`, so that both can run at once.
 */
export default async function serve(): Promise<() => Promise<void>> {
  const { address, close } = await buildAndServe({ folder: '.cache/page', port: 4273 });
  process.env.RESTPOINT_PAGE = address;
  return close;
}
