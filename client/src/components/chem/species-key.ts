import { formatCharge, superscript } from '#common/units/format';

/** One ion of a species key and the fraction of places it holds. */
export interface SpeciesPart {
  readonly element: string;
  readonly charge: number;
  readonly occupancy: number;
}

const partPattern = /^([A-Za-z]+)([+-]\d*\.?\d*(?:e[+-]?\d+)?|0)?(?::([\d.e+-]+))?$/;

function parsePart(text: string): SpeciesPart {
  const match = partPattern.exec(text);
  if (match === null) {
    return { element: text, charge: 0, occupancy: 1 };
  }
  const [, element = '', charge = '0', occupancy = '1'] = match;
  const size = charge === '+' || charge === '-' ? `${charge}1` : charge;
  return { element, charge: Number(size), occupancy: Number(occupancy) };
}

/** The ions a species key stands for: `Mg+2`, `Mg+2:0.75/Fe+2:0.25`. */
export function parseSpeciesKey(key: string): readonly SpeciesPart[] {
  return key.split('/').map(parsePart);
}

/** A species as plain text, for names read aloud and tags in the stage: `Mg²⁺`. */
export function speciesText(key: string): string {
  return parseSpeciesKey(key)
    .map(({ element, charge, occupancy }) => {
      const share = occupancy === 1 ? '' : ` ${Number(occupancy.toFixed(3))}`;
      return `${element}${superscript(formatCharge(charge))}${share}`;
    })
    .join(', ');
}
