import { findValue } from '../format/block-values.js';
import type { CifBlock } from '../format/cif-document.js';

const longestName = 120;

/** A name for the structure: what the file calls it, else its formula, else its block. */
export function suggestName(block: CifBlock): string {
  const named = findValue(
    block,
    '_chemical_name_mineral',
    '_chemical_name_common',
    '_chemical_formula_structural',
    '_chemical_name_systematic',
    '_chemical_formula_sum',
  );
  const text = (named?.text ?? block.name).replace(/\s+/g, ' ').trim().slice(0, longestName);
  const isFormula = named !== null && /^([A-Z][a-z]?[\d.]* ?)+$/.test(text);
  const name = isFormula ? text.replace(/ /g, '') : text;
  return name === '' ? 'Structure' : name.charAt(0).toUpperCase() + name.slice(1);
}
