import { cellVectors, cellVolumeA3 } from '#common/physics/cell-metric';
import type { LatticeParameters, ResolvedCell, ResolvedSite } from '#common/physics/resolved-cell';

/** A site as a test writes it. */
export interface TestSite {
  readonly element: string;
  readonly chargeE: number;
  readonly at: readonly [number, number, number];
  /** Row of the site table; sites of one row are copies of one another. */
  readonly row?: number;
  readonly occupancy?: number;
}

const cubic = (aA: number): LatticeParameters => ({
  aA,
  bA: aA,
  cA: aA,
  alphaDeg: 90,
  betaDeg: 90,
  gammaDeg: 90,
});

function keyOf({ element, chargeE, occupancy = 1 }: TestSite): string {
  const sign = chargeE === 0 ? '' : chargeE > 0 ? '+' : '-';
  const key = `${element}${sign}${Math.abs(chargeE)}`;
  return occupancy === 1 ? key : `${key}:${occupancy}`;
}

/** A cell in numbers from its lattice parameters and every site in it. */
export function resolvedCell(
  lattice: LatticeParameters,
  sites: readonly TestSite[],
  hasPolarAxis = false,
): ResolvedCell {
  const vectorsA = cellVectors(lattice);
  const copies = new Map<number, number>();
  return {
    lattice,
    vectorsA,
    volumeA3: cellVolumeA3(vectorsA),
    sites: sites.map((site, i): ResolvedSite => {
      const { element, chargeE, at, row = i, occupancy = 1 } = site;
      const copy = copies.get(row) ?? 0;
      copies.set(row, copy + 1);
      return {
        definitionIndex: row,
        label: `${element}${row + 1}`,
        copy,
        fractional: at,
        chargeE: chargeE * occupancy,
        element,
        components: [{ element, chargeE, occupancy }],
        speciesKey: keyOf(site),
      };
    }),
    operationCount: 1,
    hasPolarAxis,
    parameters: {},
  };
}

const faceCentred: readonly (readonly [number, number, number])[] = [
  [0, 0, 0],
  [0, 0.5, 0.5],
  [0.5, 0, 0.5],
  [0.5, 0.5, 0],
];

/** Rock salt, eight ions in a cube: two rows of four copies. */
export function rockSaltCell(aA = 4.212, chargeE = 2): ResolvedCell {
  return resolvedCell(cubic(aA), [
    ...faceCentred.map((at) => ({ element: 'Mg', chargeE, at, row: 0 })),
    ...faceCentred.map(([x, y, z]) => ({
      element: 'O',
      chargeE: -chargeE,
      at: [(x + 0.5) % 1, (y + 0.5) % 1, (z + 0.5) % 1] as const,
      row: 1,
    })),
  ]);
}

/** Fluorite, twelve ions in a cube. */
export function fluoriteCell(aA = 5.4626): ResolvedCell {
  return resolvedCell(cubic(aA), [
    ...faceCentred.map((at) => ({ element: 'Ca', chargeE: 2, at, row: 0 })),
    ...faceCentred.flatMap(([x, y, z]) =>
      [0.25, 0.75].map((shift) => ({
        element: 'F',
        chargeE: -1,
        at: [(x + shift) % 1, (y + shift) % 1, (z + shift) % 1] as const,
        row: 1,
      })),
    ),
  ]);
}

/** A cube with the sites given. */
export function cubicCell(aA: number, sites: readonly TestSite[], hasPolarAxis = false) {
  return resolvedCell(cubic(aA), sites, hasPolarAxis);
}
