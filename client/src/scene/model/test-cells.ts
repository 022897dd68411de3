import type { ResolvedCell } from '#common/physics/resolved-cell';

type Place = readonly [number, number, number];

/** A resolved cell from plain rows, for tests of the scene. */
export function cellOf(
  vectorsA: readonly number[],
  rows: readonly { element: string; chargeE: number; places: readonly Place[] }[],
): ResolvedCell {
  return {
    lattice: { aA: 1, bA: 1, cA: 1, alphaDeg: 90, betaDeg: 90, gammaDeg: 90 },
    vectorsA,
    volumeA3: 1,
    sites: rows.flatMap(({ element, chargeE, places }, definitionIndex) =>
      places.map((fractional, copy) => ({
        definitionIndex,
        label: `${element}1`,
        copy,
        fractional,
        chargeE,
        element,
        components: [{ element, chargeE, occupancy: 1 }],
        speciesKey: `${element}${chargeE > 0 ? '+' : ''}${chargeE}`,
      })),
    ),
    operationCount: 1,
    hasPolarAxis: false,
    parameters: {},
  };
}

/** Rock salt, a = 4.212 Å (periclase at room temperature); O at the origin. */
export const periclase = cellOf(
  [4.212, 0, 0, 0, 4.212, 0, 0, 0, 4.212],
  [
    {
      element: 'O',
      chargeE: -2,
      places: [
        [0, 0, 0],
        [0, 0.5, 0.5],
        [0.5, 0, 0.5],
        [0.5, 0.5, 0],
      ],
    },
    {
      element: 'Mg',
      chargeE: 2,
      places: [
        [0.5, 0, 0],
        [0.5, 0.5, 0.5],
        [0, 0, 0.5],
        [0, 0.5, 0],
      ],
    },
  ],
);

/** Ionic radii of six-fold coordination: Mg²⁺ 0.72 Å, O²⁻ 1.40 Å. */
export const periclaseRadiusA = (key: string): number => (key === 'Mg+2' ? 0.72 : 1.4);
