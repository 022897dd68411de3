/** What the sums over vectors and waves add up, whole cell, in eV and Å. */
export interface Sums {
  readonly count: number;
  coulomb: number;
  shortRange: number;
  /** ∂E/∂u, 3N. */
  readonly gradient: Float64Array;
  /** ∂E/∂ε, six. */
  readonly strain: Float64Array;
  /** ∂²E/∂u∂u between different ions only; empty if not asked for. */
  readonly coupling: Float64Array;
  /** ∂²E/∂u∂ε, 3N × 6. */
  readonly mixed: Float64Array;
  /** ∂²E/∂ε∂ε, 6 × 6, upper triangle. */
  readonly strainStrain: Float64Array;
  shortestSquare: number;
}

/** Sums of a cell of N ions before anything is added. */
export function emptySums(count: number, withSecond: boolean): Sums {
  const width = withSecond ? 3 * count : 0;
  return {
    count,
    coulomb: 0,
    shortRange: 0,
    gradient: new Float64Array(3 * count),
    strain: new Float64Array(6),
    coupling: new Float64Array(width * width),
    mixed: new Float64Array(6 * width),
    strainStrain: new Float64Array(36),
    shortestSquare: Infinity,
  };
}

/**
 * m_vw = ½ tr[(E_v E_w + E_w E_v) T] for a symmetric tensor T given by six components, E_v the unit
 * strains: Σ (E_v d)·(E_w d) if T = Σ d d.
 *
 * @param out 36 numbers, row-major
 */
export function unitStrainProducts(t: ArrayLike<number>, out: Float64Array): void {
  const [xx, yy, zz, yz, xz, xy] = [t[0]!, t[1]!, t[2]!, t[3]!, t[4]!, t[5]!];
  const rows = [
    [xx, 0, 0, 0, xz / 2, xy / 2],
    [0, yy, 0, yz / 2, 0, xy / 2],
    [0, 0, zz, yz / 2, xz / 2, 0],
    [0, yz / 2, yz / 2, (yy + zz) / 4, xy / 4, xz / 4],
    [xz / 2, 0, xz / 2, xy / 4, (xx + zz) / 4, yz / 4],
    [xy / 2, xy / 2, 0, xz / 4, yz / 4, (xx + yy) / 4],
  ];
  for (let v = 0; v < 6; v += 1) {
    for (let w = 0; w < 6; w += 1) {
      out[6 * v + w] = rows[v]![w]!;
    }
  }
}

/**
 * Adds factor × E_v g_i to Λ, for a gradient g of 3N components: (E_v g)_a with E_yz = ½(yz + zy)
 * and so on.
 */
export function addUnitStrainsOf(
  gradient: Float64Array,
  factor: number,
  mixed: Float64Array,
): void {
  for (let i = 0; i < gradient.length; i += 3) {
    const x = factor * gradient[i]!;
    const y = factor * gradient[i + 1]!;
    const z = factor * gradient[i + 2]!;
    const at = 6 * i;
    mixed[at]! += x;
    mixed[at + 4]! += z / 2;
    mixed[at + 5]! += y / 2;
    mixed[at + 7]! += y;
    mixed[at + 9]! += z / 2;
    mixed[at + 11]! += x / 2;
    mixed[at + 14]! += z;
    mixed[at + 15]! += y / 2;
    mixed[at + 16]! += x / 2;
  }
}
