import { z } from 'zod';

import { cellDefinition, evaluationMethod } from '#common/schemas/cell';
import { fieldProblem } from '#common/errors/problem';

/** A number with its absolute bound: it is certain within value ± bound. */
export const bounded = z.object({ value: z.number(), bound: z.number() });
export type Bounded = z.infer<typeof bounded>;

/** A number that may mean nothing for this cell, and then says why. */
export const boundedOrReason = z.object({
  value: z.number().nullable(),
  bound: z.number().nullable(),
  reason: z.string().nullable(),
});
export type BoundedOrReason = z.infer<typeof boundedOrReason>;

/** An ion kind: element and charge (mean charge for a mixed site). */
export const species = z.object({
  /** `Mg+2`, `O-2`; a mixed site lists its parts: `Mg+2:0.75/Fe+2:0.25`. */
  key: z.string(),
  element: z.string(),
  charge: z.number(),
  /** How many per formula unit. */
  perFormulaUnit: z.number(),
  isMixed: z.boolean(),
});
export type Species = z.infer<typeof species>;

/** One ion-pair kind of the pair ledger: bare Coulomb energies, per formula unit. */
export const pairLedgerRow = z.object({
  /** Stable name of the row, used by annotations and deep links: `Mg+2|O-2|2.106`. */
  key: z.string(),
  speciesA: z.string(),
  speciesB: z.string(),
  distanceA: z.number(),
  /** Pairs of this kind per formula unit. */
  pairsPerFormulaUnit: z.number(),
  /** k_e q_A q_B / d of one pair. */
  pairEnergyEv: z.number(),
  /** pairsPerFormulaUnit × pairEnergyEv (neutralised view: × (1 − d/R)). */
  contributionEv: z.number(),
  /** Sum of this row and all above it. */
  runningEv: z.number(),
});
export type PairLedgerRow = z.infer<typeof pairLedgerRow>;

export const pairLedger = z.object({
  reachA: z.number(),
  view: z.enum(['bare', 'neutralised']),
  rows: z.array(pairLedgerRow),
  /** Neutralised view only: −k_e Σq²/(2R) per formula unit, else 0. */
  selfEv: z.number(),
  /** Periodic total − Σ rows − self: closes the account. */
  beyondEv: z.number(),
  totalEv: z.number(),
});
export type PairLedger = z.infer<typeof pairLedger>;

/** Neighbours of one ion at one distance and of one kind. */
export const shellRow = z.object({
  speciesKey: z.string(),
  distanceA: z.number(),
  multiplicity: z.number().int(),
  /** multiplicity × k_e q_i q_j / d. */
  energyEv: z.number(),
  runningEv: z.number(),
});
export type ShellRow = z.infer<typeof shellRow>;

/** A site of the asymmetric unit (one row of the definition, mixed rows merged) and what it feels. */
export const siteResult = z.object({
  /** Index into `cell.sites` of the (first) row that defines it. */
  definitionIndex: z.number().int(),
  label: z.string(),
  speciesKey: z.string(),
  element: z.string(),
  /** Mean-field charge Σ occupancy·charge. */
  charge: z.number(),
  /** Number of symmetry copies in the cell. */
  multiplicity: z.number().int(),
  fractional: z.array(z.number()).length(3),
  potentialV: z.number(),
  /** −∇φ at the representative copy, Cartesian, V Å⁻¹. */
  fieldVPerA: z.array(z.number()).length(3),
  forceEvPerA: z.array(z.number()).length(3),
  /** ½ q φ of one copy. */
  energyShareEv: z.number(),
  shells: z.array(shellRow),
});
export type SiteResult = z.infer<typeof siteResult>;

export const sublatticeMatrix = z.object({
  speciesKeys: z.array(z.string()),
  /** E_AB per formula unit for A ≤ B in row A, column B; symmetric entries repeat the value. ΣE over A ≤ B is the total. */
  energiesEv: z.array(z.array(z.number())),
  boundEv: z.number(),
});

/** How the digits were checked. */
export const certificate = z.object({
  /** Ewald splitting parameters of the two evaluations, Å⁻¹. */
  splittingPerA: z.array(z.number()).length(2),
  realCutoffA: z.number(),
  reciprocalCutoffPerA: z.number(),
  realTerms: z.number().int(),
  reciprocalTerms: z.number().int(),
  /** |E₁ − E₂| of the two splitting parameters, per cell. */
  energyDifferenceEv: z.number(),
  /** |tr(σ)V + E| per cell. */
  virialResidualEv: z.number(),
  /** |ΣF| over the cell. */
  forceSumEvPerA: z.number(),
  /** |½Σqφ − E| per cell. */
  potentialSumResidualEv: z.number(),
  /** True when every residual lies within the bound it is allowed. */
  agrees: z.boolean(),
});

export const warning = z.object({ code: z.string(), message: z.string() });
export type Warning = z.infer<typeof warning>;

/** The computed result of one cell under one method. */
export const evaluationResult = z.object({
  engine: z.string(),
  method: evaluationMethod,
  /** Hill-ordered for display by species order of the cell, cations first: `MgO`, `CaF2`. */
  formula: z.string(),
  formulaUnitsPerCell: z.number(),
  sitesPerCell: z.number().int(),
  volumeA3: z.number(),
  densityGPerCm3: z.number().nullable(),
  spaceGroupNumber: z.number().int().nullable(),
  spaceGroupSymbol: z.string().nullable(),
  /** Shortest distance between any two sites, Å. */
  shortestDistanceA: z.number(),
  /** Shortest cation–anion distance d₀, Å; null when the cell has not both. */
  shortestUnlikeDistanceA: z.number().nullable(),
  /** Labels of the two sites of d₀. */
  shortestUnlikePair: z.array(z.string()).length(2).nullable(),
  /** Numerical bound only; k_e adds its own relative uncertainty 1.6e-10. */
  energyEvPerCell: bounded,
  energyEvPerFormulaUnit: bounded,
  /** Bound of energies relative to |E|. */
  relativeErrorBound: z.number(),
  madelung: z.object({
    perDistance: boundedOrReason,
    perCharge: boundedOrReason,
    reduced: boundedOrReason,
    perEdge: boundedOrReason,
  }),
  potentialBoundV: z.number(),
  species: z.array(species),
  sites: z.array(siteResult),
  /** ∂E/∂ε / V: xx, yy, zz, yz, xz, xy in eV Å⁻³ (symmetric, Cartesian). */
  stressEvPerA3: z.array(z.number()).length(6),
  stressBoundEvPerA3: z.number(),
  pairLedger,
  sublatticeMatrix,
  certificate,
  /** True when the point group allows a dipole: the conducting boundary then matters. */
  hasPolarAxis: z.boolean(),
  warnings: z.array(warning),
});
export type EvaluationResult = z.infer<typeof evaluationResult>;

/** Ask for an evaluation. */
export const evaluateRequest = z.object({
  cell: cellDefinition,
  method: evaluationMethod.optional(),
});
export type EvaluateRequest = z.infer<typeof evaluateRequest>;

/** An evaluation at its address. */
export const storedEvaluation = z.object({
  /** SHA-256 of exactly what went in, hex. */
  hash: z.string(),
  computedAt: z.string(),
  durationMs: z.number(),
  result: evaluationResult,
});
export type StoredEvaluation = z.infer<typeof storedEvaluation>;

/** Why a cell has no evaluation. */
export const evaluationProblem = z.object({
  code: z.string(),
  message: z.string(),
  fields: z.array(fieldProblem),
});
export type EvaluationProblem = z.infer<typeof evaluationProblem>;
