import { cellVectors, cellVolumeA3, fractionalToCartesian } from '#common/physics/cell-metric';
import { composition } from '#common/physics/composition';
import type { RelaxationResult, RelaxationStep } from '#common/schemas/dynamics';
import { EV_PER_CUBIC_ANGSTROM_IN_GPA } from '#common/units/constants';

import { dynamicsEngineVersion, relax, type PairModelResult } from '../engine/index.js';
import { modelNote, pairModelInput, siteNames, type DynamicsSubject } from './from-cell.js';

export interface RelaxationOptions {
  /** Hydrostatic pressure to hold; 0 if left out. */
  readonly pressureGpa?: number;
  readonly onStep?: (step: RelaxationStep) => void;
  readonly shouldStop?: () => boolean;
}

type Triple = [number, number, number];

/** a, b, c, α, β, γ of rows of Cartesian vectors. */
function latticeParameters(v: readonly number[]) {
  const row = (k: number): Triple => [v[3 * k]!, v[3 * k + 1]!, v[3 * k + 2]!];
  const length = (k: number) => Math.hypot(...row(k));
  const angle = (i: number, j: number) => {
    const dot = row(i).reduce((sum, x, k) => sum + x * row(j)[k]!, 0);
    return (Math.acos(dot / (length(i) * length(j))) * 180) / Math.PI;
  };
  return {
    aA: length(0),
    bA: length(1),
    cA: length(2),
    alphaDeg: angle(1, 2),
    betaDeg: angle(0, 2),
    gammaDeg: angle(0, 1),
  };
}

function stateOf(
  vectorsA: readonly number[],
  model: PairModelResult,
  step: RelaxationStep,
  units: number,
) {
  const lattice = latticeParameters(vectorsA);
  return {
    ...lattice,
    vectorsA: cellVectors(lattice),
    volumeA3: cellVolumeA3(vectorsA),
    energyEvPerCell: model.energyEv,
    energyEvPerFormulaUnit: model.energyEv / units,
    maxForceEvPerA: step.maxForceEvPerA,
    maxStressEvPerA3: step.maxStressEvPerA3,
    shortestDistanceA: model.shortestDistanceA,
  };
}

function wrapped(value: number): number {
  const inside = value - Math.floor(value);
  return inside >= 1 ? 0 : inside;
}

/** Where each site was and is, and how far it moved within the cell. */
function sitesOf(subject: DynamicsSubject, vectorsA: readonly number[], after: Float64Array) {
  return siteNames(subject).map((name, i) => {
    const { fractional } = subject.cell.sites[i]!;
    const moved = fractional.map((value, k) => {
      const change = after[3 * i + k]! - value;
      return change - Math.round(change);
    });
    return {
      ...name,
      fractionalBefore: [...fractional] as Triple,
      fractionalAfter: fractional.map((_, k) => wrapped(after[3 * i + k]!)) as Triple,
      movedA: Math.hypot(...fractionalToCartesian(vectorsA, moved)),
    };
  });
}

/**
 * Relaxes a cell under its pair potentials, keeping its operations; the result as it goes over the
 * wire. Energies in eV, lengths in Å.
 *
 * @throws Problem as `refuseUnfitForDynamics`; RangeError if an operation doesn't fit the sites
 */
export function relaxationOfCell(
  subject: DynamicsSubject,
  options: RelaxationOptions = {},
): RelaxationResult {
  const { onStep, shouldStop, pressureGpa = 0 } = options;
  const steps: RelaxationStep[] = [];
  const result = relax(
    {
      ...pairModelInput(subject),
      operations: subject.operations,
      pressureEvPerA3: pressureGpa / EV_PER_CUBIC_ANGSTROM_IN_GPA,
    },
    {
      onStep: ({ energyEv, ...step }) => {
        const wire = { ...step, energyEvPerCell: energyEv };
        steps.push(wire);
        onStep?.(wire);
      },
      ...(shouldStop === undefined ? {} : { shouldStop }),
    },
  );
  const units = composition(subject.cell).formulaUnitsPerCell;
  return {
    engine: dynamicsEngineVersion,
    ended: result.ended,
    pressureGpa,
    before: stateOf(subject.cell.vectorsA, result.before, steps[0]!, units),
    after: stateOf(result.vectorsA, result.after, steps.at(-1)!, units),
    sites: sitesOf(subject, result.vectorsA, result.fractional),
    steps,
    criteria: result.criteria,
    operationCount: subject.operations.length,
    symmetryDeviationA: result.symmetryDeviationA,
    model: modelNote(subject, result.after.neglectedEv),
  };
}
