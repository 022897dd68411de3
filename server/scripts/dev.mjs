// Watches everything: tsc into dist/, the server restarted on change, Vite for the client.
import { spawn } from 'node:child_process';
import path from 'node:path';

import { ensureBuild } from './lib/build.mjs';
import { ensureCluster } from './lib/cluster.mjs';
import { ensureDebianPackages, postgresPackage } from './lib/debian.mjs';
import { ensureDependencies } from './lib/dependencies.mjs';
import { root } from './lib/paths.mjs';
import { main } from './lib/say.mjs';
import { sessionSecret } from './lib/secrets.mjs';
import { holdAlone } from './lib/single.mjs';

await main(async () => {
  holdAlone('start', 'Holdfast');
  await ensureDebianPackages([postgresPackage]);
  await ensureDependencies();
  const cluster = await ensureCluster({ name: 'cluster' });
  await ensureBuild();
  const env = {
    ...process.env,
    HOLDFAST_DATABASE_URL: cluster.url,
    HOLDFAST_SESSION_SECRET: sessionSecret(),
    HOLDFAST_PUBLIC_ORIGINS: 'http://127.0.0.1:5173,http://localhost:5173',
  };
  const bin = (name) => path.join(root, 'node_modules', '.bin', name);
  const options = { cwd: root, env, stdio: 'inherit' };
  const children = [
    spawn(
      bin('tsc'),
      ['-p', 'server/tsconfig.build.json', '--watch', '--preserveWatchOutput'],
      options,
    ),
    spawn(process.execPath, ['--watch', 'dist/server/src/main.js'], options),
    spawn(bin('vite'), ['--config', 'client/vite.config.ts', '--host', '127.0.0.1'], options),
  ];
  const end = () => children.forEach((child) => child.kill('SIGTERM'));
  process.on('SIGINT', end);
  process.on('SIGTERM', end);
  await Promise.race(children.map((child) => new Promise((resolve) => child.on('exit', resolve))));
  end();
  await cluster.stop();
});
