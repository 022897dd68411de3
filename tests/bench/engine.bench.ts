import { pathToFileURL } from 'node:url';

import { buildPairLedger } from '#common/physics/pair-ledger';
import { evaluateElectrostatics } from '#server/electrostatics/engine/index';
import { planSplitting } from '#server/electrostatics/engine/plan';
import { prepareCell } from '#server/electrostatics/engine/prepare';
import { sumOnce } from '#server/electrostatics/engine/sum';
import { displacedRockSalt } from '../helpers/engine-cells.js';
import { rockSaltCell } from '../helpers/resolved-cells.js';

/** Times of one cell at one tolerance, medians in milliseconds. */
export interface EngineTiming {
  readonly sites: number;
  readonly toleranceRelative: number;
  /** One evaluation: energy, potentials, fields, stress and species matrix. */
  readonly oneSumMs: number;
  /** What people get: two evaluations, bounds and the certificate. */
  readonly certifiedMs: number;
  /** |E(η₁) − E(η₂)| relative to Σq²/d₀. */
  readonly relativeDifference: number;
  readonly realTerms: number;
  readonly reciprocalTerms: number;
}

/** Time of the pair ledger as the reach slider asks for it, median in milliseconds. */
export interface LedgerTiming {
  readonly sites: number;
  readonly reachA: number;
  readonly ms: number;
}

/** All that the engine bench measures. */
export interface EngineBench {
  readonly engine: readonly EngineTiming[];
  readonly ledger: readonly LedgerTiming[];
}

const cubesPerAxis = [1, 2, 4, 5];
const tolerances = [1e-6, 1e-10, 1e-13];
const warmUpMs = 150;

/** Median time of a call after a warm-up, from at least five and up to 200 calls in 0.6 s. */
function medianMs(call: () => unknown): number {
  const start = performance.now();
  do {
    call();
  } while (performance.now() - start < warmUpMs);
  const times: number[] = [];
  const begun = performance.now();
  while (times.length < 5 || (times.length < 200 && performance.now() - begun < 600)) {
    const before = performance.now();
    call();
    times.push(performance.now() - before);
  }
  times.sort((a, b) => a - b);
  return times[Math.floor(times.length / 2)]!;
}

function timeEngine(n: number, toleranceRelative: number): EngineTiming {
  const input = displacedRockSalt(n, toleranceRelative);
  const result = evaluateElectrostatics(input);
  const one = () => {
    const cell = prepareCell(input);
    return sumOnce(cell, planSplitting(cell, toleranceRelative, 1));
  };
  const scaleEv = (14.4 * input.chargesE.length) / result.shortestDistanceA;
  return {
    sites: input.chargesE.length,
    toleranceRelative,
    oneSumMs: medianMs(one),
    certifiedMs: medianMs(() => evaluateElectrostatics(input)),
    relativeDifference: result.certificate.energyDifferenceEv / scaleEv,
    realTerms: result.certificate.realTerms,
    reciprocalTerms: result.certificate.reciprocalTerms,
  };
}

function timeLedger(reachA: number): LedgerTiming {
  const cell = rockSaltCell();
  return {
    sites: cell.sites.length,
    reachA,
    ms: medianMs(() => buildPairLedger(cell, -1, 4, { reachA })),
  };
}

/** Measures the engine on seeded, displaced rock-salt supercells, and the pair ledger. */
export function runEngineBench(): EngineBench {
  return {
    engine: cubesPerAxis.flatMap((n) => tolerances.map((tolerance) => timeEngine(n, tolerance))),
    ledger: [6.4, 10, 16].map(timeLedger),
  };
}

function table(bench: EngineBench): string {
  const lines = bench.engine.map((row) =>
    [
      String(row.sites).padStart(6),
      row.toleranceRelative.toExponential(0).padStart(7),
      row.oneSumMs.toFixed(3).padStart(11),
      row.certifiedMs.toFixed(3).padStart(14),
      row.relativeDifference.toExponential(1).padStart(12),
    ].join(' '),
  );
  const ledgers = bench.ledger.map(
    ({ sites, reachA, ms }) =>
      `pair ledger, ${sites} sites, reach ${reachA.toFixed(1)} Å: ${ms.toFixed(2)} ms`,
  );
  const head = ' sites  toler. one sum, ms certified, ms   two splits';
  return [head, ...lines, ...ledgers].join('\n');
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) {
  const bench = runEngineBench();
  console.log(JSON.stringify(bench));
  console.log(table(bench));
}
