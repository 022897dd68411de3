import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';

import { run } from './run.mjs';
import { Advice, say } from './say.mjs';

export const postgresBin = '/usr/lib/postgresql/15/bin';
export const chromiumPath = '/usr/bin/chromium';

/** Debian's PostgreSQL makes a cluster of its own on install unless told not to. */
function preventMainCluster() {
  const file = '/etc/postgresql-common/createcluster.conf';
  mkdirSync('/etc/postgresql-common', { recursive: true });
  const text = existsSync(file) ? readFileSync(file, 'utf8') : '';
  if (!/^\s*create_main_cluster\s*=\s*false/m.test(text)) {
    writeFileSync(file, `${text}\ncreate_main_cluster = false\n`);
  }
}

/**
 * Installs the Debian packages whose file is missing, when root; else says what to ask for.
 * @param {{ file: string, package: string }[]} wanted
 */
export async function ensureDebianPackages(wanted) {
  const missing = wanted.filter(({ file }) => !existsSync(file)).map((entry) => entry.package);
  if (missing.length === 0) {
    return;
  }
  if (process.getuid() !== 0) {
    throw new Advice(
      `Debian packages are missing: ${missing.join(', ')}.\n` +
        `Ask an administrator for: apt-get install ${missing.join(' ')}\nThen run this again.`,
    );
  }
  say(`installing ${missing.join(', ')} from Debian`);
  if (missing.some((name) => name.startsWith('postgresql'))) {
    preventMainCluster();
  }
  const env = { DEBIAN_FRONTEND: 'noninteractive' };
  await run('apt-get', ['update', '-qq'], { env });
  const done = await run(
    'apt-get',
    ['install', '-y', '-qq', '--no-install-recommends', ...missing],
    { env },
  );
  const still = wanted.filter(({ file }) => !existsSync(file));
  if (still.length > 0) {
    throw new Advice(`apt-get could not install ${missing.join(', ')}:\n${done.output}`);
  }
}

export const postgresPackage = { file: `${postgresBin}/postgres`, package: 'postgresql-15' };
export const chromiumPackage = { file: chromiumPath, package: 'chromium' };
export const popplerPackage = { file: '/usr/bin/pdftotext', package: 'poppler-utils' };
