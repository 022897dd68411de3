import { z } from 'zod';

/** Sizes the form, the API and the expression parser share. */
export const cellLimits = {
  expressionLength: 120,
  parameters: 40,
  definedSites: 2_000,
  expandedSites: 20_000,
  operations: 192,
  labelLength: 24,
} as const;

/** A number or a formula over the cell's parameters, as typed: `1/3`, `u`, `1/2 - u`. */
export const expressionText = z.string().max(cellLimits.expressionLength);

/** Lattice parameters as typed: edges in Å, angles in degrees; each takes an expression. */
export const latticeParameterTexts = z.object({
  a: expressionText,
  b: expressionText,
  c: expressionText,
  alpha: expressionText,
  beta: expressionText,
  gamma: expressionText,
});
export type LatticeParameterTexts = z.infer<typeof latticeParameterTexts>;
export type LatticeParameterName = keyof LatticeParameterTexts;

/** Symmetry: one of the 530 tabulated settings, or the operations themselves (`-x, y+1/2, z`). */
export const cellSymmetry = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('setting'), hallNumber: z.number().int().min(1).max(530) }),
  z.object({
    kind: z.literal('operations'),
    operations: z.array(z.string().max(80)).min(1).max(cellLimits.operations),
  }),
]);
export type CellSymmetry = z.infer<typeof cellSymmetry>;

/** A named number that coordinates, lattice parameters and other parameters may use. */
export const cellParameter = z.object({
  name: z.string().max(24),
  expression: expressionText,
});
export type CellParameter = z.infer<typeof cellParameter>;

/** One row of the site table; coordinates are fractional. */
export const cellSite = z.object({
  label: z.string().max(cellLimits.labelLength),
  element: z.string().max(3),
  /** In elementary charges; the charge of the ion when the site is fully occupied. */
  charge: expressionText,
  x: expressionText,
  y: expressionText,
  z: expressionText,
  /** Fraction of the places that hold this ion, 0 < occupancy ≤ 1. */
  occupancy: expressionText,
});
export type CellSite = z.infer<typeof cellSite>;

/** A cell as a person defines it. Everything computed follows from this and the method. */
export const cellDefinition = z.object({
  lattice: latticeParameterTexts,
  symmetry: cellSymmetry,
  parameters: z.array(cellParameter).max(cellLimits.parameters),
  sites: z.array(cellSite).max(cellLimits.definedSites),
});
export type CellDefinition = z.infer<typeof cellDefinition>;

/** How a cell is evaluated. */
export const evaluationMethod = z.object({
  /** Relative to Σq²/d₀. */
  toleranceRelative: z.number().min(1e-13).max(1e-4).default(1e-10),
  /** Charged cells only: spread the opposite charge evenly. Every number then carries that mark. */
  uniformBackground: z.boolean().default(false),
});
export type EvaluationMethod = z.infer<typeof evaluationMethod>;

export const defaultEvaluationMethod: EvaluationMethod = {
  toleranceRelative: 1e-10,
  uniformBackground: false,
};
