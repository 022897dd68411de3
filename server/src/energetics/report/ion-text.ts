import { formatCharge, superscript } from '#common/units/format';

const partPattern = /^([A-Za-z]+)([+-]\d*\.?\d*(?:e[+-]?\d+)?|0)?(?::([\d.e+-]+))?$/;

function partText(part: string): string {
  const match = partPattern.exec(part);
  if (match === null) {
    return part;
  }
  const [, element = '', charge = '0', share = '1'] = match;
  const occupancy = Number(share);
  const raised = superscript(formatCharge(Number(charge)));
  return `${element}${raised}${occupancy === 1 ? '' : ` ${Number(occupancy.toFixed(3))}`}`;
}

/** A species key as chemists write the ion: `Mg²⁺`; parts of a mixed site with their shares. */
export function ionText(speciesKey: string): string {
  return speciesKey.split('/').map(partText).join(', ');
}

/** A formula with its counts set low: `Al₂O₃`. */
export function formulaText(formula: string): string {
  return formula.replace(/(?<=[A-Za-z)\]])\d+(?:\.\d+)?/g, (count) =>
    [...count]
      .map((sign) => (sign === '.' ? '.' : String.fromCodePoint(0x2080 + Number(sign))))
      .join(''),
  );
}
