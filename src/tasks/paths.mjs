import { fileURLToPath } from 'node:url';

/** The project's own folder, whatever folder a task was started from. */
export const projectFolder = fileURLToPath(new URL('../../', import.meta.url));

/** @param {string} path relative to the project's folder */
export const inProject = (path) => fileURLToPath(new URL(`../../${path}`, import.meta.url));
