import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';

import { dataFolder } from './paths.mjs';

/** The key that signs session cookies, made on the first start and kept. */
export function sessionSecret() {
  const file = path.join(dataFolder, 'session-secret');
  mkdirSync(dataFolder, { recursive: true });
  if (!existsSync(file)) {
    writeFileSync(file, randomBytes(32).toString('hex'), { mode: 0o600 });
  }
  return readFileSync(file, 'utf8').trim();
}
