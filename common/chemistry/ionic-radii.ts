import { ionicRadiusData } from '#common/chemistry/ionic-radius-data';
import {
  ionKey,
  noOverrides,
  ownOr,
  type DataOverrides,
  type Sourced,
} from '#common/chemistry/sourced';

/** One entry of the table of effective ionic radii. */
export interface IonicRadiusRow {
  readonly element: string;
  readonly charge: number;
  /** Coordination number. */
  readonly coordination: number;
  /** Spin state or geometry where the table tells them apart, else empty. */
  readonly state: string;
  readonly radiusA: number;
}

/** A radius in Å (`value`, and under its own name `radiusA`) and where it comes from. */
export interface IonicRadius extends Sourced {
  readonly radiusA: number;
  /** Coordination number the radius was tabulated for. */
  readonly coordination: number;
}

const shannon = 'Shannon (1976) Acta Cryst. A32, 751';

/** Spin state of the d electrons. */
export type SpinState = 'high' | 'low';

/** A coordination as tabulated: `6`, `6.highspin`, `4.squareplanar`. */
function readEntry(element: string, charge: number, text: string): IonicRadiusRow {
  const [place, radius] = text.split('=') as [string, string];
  const [coordination, state = ''] = place.split('.') as [string, string?];
  return {
    element,
    charge,
    coordination: Number(coordination),
    state,
    radiusA: Number(radius),
  };
}

function readIon(text: string): IonicRadiusRow[] {
  const [ion, ...entries] = text.trim().split(/\s+/) as [string, ...string[]];
  const [, element, charge] = /^([A-Za-z]+)([+-]\d+)$/.exec(ion) as unknown as [
    string,
    string,
    string,
  ];
  return entries.map((entry) => readEntry(element, Number(charge), entry));
}

/** All 497 effective ionic radii. */
export const ionicRadii: readonly IonicRadiusRow[] = ionicRadiusData.split(';').flatMap(readIon);

const byIon = new Map<string, IonicRadiusRow[]>();
for (const row of ionicRadii) {
  const key = `${row.element}${row.charge}`;
  byIon.set(key, [...(byIon.get(key) ?? []), row]);
}

/**
 * How far a row is from what is wanted: first the spin state, where it is given and tabulated, then
 * plain entries, then high spin (the usual state in ionic solids), then low spin, then odd geometries.
 */
function stateRank(state: string, spin: SpinState | undefined): number {
  if (spin !== undefined && state === `${spin}spin`) {
    return -1;
  }
  const rank = ['', 'highspin', 'lowspin'].indexOf(state);
  return rank < 0 ? 3 : rank;
}

/** The key of a row: `radius:Na+1:6`, `radius:Fe+2:6:lowspin`. */
export function radiusKey({
  element,
  charge,
  coordination,
  state,
}: Omit<IonicRadiusRow, 'radiusA'>): string {
  const place = `radius:${ionKey(element, charge)}:${coordination}`;
  return state === '' ? place : `${place}:${state}`;
}

const byKey = new Map(ionicRadii.map((row) => [radiusKey(row), row]));

/** The tabulated radius of exactly this key, Å; the table's own row and no other. */
export function shippedRadius(key: string): Sourced | null {
  const row = byKey.get(key);
  return row === undefined
    ? null
    : { value: row.radiusA, source: shannon, status: 'single-source' };
}

/** The rows of an ion, those that a workspace adds to the table's among them. */
function rowsOf(element: string, charge: number, overrides: DataOverrides): IonicRadiusRow[] {
  const rows = byIon.get(`${element}${charge}`) ?? [];
  const known = new Set(rows.map(radiusKey));
  const ion = `radius:${ionKey(element, charge)}:`;
  const own = [...overrides].flatMap(([key, { value }]): IonicRadiusRow[] => {
    if (!key.startsWith(ion) || known.has(key)) {
      return [];
    }
    const [coordination = '', state = ''] = key.slice(ion.length).split(':');
    return [{ element, charge, coordination: Number(coordination), state, radiusA: value }];
  });
  return [...rows, ...own];
}

/**
 * Effective ionic radius of an ion in Å.
 *
 * @param coordination wanted coordination number (6 when left out); where the table has none for it,
 *   the nearest tabulated one is taken (the lower of two equally near), and the answer says which
 * @param spin wanted spin state; high where the table tells them apart and none is given
 * @param overrides the workspace's own radii, which count as rows of the table
 * @returns null for an ion the table doesn't have
 */
export function ionicRadiusA(
  element: string,
  charge: number,
  coordination = 6,
  spin?: SpinState,
  overrides: DataOverrides = noOverrides,
): IonicRadius | null {
  const [best] = rowsOf(element, charge, overrides).sort(
    (a, b) =>
      Math.abs(a.coordination - coordination) - Math.abs(b.coordination - coordination) ||
      a.coordination - b.coordination ||
      stateRank(a.state, spin) - stateRank(b.state, spin),
  );
  if (best === undefined) {
    return null;
  }
  const shipped: Sourced = { value: best.radiusA, source: shannon, status: 'single-source' };
  const found = ownOr(overrides, radiusKey(best), shipped) ?? shipped;
  return { ...found, radiusA: found.value, coordination: best.coordination };
}

/** Radius drawn for an ion the table doesn't have; a drawing aid, no physical claim. */
const untabulatedRadiusA = 1.0;

/** Least radius drawn: bare protons and the like are tabulated with about zero or less. */
const leastDrawnA = 0.2;

/** The tabulated row for the nearest charge of the same sign, in a coordination near 6. */
function nearestCharge(element: string, charge: number): IonicRadiusRow | undefined {
  const [nearest] = ionicRadii
    .filter((row) => row.element === element && Math.sign(row.charge) === Math.sign(charge))
    .sort(
      (a, b) =>
        Math.abs(a.charge - charge) - Math.abs(b.charge - charge) ||
        Math.abs(a.coordination - 6) - Math.abs(b.coordination - 6),
    );
  return nearest;
}

/**
 * Radius to draw an ion with: tabulated for this charge, else for the nearest tabulated charge of
 * the element with the same sign, else 1.0 Å; at least 0.2 Å. `source` says which.
 */
export function displayRadiusA(
  element: string,
  charge: number,
): { radiusA: number; source: string } {
  const exact = ionicRadiusA(element, charge);
  const near = exact === null ? nearestCharge(element, charge) : undefined;
  const found = exact ?? near;
  if (found === undefined) {
    return { radiusA: untabulatedRadiusA, source: 'no tabulated radius: 1.0 Å drawn' };
  }
  const source = near === undefined ? shannon : `${shannon}, for charge ${near.charge}`;
  return found.radiusA < leastDrawnA
    ? { radiusA: leastDrawnA, source: `${source}: ${found.radiusA} Å, drawn as 0.2 Å` }
    : { radiusA: found.radiusA, source };
}
