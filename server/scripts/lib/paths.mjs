import { createHash } from 'node:crypto';
import { fileURLToPath } from 'node:url';
import path from 'node:path';

/** The project's root, wherever the command was called from. */
export const root = fileURLToPath(new URL('../../..', import.meta.url)).replace(/\/$/, '');

/** Everything that is kept between starts and never committed. */
export const dataFolder = path.join(root, '.data');

/** Short name of this checkout, for folders outside it. */
export const checkoutName = `holdfast-${createHash('sha256').update(root).digest('hex').slice(0, 10)}`;
