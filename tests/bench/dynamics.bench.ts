import { pathToFileURL } from 'node:url';

import {
  elasticConstants,
  evaluatePairModel,
  relax,
  vibrationsAtGamma,
} from '#server/energetics/engine/index';

import { shakenRockSalt } from '../helpers/pair-model-cells.js';

/** Times of one rock-salt cell without symmetry, medians in milliseconds. */
export interface DynamicsTiming {
  readonly sites: number;
  readonly energyAndForcesMs: number;
  readonly secondDerivativesMs: number;
  readonly relaxationMs: number;
  readonly relaxationSteps: number;
  readonly elasticMs: number;
  /** Four sets of modes: transverse, and with the field along three directions. */
  readonly vibrationsMs: number;
}

const shapes = [
  [1, 1, 2],
  [2, 2, 2],
  [2, 2, 6],
  [4, 4, 4],
  [4, 4, 8],
] as const;

/** Median time of a call from three to fifty calls in about a second, after a first one. */
function medianMs(call: () => unknown): number {
  call();
  const times: number[] = [];
  const begun = performance.now();
  while (times.length < 3 || (times.length < 50 && performance.now() - begun < 800)) {
    const before = performance.now();
    call();
    times.push(performance.now() - before);
  }
  times.sort((a, b) => a - b);
  return times[Math.floor(times.length / 2)]!;
}

function timeCell(shape: readonly [number, number, number]): DynamicsTiming {
  const cell = shakenRockSalt(shape);
  const operations = [{ rotation: [1, 0, 0, 0, 1, 0, 0, 0, 1], translation: [0, 0, 0] }];
  const massesU = Array.from(cell.speciesIndex, (species) => (species === 0 ? 23 : 35.5));
  return {
    sites: cell.chargesE.length,
    energyAndForcesMs: medianMs(() => evaluatePairModel(cell)),
    secondDerivativesMs: medianMs(() => evaluatePairModel(cell, { withSecondDerivatives: true })),
    relaxationMs: medianMs(() => relax({ ...cell, operations })),
    relaxationSteps: relax({ ...cell, operations }).steps.length - 1,
    elasticMs: medianMs(() => elasticConstants(cell, 'triclinic')),
    vibrationsMs: medianMs(() => vibrationsAtGamma({ ...cell, massesU, operations })),
  };
}

/** Measures the pair model's computations on seeded, shaken rock salt. */
export function runDynamicsBench(): readonly DynamicsTiming[] {
  return shapes.map(timeCell);
}

function table(rows: readonly DynamicsTiming[]): string {
  const head = ' sites  forces, ms  second, ms  relax, ms  steps  elastic, ms  modes, ms';
  const lines = rows.map((row) =>
    [
      String(row.sites).padStart(6),
      row.energyAndForcesMs.toFixed(2).padStart(11),
      row.secondDerivativesMs.toFixed(2).padStart(11),
      row.relaxationMs.toFixed(1).padStart(10),
      String(row.relaxationSteps).padStart(6),
      row.elasticMs.toFixed(1).padStart(12),
      row.vibrationsMs.toFixed(1).padStart(10),
    ].join(' '),
  );
  return [head, ...lines].join('\n');
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) {
  const rows = runDynamicsBench();
  console.log(JSON.stringify({ dynamics: rows }));
  console.log(table(rows));
}
