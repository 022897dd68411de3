import { spawn } from 'node:child_process';
import { existsSync } from 'node:fs';
import path from 'node:path';

import { ensureDependencies } from './lib/dependencies.mjs';
import { root } from './lib/paths.mjs';
import { main } from './lib/say.mjs';

// What the evaluation itself imports; a fresh clone has none of it.
const needed = ['@spglib/moyo-wasm', 'mathjs', 'tsx', 'zod'];

/** npm changes into the project; file names are relative to where the person stands. */
function calledFrom() {
  const byNpm = process.env.npm_lifecycle_event === 'evaluate';
  return (byNpm && process.env.INIT_CWD) || process.cwd();
}

/** Runs the evaluation from source, so that no build is needed; resolves to its exit code. */
function evaluate() {
  return new Promise((resolve, reject) => {
    const child = spawn(
      process.execPath,
      [
        ...['--import', 'tsx', '--conditions', 'holdfast'],
        'server/src/command-line/evaluate.ts',
        ...process.argv.slice(2),
      ],
      {
        cwd: root,
        stdio: 'inherit',
        env: { ...process.env, HOLDFAST_CALLED_FROM: calledFrom() },
      },
    );
    child.on('error', reject);
    child.on('exit', (code) => resolve(code ?? 1));
  });
}

await main(async () => {
  if (!needed.every((name) => existsSync(path.join(root, 'node_modules', name)))) {
    await ensureDependencies();
  }
  process.exitCode = await evaluate();
});
