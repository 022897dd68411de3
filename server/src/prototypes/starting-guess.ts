import { superscript } from '#common/units/format';

/** An ion to put in a role. */
export interface PrototypeIon {
  readonly element: string;
  readonly chargeE: number;
}

/** A cation–anion contact of the structure type, with the ions that meet in it. */
export interface GuessContact {
  readonly cation: PrototypeIon;
  readonly cationCoordination: number;
  readonly anion: PrototypeIon;
  readonly anionCoordination: number;
  /** Edge a over this distance in the file: dimensionless, fixed by the type's shape. */
  readonly edgeOverDistance: number;
  /** The same where it follows exactly: `4/√3`. */
  readonly exactFactor: string | null;
  readonly bonds: number;
}

/** An ionic radius for a coordination; the shape of the table's look-up. */
export type FindRadius = (
  element: string,
  charge: number,
  coordination?: number,
) => { readonly radiusA: number; readonly coordination: number } | null;

/** Edge a and how it was come by; or which radius is missing. */
export type StartingGuess =
  | { readonly kind: 'guess'; readonly aA: number; readonly sentence: string }
  | { readonly kind: 'no-radius'; readonly ions: readonly string[] };

/** An ion as chemists write it: `Mg²⁺`, `O²⁻`, `Na⁺`. */
export function ionText({ element, chargeE }: PrototypeIon): string {
  if (chargeE === 0) {
    return element;
  }
  const size = Math.abs(chargeE) === 1 ? '' : String(Math.abs(chargeE));
  return element + superscript(size + (chargeE < 0 ? '-' : '+'));
}

/**
 * Guesses the edge a from ionic radii: in each contact cation and anion touch, a = k (r₊ + r₋) with
 * k = a/d of the structure type; several contacts take the mean, weighted by their bonds.
 * Radii: Shannon, Acta Cryst. A32 (1976) 751, at the coordination of each role.
 * @param contacts at least one
 */
export function guessEdge(
  contacts: readonly GuessContact[],
  findRadius: FindRadius,
): StartingGuess {
  const missing = new Set<string>();
  const parts = contacts.map((contact) => {
    const cation = radiusOf(contact.cation, contact.cationCoordination, findRadius, missing);
    const anion = radiusOf(contact.anion, contact.anionCoordination, findRadius, missing);
    const factor = contact.exactFactor ?? contact.edgeOverDistance.toFixed(4);
    return {
      bonds: contact.bonds,
      aA: contact.edgeOverDistance * (cation.radiusA + anion.radiusA),
      names: `${factor} (${cation.name} + ${anion.name})`,
      numbers: `${factor} (${short(cation.radiusA)} + ${short(anion.radiusA)})`,
    };
  });
  if (missing.size > 0) {
    return { kind: 'no-radius', ions: [...missing] };
  }
  const bonds = parts.reduce((sum, part) => sum + part.bonds, 0);
  const aA = parts.reduce((sum, part) => sum + part.bonds * part.aA, 0) / bonds;
  const join = (texts: readonly string[]) =>
    texts.length === 1
      ? texts[0]!
      : `[${texts.map((text, index) => `${parts[index]!.bonds} · ${text}`).join(' + ')}] / ${bonds}`;
  const names = join(parts.map((part) => part.names));
  const numbers = join(parts.map((part) => part.numbers));
  return { kind: 'guess', aA, sentence: `a = ${names} = ${numbers} = ${aA.toFixed(2)} Å` };
}

function radiusOf(
  ion: PrototypeIon,
  coordination: number,
  findRadius: FindRadius,
  missing: Set<string>,
): { radiusA: number; name: string } {
  const found = findRadius(ion.element, ion.chargeE, coordination);
  if (!found) {
    missing.add(ionText(ion));
    return { radiusA: 0, name: '' };
  }
  // The coordination the radius was measured at, which may be the nearest one in the table.
  return { radiusA: found.radiusA, name: `r(${ionText(ion)}, ${found.coordination})` };
}

/** Radii are tabulated to 0.01 or 0.005 Å. */
function short(radiusA: number): string {
  return radiusA.toFixed(3).replace(/0$/, '');
}
