import { displayRadiusA } from '#common/chemistry/ionic-radii';
import { parseSpeciesKey } from '#client/components/chem/species-key.ts';

const known = new Map<string, number>();

/** Radius an ion kind is drawn with, Å; a mixed site takes the mean of its ions. */
export function speciesRadiusA(speciesKey: string): number {
  const cached = known.get(speciesKey);
  if (cached !== undefined) {
    return cached;
  }
  const parts = parseSpeciesKey(speciesKey);
  const weight = parts.reduce((sum, part) => sum + part.occupancy, 0) || 1;
  const radiusA = parts.reduce(
    (sum, { element, charge, occupancy }) =>
      sum + (occupancy / weight) * displayRadiusA(element, charge).radiusA,
    0,
  );
  known.set(speciesKey, radiusA);
  return radiusA;
}
