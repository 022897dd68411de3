import { ionicRadiusData } from '#common/chemistry/ionic-radius-data';

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

/** A radius and where it comes from. */
export interface IonicRadius {
  readonly radiusA: number;
  /** Coordination number the radius was tabulated for. */
  readonly coordination: number;
  readonly source: string;
}

const shannon = 'Shannon (1976) Acta Cryst. A32, 751';

/** A coordination as tabulated: `6`, `6.highspin`, `4.squareplanar`; `4SQ`-like suffixes don't occur. */
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

/** High spin is the usual state in ionic solids; a plain entry comes before a special geometry. */
const stateRank = (state: string) => ['', 'highspin', 'lowspin'].indexOf(state) >>> 0;

/**
 * Effective ionic radius of an ion in Å.
 *
 * @param coordination wanted coordination number (6 when left out); where the table has none for it,
 *   the nearest tabulated one is taken, and the answer says which
 * @returns null for an ion the table doesn't have
 */
export function ionicRadiusA(
  element: string,
  charge: number,
  coordination = 6,
): IonicRadius | null {
  const rows = byIon.get(`${element}${charge}`);
  if (rows === undefined) {
    return null;
  }
  const [best] = [...rows].sort(
    (a, b) =>
      Math.abs(a.coordination - coordination) - Math.abs(b.coordination - coordination) ||
      stateRank(a.state) - stateRank(b.state),
  );
  return { radiusA: best!.radiusA, coordination: best!.coordination, source: shannon };
}

/** Radius drawn for an ion the table doesn't have; a drawing aid, no physical claim. */
const untabulatedRadiusA = 1.0;

/**
 * Radius to draw an ion with: tabulated for this charge, else for the nearest tabulated charge of
 * the element with the same sign, else 1.0 Å; `source` says which.
 */
export function displayRadiusA(
  element: string,
  charge: number,
): { radiusA: number; source: string } {
  const exact = ionicRadiusA(element, charge);
  if (exact !== null) {
    return exact;
  }
  const [near] = ionicRadii
    .filter((row) => row.element === element && Math.sign(row.charge) === Math.sign(charge))
    .sort(
      (a, b) =>
        Math.abs(a.charge - charge) - Math.abs(b.charge - charge) ||
        Math.abs(a.coordination - 6) - Math.abs(b.coordination - 6),
    );
  return near === undefined
    ? { radiusA: untabulatedRadiusA, source: 'no tabulated radius: drawn as 1.0 Å' }
    : { radiusA: near.radiusA, source: `${shannon}, for charge ${near.charge}` };
}
