// Measures the engine and the stage; prints JSON and tables. Numbers are for reading, never asserted.
import path from 'node:path';

import { chromiumPackage, ensureDebianPackages } from './lib/debian.mjs';
import { ensureDependencies } from './lib/dependencies.mjs';
import { root } from './lib/paths.mjs';
import { run } from './lib/run.mjs';
import { Advice, main } from './lib/say.mjs';

await main(async () => {
  await ensureDebianPackages([chromiumPackage]);
  await ensureDependencies();
  for (const file of [
    'tests/bench/engine.bench.ts',
    'tests/bench/dynamics.bench.ts',
    'tests/bench/frames/frames.bench.ts',
  ]) {
    const done = await run(
      process.execPath,
      ['--import', 'tsx', '--conditions', 'holdfast', path.join(root, file)],
      { echo: false },
    );
    process.stdout.write(done.output);
    if (done.code !== 0) {
      throw new Advice(`${file} failed.`);
    }
  }
});
