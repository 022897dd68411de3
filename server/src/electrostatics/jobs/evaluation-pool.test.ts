import { setTimeout as delay } from 'node:timers/promises';

import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';

import type { CellDefinition, CellSite } from '#common/schemas/cell';

import { Abandoned, EvaluationPool } from './evaluation-pool.js';
import type { EvaluationTask } from './evaluation-task.js';

const threads = new EvaluationPool({ workerThreads: 1 });
const usual = { ...threads.limits };
beforeAll(async () => {
  await threads.run(quick);
}, 60_000);
afterEach(() => {
  Object.assign(threads.limits, usual);
});
afterAll(() => threads.onApplicationShutdown());

const method = { toleranceRelative: 1e-13, uniformBackground: false };

/** Ions of both signs along the diagonals of a large cell without symmetry. */
function manyIons(count: number): CellDefinition {
  const sites = Array.from({ length: count }, (_, i): CellSite => {
    const at = (step: number) => `${((i * step) % 1).toFixed(6)}`;
    const [x, y, z] = [at(0.618034), at(0.754878), at(0.569841)];
    const charge = i % 2 === 0 ? '1' : '-1';
    return { label: `S${i}`, element: 'Na', charge, x, y, z, occupancy: '1' };
  });
  const lattice = { a: '60', b: '60', c: '60', alpha: '90', beta: '90', gamma: '90' };
  const symmetry: CellDefinition['symmetry'] = { kind: 'operations', operations: ['x, y, z'] };
  return { lattice, symmetry, parameters: [], sites };
}

const quick: EvaluationTask = { kind: 'evaluate', cell: manyIons(2), method };
/** Takes a second or more; the tests end it long before. */
const slow: EvaluationTask = { kind: 'evaluate', cell: manyIons(1500), method };

// An ended thread is followed by a new one, which takes a while to start.
describe('the threads', { timeout: 60_000 }, () => {
  it('evaluate what they are given', async () => {
    const answer = await threads.run(quick);
    expect(answer).toMatchObject({ kind: 'evaluation', result: { sitesPerCell: 2 } });
    expect(threads.status()).toEqual({ ok: true, threads: 1, queued: 0 });
  });

  it('end a computation that takes too long, and go on', async () => {
    threads.limits.waitMs = 200;
    await expect(threads.run(slow)).rejects.toMatchObject({ code: 'evaluation.timeout' });
    threads.limits.waitMs = usual.waitMs;
    expect(await threads.run(quick)).toMatchObject({ kind: 'evaluation' });
  });

  it('say they are busy to whom the queue has no room or no time', async () => {
    const leave = new AbortController();
    threads.limits.graceMs = 0;
    const long = threads.run(slow, leave.signal);
    const ended = expect(long).rejects.toBeInstanceOf(Abandoned);
    threads.limits.waitMs = 100;
    await expect(threads.run(quick)).rejects.toMatchObject({ code: 'server.busy' });
    threads.limits.queued = 0;
    await expect(threads.run(quick)).rejects.toMatchObject({ code: 'server.busy' });
    leave.abort();
    await ended;
    Object.assign(threads.limits, usual);
    expect(await threads.run(quick)).toMatchObject({ kind: 'evaluation' });
  });

  it('drop at once what still waits when its caller leaves', async () => {
    const [first, second] = [new AbortController(), new AbortController()];
    threads.limits.graceMs = 0;
    const running = expect(threads.run(slow, first.signal)).rejects.toBeInstanceOf(Abandoned);
    const waiting = threads.run(slow, second.signal);
    const dropped = expect(waiting).rejects.toBeInstanceOf(Abandoned);
    expect(threads.status().queued).toBe(1);
    second.abort();
    await dropped;
    expect(threads.status().queued).toBe(0);
    first.abort();
    await running;
    expect(await threads.run(quick)).toMatchObject({ kind: 'evaluation' });
  });

  it('finish what is nearly done although its caller has left', async () => {
    const leave = new AbortController();
    const answer = threads.run({ ...quick, cell: manyIons(60) }, leave.signal);
    await delay(2);
    leave.abort();
    const settled = await Promise.allSettled([answer]);
    // Taken from the queue before it began, or let to its end: never cut off in between.
    expect(settled[0].status === 'fulfilled' || settled[0].reason instanceof Abandoned).toBe(true);
    expect(await threads.run(quick)).toMatchObject({ kind: 'evaluation' });
  });

  it('are not asked by someone who has left already', async () => {
    await expect(threads.run(quick, AbortSignal.abort())).rejects.toBeInstanceOf(Abandoned);
  });
});
