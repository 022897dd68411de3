import { z } from 'zod';

import { crystalSystem } from '#common/schemas/symmetry';

/**
 * Results of relaxation, elastic constants and vibrations at Γ under a pair model. Lengths in Å,
 * energies in eV per cell unless the name says otherwise. Strain and stress components come in the
 * order xx, yy, zz, yz, xz, xy (Voigt), shear strains as γ = 2ε, in the Cartesian axes of the cell
 * as stored: a along x, b in the xy plane.
 */

/** Sizes the API and the computations share. */
export const dynamicsLimits = { sites: 256 } as const;

const finite = z.number().finite();
const triple = z.tuple([finite, finite, finite]);
const six = z.array(finite).length(6);
const sixBySix = z.array(six).length(6);

/** A cell relaxed under the model before its constants or modes were taken, or as it stands. */
const geometry = z.enum(['as_given', 'relaxed']);

/** What the pair model left out and where it came from. */
const pairModelNote = z.object({
  /** In words: which form, which constants, how they were fitted. */
  derivation: z.string(),
  /** Short-range terms are tapered to zero over the last tenth before this distance. */
  cutoffA: finite,
  /** Estimate of the short-range energy beyond the cut-off at uniform density, per cell. */
  neglectedEvPerCell: finite,
});

/** A site as the results list it, in the order of the resolved cell. */
const resultSite = z.object({
  label: z.string(),
  /** Index into the sites of the cell's definition. */
  definitionIndex: z.number().int(),
  speciesKey: z.string(),
});

/** Why a relaxation ended. */
export const relaxationEnd = z.enum([
  /** Forces and stress are below their limits. */
  'converged',
  /** The number of steps was used up. */
  'step_limit',
  /** Two ions came closer than the guard distance: the pair model lets them fall together. */
  'collapsed',
  /** The cell grew without bound: the pair model doesn't hold the ions together. */
  'dissolved',
  /** No shorter step lowers the energy although a limit is not met: rounding ends it here. */
  'no_descent',
  /** Somebody asked it to stop. */
  'stopped',
]);
export type RelaxationEnd = z.infer<typeof relaxationEnd>;

export const relaxationStep = z.object({
  step: z.number().int(),
  energyEvPerCell: finite,
  maxForceEvPerA: finite,
  maxStressEvPerA3: finite,
  volumeA3: finite,
});
export type RelaxationStep = z.infer<typeof relaxationStep>;

const relaxationCriteria = z.object({
  /** Largest component of the force on any ion. */
  maxForceEvPerA: finite,
  /** Largest component of the stress less the pressure asked for. */
  maxStressEvPerA3: finite,
  /** Change of energy per ion in the last step. */
  energyChangeEvPerIon: finite,
  stepLimit: z.number().int(),
});

/** One end of a relaxation. */
const relaxationState = z.object({
  vectorsA: z.array(finite).length(9),
  aA: finite,
  bA: finite,
  cA: finite,
  alphaDeg: finite,
  betaDeg: finite,
  gammaDeg: finite,
  volumeA3: finite,
  energyEvPerCell: finite,
  energyEvPerFormulaUnit: finite,
  maxForceEvPerA: finite,
  maxStressEvPerA3: finite,
  shortestDistanceA: finite,
});

export const relaxationResult = z.object({
  engine: z.string(),
  ended: relaxationEnd,
  /** Hydrostatic pressure held while relaxing. */
  pressureGpa: finite,
  before: relaxationState,
  after: relaxationState,
  sites: z.array(
    resultSite.extend({
      fractionalBefore: triple,
      fractionalAfter: triple,
      /** Distance moved within the cell, the cell's own strain left out. */
      movedA: finite,
    }),
  ),
  steps: z.array(relaxationStep),
  criteria: relaxationCriteria,
  /** Space-group operations kept, the identity among them. */
  operationCount: z.number().int(),
  /** Largest distance of an ion from where the operations put it, at the end. */
  symmetryDeviationA: finite,
  model: pairModelNote,
});
export type RelaxationResult = z.infer<typeof relaxationResult>;

/** One Born criterion: it holds where the value is positive. */
export const stabilityCriterion = z.object({
  /** As written in the literature: `C₁₁ − |C₁₂| > 0`. */
  statement: z.string(),
  /** Left side less right side, in GPa or GPa². */
  value: finite,
  unit: z.enum(['GPa', 'GPa²', 'GPa³']),
  holds: z.boolean(),
});

export const elasticResult = z.object({
  engine: z.string(),
  geometry,
  /** How the relaxation before it ended; null where none was asked for. */
  relaxationEnded: relaxationEnd.nullable(),
  /** Stiffness with the ions relaxed, symmetric. */
  stiffnessGpa: sixBySix,
  /** The same with the ions held at their fractional coordinates. */
  clampedStiffnessGpa: sixBySix,
  /** Inverse of the stiffness; null where it has none. */
  compliancePerGpa: sixBySix.nullable(),
  /** Eigenvalues of the stiffness in orthonormal (Mandel) components, ascending. */
  eigenvaluesGpa: six,
  /** Negative under pressure. */
  stressGpa: six,
  pressureGpa: finite,
  maxForceEvPerA: finite,
  /** Forces and stress are small enough for elastic constants to mean what they usually do. */
  isAtRest: z.boolean(),
  /** Internal modes along which the ions find no minimum: relaxed constants then mean nothing. */
  unstableInternalModes: z.number().int(),
  stability: z.object({
    /** Crystal system the criteria belong to. */
    system: crystalSystem,
    isStable: z.boolean(),
    criteria: z.array(stabilityCriterion),
    source: z.string(),
  }),
  /** Averages over a polycrystal; null where the stiffness is not positive definite. */
  averages: z
    .object({
      bulkVoigtGpa: finite,
      bulkReussGpa: finite,
      bulkHillGpa: finite,
      shearVoigtGpa: finite,
      shearReussGpa: finite,
      shearHillGpa: finite,
      youngHillGpa: finite,
      poissonHill: finite,
      /** 5 G_V/G_R + K_V/K_R − 6; 0 for an isotropic solid. */
      universalAnisotropy: finite,
      /** 2 C₄₄/(C₁₁ − C₁₂); cubic cells only. */
      zenerRatio: finite.nullable(),
    })
    .nullable(),
  model: pairModelNote,
});
export type ElasticResult = z.infer<typeof elasticResult>;

export const vibrationMode = z.object({
  /** √|ω²|/2π. */
  frequencyThz: finite,
  wavenumberPerCm: finite,
  /** ω² < 0 beyond rounding: the cell lowers its energy along this mode. */
  isImaginary: z.boolean(),
  /** One of the three translations of the whole cell, of frequency zero. */
  isAcoustic: z.boolean(),
  /** Modes of one frequency carry one number. */
  level: z.number().int(),
  /** |Σ Z_i e_i/√m_i| of a primitive cell in e/√u: how strongly the mode carries a dipole. */
  dipoleStrength: finite,
  /** Real displacements per site, Cartesian; the longest arrow has length 1. Six decimals. */
  displacements: z.array(triple),
});
export type VibrationMode = z.infer<typeof vibrationMode>;

export const vibrationsResult = z.object({
  engine: z.string(),
  geometry,
  /** How the relaxation before it ended; null where none was asked for. */
  relaxationEnded: relaxationEnd.nullable(),
  sites: z.array(resultSite.extend({ massU: finite })),
  /**
   * Without the macroscopic field: transverse branches as q → 0, ascending by ω². Three modes per
   * ion of the primitive cell: those in which cells joined by a centring move alike.
   */
  transverse: z.array(vibrationMode),
  /** With the field of waves along a direction q̂ (rigid ions of their full charges). */
  longitudinal: z.array(
    z.object({
      /** Unit vector in Cartesian axes. */
      direction: triple,
      /** What the direction is in the reciprocal axes: `a*`, `b*`, `c*`. */
      name: z.string(),
      modes: z.array(vibrationMode),
    }),
  ),
  imaginaryCount: z.number().int(),
  /** Largest component of Σ_j K_ij, which is zero for a translation, eV Å⁻². */
  acousticResidualEvPerA2: finite,
  maxForceEvPerA: finite,
  /** Forces are small enough for frequencies to mean what they usually do. */
  isAtRest: z.boolean(),
  model: pairModelNote,
});
export type VibrationsResult = z.infer<typeof vibrationsResult>;
