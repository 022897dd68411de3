import type { ElasticResult } from '#common/schemas/dynamics';
import type { SpaceGroupSetting } from '#common/schemas/symmetry';

import { dynamicsEngineVersion, elasticConstants } from '../engine/index.js';
import { inputAtRest, modelNote, rowsOf, type DynamicsSubject } from './from-cell.js';

/** Options of computations on a cell at rest. */
export interface ElasticOptions {
  readonly system: SpaceGroupSetting['crystalSystem'];
  /** Relax the cell first; otherwise it is taken as given, at rest or not. */
  readonly isRelaxedFirst: boolean;
}

/**
 * Elastic constants, stability and polycrystal averages of a cell as they go over the wire, GPa.
 *
 * @throws Problem as `refuseUnfitForDynamics`
 */
export function elasticOfCell(
  subject: DynamicsSubject,
  { system, isRelaxedFirst }: ElasticOptions,
): ElasticResult {
  const { input, ...at } = inputAtRest(subject, isRelaxedFirst);
  const result = elasticConstants(input, system);
  const c = result.stiffnessGpa;
  const difference = c[0]! - c[1]!;
  return {
    engine: dynamicsEngineVersion,
    ...at,
    stiffnessGpa: rowsOf(c, 6),
    clampedStiffnessGpa: rowsOf(result.clampedStiffnessGpa, 6),
    compliancePerGpa: result.compliancePerGpa && rowsOf(result.compliancePerGpa, 6),
    eigenvaluesGpa: Array.from(result.eigenvaluesGpa),
    stressGpa: Array.from(result.stressGpa),
    pressureGpa: result.pressureGpa,
    maxForceEvPerA: result.maxForceEvPerA,
    isAtRest: result.isAtRest,
    unstableInternalModes: result.unstableInternalModes,
    stability: { ...result.stability, criteria: [...result.stability.criteria] },
    averages: result.averages && {
      ...result.averages,
      zenerRatio: system === 'cubic' && difference > 0 ? (2 * c[21]!) / difference : null,
    },
    model: modelNote(subject, result.model.neglectedEv),
  };
}
