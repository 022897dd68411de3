import { describe, expect, it } from 'vitest';

import { seededNumbers } from '#tests/helpers/engine-cells';
import {
  allPairs,
  fittingOperations,
  fluorite,
  moved,
  pairTerm,
  pointOperations,
  rockSalt,
  rutile,
  rutileOperations,
  supercell,
  tight,
  unlikeOnly,
} from '#tests/helpers/pair-model-cells';

import type { PairModelInput } from './contract.js';
import { evaluatePairModel, relax, type RelaxResult } from './index.js';

/** The metric tensor and the coordinates less the first ion's: what no rotation changes. */
function shapeOf({ vectorsA: v, fractional }: Pick<RelaxResult, 'vectorsA' | 'fractional'>) {
  const row = (k: number) => [v[3 * k]!, v[3 * k + 1]!, v[3 * k + 2]!];
  const metric = [0, 1, 2].flatMap((i) =>
    [0, 1, 2].map((j) => row(i).reduce((sum, x, k) => sum + x * row(j)[k]!, 0)),
  );
  const relative = Array.from(fractional, (x, k) => {
    const off = x - fractional[k % 3]!;
    // Half a cell counts as plus one half whatever rounding says.
    return off - Math.ceil(off - 0.5 - 1e-6);
  });
  return [...metric, ...relative];
}

function largestDifference(a: readonly number[], b: readonly number[]): number {
  return Math.max(...a.map((x, k) => Math.abs(x - b[k]!)));
}

/** A start near a cell, strained and displaced at random up to the sizes given. */
function randomStart(cell: PairModelInput, strain: number, moveA: number, seed: number) {
  const random = seededNumbers(seed);
  const within = (size: number) => size * (2 * random() - 1);
  const u = Float64Array.from({ length: 3 * cell.chargesE.length }, () => within(moveA));
  return moved(
    cell,
    u,
    Float64Array.from({ length: 6 }, () => within(strain)),
  );
}

const seeds = Array.from({ length: 20 }, (_, k) => 100 + 7 * k);

describe('from 20 random starts', () => {
  it('rock salt without symmetry returns to one minimum', () => {
    const cell = rockSalt(5.7, allPairs);
    const best = relax({ ...cell, operations: [], criteria: tight });
    expect(best.ended).toBe('converged');
    for (const seed of seeds) {
      const start = randomStart(cell, 0.05, 0.25, seed);
      const found = relax({ ...start, operations: [], criteria: tight });
      expect(found.ended).toBe('converged');
      expect(found.steps.length).toBeGreaterThan(3);
      expect(Math.abs(found.after.energyEv - best.after.energyEv)).toBeLessThanOrEqual(1e-10);
      expect(largestDifference(shapeOf(found), shapeOf(best))).toBeLessThanOrEqual(1e-8);
    }
  });

  it('rutile without symmetry returns to one minimum', () => {
    const best = relax({ ...rutile(), operations: [], criteria: tight });
    expect(best.ended).toBe('converged');
    for (const seed of seeds) {
      const start = randomStart(rutile(), 0.03, 0.1, seed);
      const found = relax({ ...start, operations: [], criteria: tight });
      expect(found.ended).toBe('converged');
      expect(Math.abs(found.after.energyEv - best.after.energyEv)).toBeLessThanOrEqual(1e-9);
      expect(largestDifference(shapeOf(found), shapeOf(best))).toBeLessThanOrEqual(1e-8);
    }
  });

  it('rutile with its space group returns to one minimum and keeps it', () => {
    const operations = rutileOperations();
    const best = relax({ ...rutile(), operations, criteria: tight });
    for (const seed of seeds) {
      const random = seededNumbers(seed);
      const start = rutile(4.3 + 0.7 * random(), 2.8 + 0.4 * random(), 0.29 + 0.03 * random());
      const found = relax({ ...start, operations, criteria: tight });
      expect(found.ended).toBe('converged');
      expect(found.symmetryDeviationA).toBeLessThanOrEqual(1e-12);
      expect(largestDifference(shapeOf(found), shapeOf(best))).toBeLessThanOrEqual(1e-8);
    }
  });
});

describe('symmetry', () => {
  it('of rutile stays: a = b, right angles, cations on their places', () => {
    const start = rutile(4.9, 2.7, 0.33);
    const { vectorsA: v, fractional } = relax({ ...start, operations: rutileOperations() });
    expect(v[0]).toBeCloseTo(v[4]!, 12);
    for (const k of [1, 2, 3, 5, 6, 7]) {
      expect(Math.abs(v[k]!)).toBeLessThanOrEqual(1e-12);
    }
    expect(Array.from(fractional.subarray(0, 6))).toEqual([0, 0, 0, 0.5, 0.5, 0.5]);
    expect(fractional[6]).toBeCloseTo(fractional[7]!, 12);
  });

  it('needs no more steps than the parameters it leaves free', () => {
    // Fluorite has one free parameter, its edge: ions never move.
    const cell = fluorite(5.9);
    const operations = fittingOperations(cell, pointOperations(cell.vectorsA));
    expect(operations).toHaveLength(24 * 2);
    const { fractional, ended } = relax({ ...cell, operations });
    expect(ended).toBe('converged');
    expect(Array.from(fractional)).toEqual(cell.fractional);
  });

  it('given that does not fit is refused', () => {
    const operations = [{ rotation: [1, 0, 0, 0, 1, 0, 0, 0, 1], translation: [0.5, 0, 0] }];
    expect(() => relax({ ...rutile(), operations })).toThrow('does not map');
  });

  it('a polar cell finds rest without drifting along its axis', () => {
    // A tetragonal cell with only the fourfold axis and mirrors through it: z is free for all ions.
    const rotations = [
      [1, 0, 0, 0, 1, 0, 0, 0, 1],
      [-1, 0, 0, 0, -1, 0, 0, 0, 1],
      [0, -1, 0, 1, 0, 0, 0, 0, 1],
      [0, 1, 0, -1, 0, 0, 0, 0, 1],
    ];
    const operations = rotations.map((rotation) => ({ rotation, translation: [0, 0, 0] }));
    const cell: PairModelInput = {
      vectorsA: [2.85, 0, 0, 0, 2.85, 0, 0, 0, 4.1],
      fractional: [0, 0, 0.02, 0.5, 0.5, 0.47],
      chargesE: [1, -1],
      speciesIndex: [0, 1],
      pairs: unlikeOnly,
      cutoffA: 12,
    };
    const { ended, after, fractional } = relax({ ...cell, operations });
    expect(ended).toBe('converged');
    expect(Math.max(...after.forcesEvPerA.map(Math.abs))).toBeLessThanOrEqual(1e-7);
    expect(Math.abs(fractional[2]! - 0.02)).toBeLessThan(0.1);
  });
});

describe('the way to the minimum', () => {
  const cell = rockSalt(6.6, allPairs);

  it('goes downhill and is told step by step', () => {
    const told: number[] = [];
    const { steps, ended } = relax(
      { ...cell, operations: [] },
      { onStep: ({ energyEv }) => told.push(energyEv) },
    );
    expect(ended).toBe('converged');
    expect(told).toEqual(steps.map(({ energyEv }) => energyEv));
    steps.slice(1).forEach(({ energyEv, step }, k) => {
      expect(step).toBe(k + 1);
      expect(energyEv).toBeLessThanOrEqual(steps[k]!.energyEv + 1e-11);
    });
    expect(steps.at(-1)!.maxStressEvPerA3).toBeLessThanOrEqual(1e-8);
    expect(steps[0]!.volumeA3).toBeCloseTo(6.6 ** 3 / 4, 10);
  });

  it('of a cell at rest is no way at all', () => {
    const { vectorsA, fractional } = relax({ ...cell, operations: [], criteria: tight });
    const again = relax({ ...cell, vectorsA, fractional, operations: [] });
    expect(again.ended).toBe('converged');
    expect(again.steps).toHaveLength(1);
  });

  it('ends when asked to stop, and at the limit of steps', () => {
    let asked = 0;
    const stopped = relax({ ...cell, operations: [] }, { shouldStop: () => (asked += 1) > 2 });
    expect(stopped.ended).toBe('stopped');
    expect(stopped.steps).toHaveLength(3);
    const limited = relax({ ...cell, operations: [], criteria: { stepLimit: 1 } });
    expect(limited.ended).toBe('step_limit');
    expect(limited.steps).toHaveLength(2);
  });

  it('ends in a collapse where nothing keeps unlike ions apart', () => {
    const { ended, after } = relax({ ...cell, pairs: [], operations: [] });
    expect(ended).toBe('collapsed');
    expect(Number.isFinite(after.energyEv)).toBe(true);
    expect(after.shortestDistanceA).toBeGreaterThanOrEqual(0.5);
  });

  it('ends in a collapse where dispersion wins at short distance', () => {
    const start = rockSalt(3.2, [pairTerm(0, 1, 300, 0.3, 200)]);
    expect(relax({ ...start, operations: [] }).ended).toBe('collapsed');
  });

  it('says when the ions fly apart', () => {
    const repelling: PairModelInput = {
      ...rockSalt(5.6, [pairTerm(0, 1, 1e5, 1.4)]),
      chargesE: [0, 0],
    };
    expect(relax({ ...repelling, operations: [] }).ended).toBe('dissolved');
  });

  it('moves ions only where the cell is held', () => {
    const start = supercell(rockSalt(5.6, unlikeOnly), [1, 1, 1]);
    const shifted = moved(start, [0, 0, 0, 0.2, -0.1, 0.15], new Float64Array(6));
    const { ended, vectorsA, after } = relax({
      ...shifted,
      operations: [],
      isCellFixed: true,
    });
    expect(ended).toBe('converged');
    expect(vectorsA).toEqual(Array.from(shifted.vectorsA));
    expect(after.energyEv).toBeCloseTo(evaluatePairModel(start).energyEv, 10);
  });

  it('holds a pressure: the stress balances it and the cell is smaller', () => {
    const pressureEvPerA3 = 0.05;
    const operations = fittingOperations(cell, pointOperations(cell.vectorsA));
    const free = relax({ ...cell, operations });
    const pressed = relax({ ...cell, operations, pressureEvPerA3 });
    expect(pressed.ended).toBe('converged');
    expect(pressed.after.volumeA3).toBeLessThan(free.after.volumeA3);
    [0, 1, 2].forEach((v) => {
      expect(pressed.after.stressEvPerA3[v]).toBeCloseTo(-pressureEvPerA3, 7);
    });
  });
});
