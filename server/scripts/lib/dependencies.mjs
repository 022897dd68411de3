import { createHash } from 'node:crypto';
import { accessSync, constants, existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';

import { root } from './paths.mjs';
import { run } from './run.mjs';
import { Advice, say } from './say.mjs';

const stampFile = path.join(root, 'node_modules', '.holdfast-stamp');

function wantedStamp() {
  const hash = createHash('sha256').update(process.version);
  for (const file of ['package.json', 'package-lock.json', '.npmrc']) {
    hash.update(readFileSync(path.join(root, file)));
  }
  return hash.digest('hex');
}

/** npm writes its cache under the home folder; where that can't be, use the project's own. */
function npmEnvironment() {
  try {
    accessSync(os.homedir(), constants.W_OK);
    return {};
  } catch {
    const cache = path.join(root, '.cache', 'npm');
    mkdirSync(cache, { recursive: true });
    return { HOME: cache, npm_config_cache: cache };
  }
}

/** Installs the locked packages unless exactly these are there already. */
export async function ensureDependencies() {
  const stamp = wantedStamp();
  if (existsSync(stampFile) && readFileSync(stampFile, 'utf8') === stamp) {
    return;
  }
  say('installing packages (npm ci)');
  const done = await run('npm', ['ci', '--include=dev', '--no-progress', '--no-audit'], {
    env: npmEnvironment(),
  });
  if (done.code !== 0) {
    throw new Advice(`npm ci failed:\n${done.output}`);
  }
  writeFileSync(stampFile, stamp);
}
