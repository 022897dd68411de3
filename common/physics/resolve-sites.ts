import type { FieldProblem } from '#common/errors/problem';
import { fractionalToCartesian } from '#common/physics/cell-metric';
import type { ResolvedSite, SiteComponent } from '#common/physics/resolved-cell';
import { applyOperation } from '#common/physics/symmetry-operation';
import { cellLimits } from '#common/schemas/cell';
import type { SymmetryOperation } from '#common/schemas/symmetry';

/** Positions closer than this are one place: rounding of special positions, mixed rows. */
export const samePlaceA = 0.01;

/** A row of the site table in numbers. */
export interface SiteNumbers {
  readonly definitionIndex: number;
  readonly label: string;
  readonly component: SiteComponent;
  readonly fractional: readonly [number, number, number];
}

type Triple = [number, number, number];

/** A place that one or more rows fill. */
interface Orbit {
  readonly first: SiteNumbers;
  readonly components: SiteComponent[];
  readonly labels: string[];
  readonly places: readonly Triple[];
}

function wrap(value: number): number {
  // Rounding must not put 1/3 + 2/3 just below 1: that is the cell's own corner.
  const wrapped = value - Math.floor(value + 1e-12);
  return Math.abs(wrapped) < 1e-12 ? 0 : wrapped;
}

function nearestImage(from: readonly number[], to: readonly number[]): Triple {
  return [0, 1, 2].map((k) => {
    const difference = to[k]! - from[k]!;
    return difference - Math.round(difference);
  }) as Triple;
}

function distanceA(vectors: readonly number[], a: readonly number[], b: readonly number[]) {
  return Math.hypot(...fractionalToCartesian(vectors, nearestImage(a, b)));
}

/** The mean of copies that fell on one place, so that a rounded special position becomes exact. */
function centreOf(members: readonly Triple[]): Triple {
  const origin = members[0]!;
  const shift = members
    .map((member) => nearestImage(origin, member))
    .reduce((sum, d) => [sum[0] + d[0], sum[1] + d[1], sum[2] + d[2]] as Triple, [0, 0, 0]);
  const isExact = shift.every((component) => Math.abs(component) < 1e-9);
  return isExact
    ? origin
    : ([0, 1, 2].map((k) => wrap(origin[k]! + shift[k]! / members.length)) as Triple);
}

/** The symmetry copies of one position, copies on the same place merged. */
export function expandPosition(
  fractional: readonly number[],
  operations: readonly SymmetryOperation[],
  vectors: readonly number[],
): Triple[] {
  const clusters: Triple[][] = [[fractional.map(wrap) as Triple]];
  for (const operation of operations) {
    const copy = applyOperation(operation, fractional).map(wrap) as Triple;
    const home = clusters.find((members) => distanceA(vectors, members[0]!, copy) < samePlaceA);
    if (home === undefined) {
      clusters.push([copy]);
    } else {
      home.push(copy);
    }
  }
  return clusters.map(centreOf);
}

/** Looks up places by position, over the cell's faces. */
class PlaceIndex {
  private readonly orbits = new Map<string, { orbit: Orbit; place: Triple }[]>();

  private readonly bins: Triple;

  constructor(private readonly vectors: readonly number[]) {
    this.bins = [0, 1, 2].map((k) => {
      const edge = Math.hypot(vectors[3 * k]!, vectors[3 * k + 1]!, vectors[3 * k + 2]!);
      return Math.max(1, Math.min(64, Math.floor(edge / 0.5)));
    }) as Triple;
  }

  private key(x: number, y: number, z: number): string {
    const [nx, ny, nz] = this.bins;
    return `${(x + nx) % nx},${(y + ny) % ny},${(z + nz) % nz}`;
  }

  private binOf(place: Triple): Triple {
    return place.map((value, k) => Math.floor(value * this.bins[k]!)) as Triple;
  }

  add(orbit: Orbit): void {
    for (const place of orbit.places) {
      const [x, y, z] = this.binOf(place);
      const key = this.key(x, y, z);
      const entries = this.orbits.get(key);
      if (entries === undefined) {
        this.orbits.set(key, [{ orbit, place }]);
      } else {
        entries.push({ orbit, place });
      }
    }
  }

  /** The orbit that has a place within reach of this one. */
  find(place: Triple): { orbit: Orbit; distanceA: number } | null {
    const [x, y, z] = this.binOf(place);
    for (let dx = -1; dx <= 1; dx += 1) {
      for (let dy = -1; dy <= 1; dy += 1) {
        for (let dz = -1; dz <= 1; dz += 1) {
          for (const entry of this.orbits.get(this.key(x + dx, y + dy, z + dz)) ?? []) {
            const distance = distanceA(this.vectors, entry.place, place);
            if (distance < samePlaceA) {
              return { orbit: entry.orbit, distanceA: distance };
            }
          }
        }
      }
    }
    return null;
  }
}

/** A row that falls on a place already taken: shares it if both are partly filled, else a problem. */
function share(orbit: Orbit, row: SiteNumbers, distance: number, problems: FieldProblem[]): void {
  const isShared = row.component.occupancy < 1 && orbit.components[0]!.occupancy < 1;
  if (!isShared) {
    problems.push({
      code: 'cell.coincident_sites',
      field: `sites.${row.definitionIndex}.x`,
      message:
        `${row.label} lies on ${orbit.labels[0]} (${distance.toFixed(3)} Å apart): move it, ` +
        'remove it, or give both an occupancy below 1.',
    });
    return;
  }
  orbit.components.push(row.component);
  orbit.labels.push(row.label);
  const sum = orbit.components.reduce((total, { occupancy }) => total + occupancy, 0);
  if (sum > 1 + 1e-6) {
    problems.push({
      code: 'cell.occupancy',
      field: `sites.${row.definitionIndex}.occupancy`,
      message:
        `${orbit.labels.join(', ')} share one place and add up to ${Number(sum.toFixed(6))}: ` +
        'lower an occupancy so that the sum is at most 1.',
    });
  }
}

/** `Mg+2`, `O-2`, `Xe0`, `Ti+3.5`. */
function ionKey({ element, chargeE }: SiteComponent): string {
  const size = String(Math.abs(Number(chargeE.toFixed(6))));
  return chargeE === 0 ? `${element}0` : `${element}${chargeE > 0 ? '+' : '-'}${size}`;
}

/** Name of the ion kind on a place: one full ion, or its parts with their occupancies. */
export function speciesKeyOf(components: readonly SiteComponent[]): string {
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
 */
export function resolveSites(
  rows: readonly SiteNumbers[],
  operations: readonly SymmetryOperation[],
  vectors: readonly number[],
): { sites: ResolvedSite[]; problems: FieldProblem[] } {
  const problems: FieldProblem[] = [];
  const index = new PlaceIndex(vectors);
  const orbits: Orbit[] = [];
  let count = 0;
  for (const row of rows) {
    const places = expandPosition(row.fractional, operations, vectors);
    const taken = index.find(places[0]!);
    if (taken !== null) {
      share(taken.orbit, row, taken.distanceA, problems);
      continue;
    }
    const orbit = { first: row, components: [row.component], labels: [row.label], places };
    count += places.length;
    if (count > cellLimits.expandedSites) {
      problems.push({
        code: 'cell.too_many_sites',
        field: 'sites',
        message: `The cell has more than ${cellLimits.expandedSites} sites: use a smaller cell.`,
      });
      break;
    }
    orbits.push(orbit);
    index.add(orbit);
  }
  return { sites: orbits.flatMap(sitesOf), problems };
}
