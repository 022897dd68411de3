import type { VibrationMode, VibrationsResult } from '#common/schemas/dynamics';

import { dynamicsEngineVersion, vibrationsAtGamma, type GammaMode } from '../engine/index.js';
import { inputAtRest, modelNote, rowsOf, siteNames, type DynamicsSubject } from './from-cell.js';

export interface VibrationsOptions {
  /** Mass of an element in u. */
  readonly massOf: (element: string) => number;
  /** Relax the cell first; otherwise it is taken as given, at rest or not. */
  readonly isRelaxedFirst: boolean;
}

type Triple = [number, number, number];

/** Arrows are for drawing: six decimals keep a result of many modes small. */
const arrowDecimals = 6;

function wireMode({ squareEvPerA2U: _square, displacements, ...mode }: GammaMode): VibrationMode {
  const rounded = displacements.map((x) => Number(x.toFixed(arrowDecimals)) + 0);
  return { ...mode, displacements: rowsOf(rounded, 3) as Triple[] };
}

/** Mean mass of a site: Σ occupancy·mass. */
function massesOf({ cell }: DynamicsSubject, massOf: (element: string) => number): number[] {
  return cell.sites.map(({ components }) =>
    components.reduce((sum, { element, occupancy }) => sum + occupancy * massOf(element), 0),
  );
}

/**
 * Vibrations at Γ of a cell as they go over the wire.
 *
 * @throws Problem as `refuseUnfitForDynamics`
 */
export function vibrationsOfCell(
  subject: DynamicsSubject,
  { massOf, isRelaxedFirst }: VibrationsOptions,
): VibrationsResult {
  const { input, ...at } = inputAtRest(subject, isRelaxedFirst);
  const massesU = massesOf(subject, massOf);
  const result = vibrationsAtGamma({ ...input, massesU, operations: subject.operations });
  return {
    engine: dynamicsEngineVersion,
    ...at,
    sites: siteNames(subject).map((name, i) => ({ ...name, massU: massesU[i]! })),
    transverse: result.transverse.map(wireMode),
    longitudinal: result.longitudinal.map(({ name, direction, modes }) => ({
      name,
      direction: [...direction],
      modes: modes.map(wireMode),
    })),
    imaginaryCount: result.transverse.filter(({ isImaginary }) => isImaginary).length,
    acousticResidualEvPerA2: result.acousticResidualEvPerA2,
    maxForceEvPerA: result.maxForceEvPerA,
    isAtRest: result.isAtRest,
    model: modelNote(subject, result.model.neglectedEv),
  };
}
