import { closeSync, mkdirSync, openSync, readFileSync, rmSync, writeSync } from 'node:fs';
import path from 'node:path';

import { dataFolder } from './paths.mjs';
import { Advice } from './say.mjs';

/** Start time of a process in clock ticks since boot: tells a process from a later one of its number. */
export function processStartTicks(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    return stat.slice(stat.lastIndexOf(')') + 2).split(' ')[19];
  } catch {
    return null;
  }
}

function readHolder(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return null;
  }
}

/**
 * Takes a lock for the life of this process, so that two starts in one folder don't meet.
 * A lock whose process has gone (kill -9 included) is taken over.
 * @param {string} name file name under .data/
 * @param {string} what for the message: `Holdfast`
 */
export function holdAlone(name, what) {
  mkdirSync(dataFolder, { recursive: true });
  const file = path.join(dataFolder, `${name}.lock`);
  for (let attempt = 0; attempt < 5; attempt += 1) {
    try {
      const handle = openSync(file, 'wx');
      writeSync(
        handle,
        JSON.stringify({ pid: process.pid, ticks: processStartTicks(process.pid) }),
      );
      closeSync(handle);
      process.on('exit', () => rmSync(file, { force: true }));
      return;
    } catch (error) {
      if (error.code !== 'EEXIST') {
        throw error;
      }
      const holder = readHolder(file);
      if (holder && holder.ticks === processStartTicks(holder.pid)) {
        throw new Advice(
          `${what} is running in this folder already (process ${holder.pid}). End it first.`,
        );
      }
      rmSync(file, { force: true });
    }
  }
  throw new Advice(`The lock ${file} can’t be taken.`);
}
