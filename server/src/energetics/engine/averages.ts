export interface PolycrystalAverages {
  readonly bulkVoigtGpa: number;
  readonly bulkReussGpa: number;
  readonly bulkHillGpa: number;
  readonly shearVoigtGpa: number;
  readonly shearReussGpa: number;
  readonly shearHillGpa: number;
  /** E = 9KG/(3K + G) of the Hill means. */
  readonly youngHillGpa: number;
  /** ν = (3K − 2G)/(6K + 2G) of the Hill means. */
  readonly poissonHill: number;
  /** 5 G_V/G_R + K_V/K_R − 6. */
  readonly universalAnisotropy: number;
}

/** Sums of the entries of a 6 × 6 matrix that the averages need. */
function invariants(m: Float64Array) {
  const at = (i: number, j: number) => m[6 * (i - 1) + j - 1]!;
  return {
    diagonal: at(1, 1) + at(2, 2) + at(3, 3),
    beside: at(1, 2) + at(1, 3) + at(2, 3),
    shear: at(4, 4) + at(5, 5) + at(6, 6),
  };
}

/**
 * Averages over a polycrystal without texture.
 * Voigt (uniform strain): 9K = D + 2B, 15G = D − B + 3S of C; Reuss (uniform stress):
 * 1/K = D + 2B, 15/G = 4D − 4B + 3S of C⁻¹, with D the sum of the first three diagonal entries, B
 * that beside them, S that of the shear entries; Hill: their means.
 * Source: R. Hill, Proc. Phys. Soc. A 65 (1952) 349; anisotropy: S. I. Ranganathan,
 * M. Ostoja-Starzewski, Phys. Rev. Lett. 101 (2008) 055504.
 *
 * @param stiffnessGpa C, positive definite
 * @param compliancePerGpa C⁻¹
 */
export function polycrystalAverages(
  stiffnessGpa: Float64Array,
  compliancePerGpa: Float64Array,
): PolycrystalAverages {
  const c = invariants(stiffnessGpa);
  const s = invariants(compliancePerGpa);
  const bulkVoigtGpa = (c.diagonal + 2 * c.beside) / 9;
  const shearVoigtGpa = (c.diagonal - c.beside + 3 * c.shear) / 15;
  const bulkReussGpa = 1 / (s.diagonal + 2 * s.beside);
  const shearReussGpa = 15 / (4 * s.diagonal - 4 * s.beside + 3 * s.shear);
  const k = (bulkVoigtGpa + bulkReussGpa) / 2;
  const g = (shearVoigtGpa + shearReussGpa) / 2;
  return {
    bulkVoigtGpa,
    bulkReussGpa,
    bulkHillGpa: k,
    shearVoigtGpa,
    shearReussGpa,
    shearHillGpa: g,
    youngHillGpa: (9 * k * g) / (3 * k + g),
    poissonHill: (3 * k - 2 * g) / (6 * k + 2 * g),
    universalAnisotropy: (5 * shearVoigtGpa) / shearReussGpa + bulkVoigtGpa / bulkReussGpa - 6,
  };
}
