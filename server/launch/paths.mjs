import { fileURLToPath } from 'node:url';
import { resolve } from 'node:path';

/** The folder of the repository; every process of the product works in it. */
export const ROOT = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '');

/**
 * A path below the repository.
 * @param {...string} parts
 */
export const inRoot = (...parts) => resolve(ROOT, ...parts);
