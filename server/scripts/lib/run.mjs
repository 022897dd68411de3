import { spawn } from 'node:child_process';

import { root } from './paths.mjs';

/**
 * Runs a command to its end.
 * @param {string} command
 * @param {string[]} args
 * @param {{ env?: Record<string, string>, user?: { uid: number, gid: number } | null, cwd?: string,
 *   input?: string, echo?: boolean }} [options] `echo` passes output through as it comes
 * @returns {Promise<{ code: number, output: string }>} exit code (128 + n for a signal) and output
 */
export function run(command, args, options = {}) {
  const { env, user, cwd = root, input, echo = false } = options;
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, {
      cwd,
      env: { ...process.env, ...env },
      stdio: [input === undefined ? 'ignore' : 'pipe', 'pipe', 'pipe'],
      ...(user ? { uid: user.uid, gid: user.gid } : {}),
    });
    let output = '';
    const take = (chunk) => {
      output += chunk;
      if (echo) {
        process.stderr.write(chunk);
      }
    };
    child.stdout.on('data', take);
    child.stderr.on('data', take);
    child.on('error', reject);
    // `exit`, not `close`: a daemon that the command leaves behind may keep the pipes open.
    child.on('exit', (code, signal) => {
      setTimeout(() => resolve({ code: code ?? (signal ? 128 : 1), output }), 20);
    });
    if (input !== undefined) {
      child.stdin.end(input);
    }
  });
}
