import path from 'node:path';
import { fileURLToPath } from 'node:url';

/** The folder that package.json lies in. */
export const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '..', '..');

/** A path inside the checkout. */
export const inRoot = (...parts) => path.join(root, ...parts);

/** Where the product keeps what must outlive a restart: DATA_DIR, or `.data` in the checkout. */
export const wantedDataDir = (env = process.env) => path.resolve(root, env.DATA_DIR || '.data');
