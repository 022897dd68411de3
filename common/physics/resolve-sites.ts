import type { FieldProblem } from '#common/errors/problem';
import { expandPosition } from '#common/physics/expand-position';
import { crowdedA, placeMetric, PlaceIndex, samePlaceA } from '#common/physics/place-index';
import type { ResolvedSite, SiteComponent } from '#common/physics/resolved-cell';
import { cellLimits } from '#common/schemas/cell';
import type { SymmetryOperation } from '#common/schemas/symmetry';

type Triple = readonly [number, number, number];

/** A row of the site table in numbers. */
export interface SiteNumbers {
  readonly definitionIndex: number;
  readonly label: string;
  readonly component: SiteComponent;
  readonly fractional: Triple;
}

/** The places that one or more rows fill. */
interface Orbit {
  readonly first: SiteNumbers;
  readonly components: SiteComponent[];
  readonly labels: string[];
  readonly places: readonly Triple[];
}

function coincidence(row: SiteNumbers, message: string): FieldProblem {
  return { code: 'cell.coincident_sites', field: `sites.${row.definitionIndex}.x`, message };
}

/** What forbids a row to share the places of rows before it, or null if it may. */
function sharingProblem(
  orbit: Orbit,
  row: SiteNumbers,
  copies: number,
  distanceA: number,
): FieldProblem | null {
  const isShared = row.component.occupancy < 1 && orbit.components[0]!.occupancy < 1;
  if (!isShared) {
    return coincidence(
      row,
      `${row.label} lies on ${orbit.labels[0]} (${distanceA.toFixed(3)} Å apart): move it, ` +
        'remove it, or give both an occupancy below 1.',
    );
  }
  if (copies !== orbit.places.length) {
    return coincidence(
      row,
      `${row.label} shares the place of ${orbit.labels[0]} but has ${copies} copies in the cell, ` +
        `not ${orbit.places.length}: give both the same coordinates.`,
    );
  }
  const occupied = [...orbit.components, row.component].map(({ occupancy }) => occupancy);
  const sum = occupied.reduce((total, occupancy) => total + occupancy, 0);
  if (sum > 1 + 1e-6) {
    return {
      code: 'cell.occupancy',
      field: `sites.${row.definitionIndex}.occupancy`,
      message:
        `${[...orbit.labels, row.label].join(', ')} share one place and add up to ` +
        `${Number(sum.toFixed(6))}: lower an occupancy so that the sum is at most 1.`,
    };
  }
  return null;
}

/** Whole ions that all but coincide, with another row or with their own copies. */
function crowdingProblem(
  row: SiteNumbers,
  other: { readonly what: Orbit; readonly distanceA: number } | null,
  crowdingA: number,
): FieldProblem | null {
  if (row.component.occupancy < 1) {
    return null;
  }
  if (other !== null && other.what.components[0]!.occupancy === 1) {
    return coincidence(
      row,
      `${row.label} lies ${other.distanceA.toFixed(3)} Å from ${other.what.labels[0]}, less than ` +
        `${crowdedA} Å: move it or remove one of the two.`,
    );
  }
  if (crowdingA < Infinity) {
    return coincidence(
      row,
      `${row.label} lies ${crowdingA.toFixed(3)} Å from its own symmetry copy: put it on the ` +
        'special position between them, or move it away.',
    );
  }
  return null;
}

/** `Mg+2`, `O-2`, `Xe0`, `Ti+3.5`. */
function ionKey({ element, chargeE }: SiteComponent): string {
  const size = String(Math.abs(Number(chargeE.toFixed(6))));
  return chargeE === 0 ? `${element}0` : `${element}${chargeE > 0 ? '+' : '-'}${size}`;
}

/** Name of the ion kind on a place: one full ion, or its parts with their occupancies. */
function speciesKeyOf(components: readonly SiteComponent[]): string {
  const [only] = components;
  if (components.length === 1 && only!.occupancy === 1) {
    return ionKey(only!);
  }
  return components
    .map((component) => `${ionKey(component)}:${Number(component.occupancy.toFixed(6))}`)
    .join('/');
}

function sitesOf(orbit: Orbit): ResolvedSite[] {
  const { first, components } = orbit;
  const main = components.reduce((best, next) => (next.occupancy > best.occupancy ? next : best));
  const shared = {
    definitionIndex: first.definitionIndex,
    label: first.label,
    chargeE: components.reduce((sum, { chargeE, occupancy }) => sum + chargeE * occupancy, 0),
    element: main.element,
    components,
    speciesKey: speciesKeyOf(components),
  };
  return orbit.places.map((fractional, copy) => ({ ...shared, copy, fractional }));
}

/**
 * Every place in the cell from the rows of the site table: symmetry applied, copies on the same
 * place merged, rows that share a place merged to one mean-field site.
 *
 * @param vectorsA rows a, b, c in Å
 */
export function resolveSites(
  rows: readonly SiteNumbers[],
  operations: readonly SymmetryOperation[],
  vectorsA: readonly number[],
): { sites: ResolvedSite[]; problems: FieldProblem[] } {
  const problems: FieldProblem[] = [];
  const metric = placeMetric(vectorsA);
  const index = new PlaceIndex<Orbit>(metric);
  const orbits: Orbit[] = [];
  let count = 0;
  for (const row of rows) {
    const { places, crowdingA } = expandPosition(row.fractional, operations, metric);
    const near = index.nearest(places[0]!);
    if (near !== null && near.distanceA < samePlaceA) {
      const orbit = near.what;
      const problem = sharingProblem(orbit, row, places.length, near.distanceA);
      if (problem === null) {
        orbit.components.push(row.component);
        orbit.labels.push(row.label);
      } else {
        problems.push(problem);
      }
      continue;
    }
    const problem = crowdingProblem(row, near, crowdingA);
    if (problem !== null) {
      problems.push(problem);
    }
    count += places.length;
    if (count > cellLimits.expandedSites) {
      const message = `The cell has more than ${cellLimits.expandedSites} sites: use a smaller cell.`;
      problems.push({ code: 'cell.too_many_sites', field: 'sites', message });
      break;
    }
    const orbit = { first: row, components: [row.component], labels: [row.label], places };
    orbits.push(orbit);
    places.forEach((place) => index.add(place, orbit));
  }
  return { sites: orbits.flatMap(sitesOf), problems };
}
