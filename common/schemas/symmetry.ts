import { z } from 'zod';

export const crystalSystem = z.enum([
  'triclinic',
  'monoclinic',
  'orthorhombic',
  'tetragonal',
  'trigonal',
  'hexagonal',
  'cubic',
]);

/** One of the 530 tabulated settings of the 230 space groups. */
export const spaceGroupSetting = z.object({
  hallNumber: z.number().int().min(1).max(530),
  /** International Tables number, 1–230. */
  number: z.number().int().min(1).max(230),
  /** Short Hermann–Mauguin symbol with spaces: `F m -3 m`. */
  symbol: z.string(),
  hallSymbol: z.string(),
  /** Setting code: origin choice `1`/`2`, axes `H`/`R`, cell choice; empty when there is one setting. */
  setting: z.string(),
  crystalSystem,
  /** True for hexagonal axes (a = b, γ = 120°) of trigonal groups; false for rhombohedral axes. */
  hexagonalAxes: z.boolean(),
  /** Monoclinic unique axis, else null. */
  uniqueAxis: z.enum(['a', 'b', 'c']).nullable(),
  /** Whether this is the setting taken when only the number is given. */
  isStandard: z.boolean(),
});
export type SpaceGroupSetting = z.infer<typeof spaceGroupSetting>;

/** A symmetry operation on fractional column vectors: x′ = W x + w. */
export const symmetryOperation = z.object({
  /** W, row-major, integers. */
  rotation: z.array(z.number().int()).length(9),
  /** w in [0, 1). */
  translation: z.array(z.number()).length(3),
});
export type SymmetryOperation = z.infer<typeof symmetryOperation>;

export const spaceGroupList = z.object({ items: z.array(spaceGroupSetting) });

export const spaceGroupDetail = spaceGroupSetting.extend({
  operations: z.array(symmetryOperation),
});
export type SpaceGroupDetail = z.infer<typeof spaceGroupDetail>;
