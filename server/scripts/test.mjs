// Everything that must hold, with all it needs set up: checks, unit, database, HTTP and browser tests.
import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import path from 'node:path';

import { ensureBuild } from './lib/build.mjs';
import { ensureCluster } from './lib/cluster.mjs';
import {
  chromiumPackage,
  ensureDebianPackages,
  popplerPackage,
  postgresPackage,
} from './lib/debian.mjs';
import { ensureDependencies } from './lib/dependencies.mjs';
import { root } from './lib/paths.mjs';
import { run } from './lib/run.mjs';
import { main, say } from './lib/say.mjs';
import { holdAlone } from './lib/single.mjs';

const reports = path.join(root, '.cache', 'test-reports');
const count = { passed: 0, failed: 0 };

/** One check of `npm run check`: counts as one test. */
async function check(script) {
  const started = Date.now();
  const done = await run('npm', ['run', '--silent', script]);
  const seconds = ((Date.now() - started) / 1000).toFixed(1);
  count[done.code === 0 ? 'passed' : 'failed'] += 1;
  process.stdout.write(`${done.code === 0 ? 'ok  ' : 'FAIL'} ${script} (${seconds} s)\n`);
  if (done.code !== 0) {
    process.stdout.write(`${done.output}\n`);
  }
}

/** One or more vitest projects; counts each test, and the run itself where it broke otherwise. */
async function ring(name, projects, env) {
  say(`${name} tests`);
  const report = path.join(reports, `${name}.json`);
  const chosen = projects.flatMap((project) => ['--project', project]);
  const done = await run(
    path.join(root, 'node_modules', '.bin', 'vitest'),
    ['run', '--config', 'tests/vitest.config.ts', ...chosen].concat([
      '--reporter=dot',
      '--reporter=json',
      `--outputFile.json=${report}`,
    ]),
    { env, echo: true },
  );
  const result = existsSync(report) ? JSON.parse(readFileSync(report, 'utf8')) : null;
  count.passed += result?.numPassedTests ?? 0;
  count.failed += result?.numFailedTests ?? 0;
  if (done.code !== 0 && !(result?.numFailedTests > 0)) {
    count.failed += 1;
  }
  if (done.code === 0 && !(result?.numPassedTests > 0)) {
    process.stdout.write(`FAIL ${name}: no test ran\n`);
    count.failed += 1;
  }
}

await main(async () => {
  holdAlone('test', 'npm test');
  await ensureDebianPackages([postgresPackage, chromiumPackage, popplerPackage]);
  await ensureDependencies();
  rmSync(reports, { recursive: true, force: true });
  mkdirSync(reports, { recursive: true });
  const cluster = await ensureCluster({
    name: 'test-cluster',
    mayCreateDatabases: true,
    tuning: ['fsync=off', 'synchronous_commit=off', 'full_page_writes=off', 'max_connections=200'],
  });
  try {
    say('checks');
    for (const script of ['typecheck', 'lint', 'format:check', 'knip', 'imports', 'db:check']) {
      await check(script);
    }
    const env = { HOLDFAST_TEST_DATABASE_URL: cluster.url };
    await ring('unit', ['unit', 'client'], env);
    await ring('database', ['db'], env);
    await ring('http', ['e2e'], env);
    await ensureBuild();
    await ring('browser', ['browser'], env);
  } finally {
    await cluster.stop();
  }
  process.stdout.write(`\n${count.passed} passed, ${count.failed} failed\n`);
  process.exitCode = count.failed === 0 ? 0 : 1;
});
