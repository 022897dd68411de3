// One command from a fresh clone to a served product. Node built-ins only until packages exist.
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

/** A database named by the environment is used as it is; else the project keeps its own. */
async function database() {
  if (process.env.HOLDFAST_DATABASE_URL) {
    return { url: process.env.HOLDFAST_DATABASE_URL, stop: async () => {} };
  }
  await ensureDebianPackages([postgresPackage]);
  return ensureCluster({ name: 'cluster' });
}

function serve(url) {
  const preload = path.join(root, 'server', 'scripts', 'lib', 'end-with-parent.mjs');
  return spawn(
    process.execPath,
    ['--import', `file://${preload}`, path.join(root, 'dist', 'server', 'src', 'main.js')],
    {
      cwd: root,
      stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
      env: {
        NODE_ENV: 'production',
        HOLDFAST_SESSION_SECRET: sessionSecret(),
        ...process.env,
        HOLDFAST_DATABASE_URL: url,
      },
    },
  );
}

/** Ends the server when npm, which started this script, is gone: nobody else could. */
function followParent(end) {
  if (!process.env.npm_lifecycle_event) {
    return;
  }
  const parent = process.ppid;
  setInterval(() => {
    if (process.ppid !== parent) {
      end();
    }
  }, 1000).unref();
}

await main(async () => {
  holdAlone('start', 'Holdfast');
  const [{ url, stop }] = await Promise.all([database(), ensureDependencies().then(ensureBuild)]);
  const server = serve(url);
  const end = () => server.kill('SIGTERM');
  process.on('SIGINT', end);
  process.on('SIGTERM', end);
  process.on('SIGHUP', end);
  followParent(end);
  const code = await new Promise((resolve) => {
    server.on('exit', (exitCode) => resolve(exitCode ?? 0));
  });
  await stop();
  process.exitCode = code;
});
