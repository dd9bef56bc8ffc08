import path from 'node:path';
import { fileURLToPath } from 'node:url';

/** The project's folder, told in a way that the oldest Node we speak to understands. */
export const ROOT = fileURLToPath(new URL('../../', import.meta.url)).replace(/\/$/, '');
export const inRoot = (...parts) => path.join(ROOT, ...parts);
/** Everything a run leaves behind lies here, and nowhere else but in `.next` and `node_modules`. */
export const inData = (...parts) => path.join(ROOT, '.data', ...parts);
