import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';

import { root } from './paths.mjs';
import { run } from './run.mjs';
import { Advice, say } from './say.mjs';

const stampFile = path.join(root, 'dist', '.holdfast-stamp');
const sources = ['package.json', 'package-lock.json', 'client', 'server', 'common'];

function* filesBelow(place) {
  const found = readdirSync(place, { withFileTypes: true });
  for (const entry of found.sort((a, b) => (a.name < b.name ? -1 : 1))) {
    const full = path.join(place, entry.name);
    if (entry.isDirectory()) {
      yield* filesBelow(full);
    } else if (!/\.test\.tsx?$/.test(entry.name)) {
      yield full;
    }
  }
}

function wantedStamp() {
  const hash = createHash('sha256');
  for (const source of sources) {
    const full = path.join(root, source);
    const files = source.includes('.') ? [full] : filesBelow(full);
    for (const file of files) {
      hash.update(path.relative(root, file)).update('\0').update(readFileSync(file)).update('\0');
    }
  }
  return hash.digest('hex');
}

/** Builds server and client into dist/ unless dist/ holds exactly these sources already. */
export async function ensureBuild() {
  const stamp = wantedStamp();
  if (existsSync(stampFile) && readFileSync(stampFile, 'utf8') === stamp) {
    return;
  }
  say('building server and client');
  rmSync(stampFile, { force: true });
  rmSync(path.join(root, 'dist', 'server.tsbuildinfo'), { force: true });
  mkdirSync(path.join(root, 'dist'), { recursive: true });
  const results = await Promise.all([
    run('npm', ['run', '--silent', 'build:server']),
    run('npm', ['run', '--silent', 'build:client']),
  ]);
  const failed = results.filter(({ code }) => code !== 0);
  if (failed.length > 0) {
    throw new Advice(`The build failed:\n${failed.map(({ output }) => output).join('\n')}`);
  }
  writeFileSync(stampFile, stamp);
}
