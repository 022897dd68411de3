/**
 * The cell as numbers: what a {@link CellDefinition} means once expressions are evaluated,
 * symmetry is applied and mixed sites are merged. Input of everything computed.
 */

/** Lattice parameters, edges in Å, angles in degrees. */
export interface LatticeParameters {
  readonly aA: number;
  readonly bA: number;
  readonly cA: number;
  readonly alphaDeg: number;
  readonly betaDeg: number;
  readonly gammaDeg: number;
}

/** One ion kind on a site and the fraction of places it holds. */
export interface SiteComponent {
  readonly element: string;
  readonly chargeE: number;
  readonly occupancy: number;
}

/** One place in the unit cell (space group P1): every symmetry copy stands for itself. */
export interface ResolvedSite {
  /** Index into `CellDefinition.sites` of the first row that defines this place. */
  readonly definitionIndex: number;
  /** Label of that row. */
  readonly label: string;
  /** 0 for the position as typed, then one per symmetry copy. */
  readonly copy: number;
  /** Fractional coordinates in [0, 1). */
  readonly fractional: readonly [number, number, number];
  /** Mean-field charge Σ occupancy·charge, elementary charges. */
  readonly chargeE: number;
  /** Element of the largest component; the components say the rest. */
  readonly element: string;
  readonly components: readonly SiteComponent[];
  /** Ion kind: `Mg+2`; `Mg+2:0.75/Fe+2:0.25` where mixed or partly empty. */
  readonly speciesKey: string;
}

/** A whole cell in numbers. */
export interface ResolvedCell {
  readonly lattice: LatticeParameters;
  /** Rows a, b, c in Cartesian Å, row-major, a along x, b in the xy plane. */
  readonly vectorsA: readonly number[];
  readonly volumeA3: number;
  readonly sites: readonly ResolvedSite[];
  /** Number of symmetry operations applied, and whether they leave a polar axis. */
  readonly operationCount: number;
  readonly hasPolarAxis: boolean;
  /** Values of the named parameters. */
  readonly parameters: Readonly<Record<string, number>>;
}
