import type { ResolvedCell } from '#common/physics/resolved-cell';

import { placeAt, type Vector } from './vector.ts';

/** An ion of the drawn block: a site of the cell and the cell it stands in. */
export interface IonAddress {
  readonly siteIndex: number;
  /** Whole cells along a, b and c from the first one. */
  readonly cell: readonly [number, number, number];
}

const pattern = /^(\d+)\.(-?\d+)\.(-?\d+)\.(-?\d+)$/;

/** `${siteIndex}.${i}.${j}.${k}` */
export function formatIonId({ siteIndex, cell }: IonAddress): string {
  return `${siteIndex}.${cell[0]}.${cell[1]}.${cell[2]}`;
}

/** Reads an ion id; null where the text is none (ids also arrive from addresses). */
export function parseIonId(id: string): IonAddress | null {
  const match = pattern.exec(id);
  if (match === null) {
    return null;
  }
  const [siteIndex = 0, i = 0, j = 0, k = 0] = match.slice(1).map(Number);
  return { siteIndex, cell: [i, j, k] };
}

/** Cartesian place of an ion in Å; null where the cell has no such site. */
export function ionPosition(cell: ResolvedCell, id: string): Vector | null {
  const address = parseIonId(id);
  const site = address === null ? undefined : cell.sites[address.siteIndex];
  if (address === null || site === undefined) {
    return null;
  }
  const [x, y, z] = site.fractional;
  const [i, j, k] = address.cell;
  return placeAt(cell.vectorsA, x + i, y + j, z + k);
}
