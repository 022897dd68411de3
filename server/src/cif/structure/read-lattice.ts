import { Problem } from '#common/errors/problem';
import type { LatticeParameterName, LatticeParameterTexts } from '#common/schemas/cell';
import type { Warning } from '#common/schemas/evaluation';

import { findValue, numberOf } from '../format/block-values.js';
import type { CifBlock } from '../format/cif-document.js';

/** Lattice parameters as written and as numbers (Å, degrees). */
export interface ReadLattice {
  readonly texts: LatticeParameterTexts;
  readonly values: Readonly<Record<LatticeParameterName, number>>;
}

const tags: readonly (readonly [LatticeParameterName, string])[] = [
  ['a', '_cell_length_a'],
  ['b', '_cell_length_b'],
  ['c', '_cell_length_c'],
  ['alpha', '_cell_angle_alpha'],
  ['beta', '_cell_angle_beta'],
  ['gamma', '_cell_angle_gamma'],
];

/**
 * Reads edges and angles. A missing angle is 90° by the core dictionary and is warned about.
 * @throws Problem `cif.missing_value` for an edge, `cif.bad_value` for what is no positive number
 */
export function readLattice(block: CifBlock, warnings: Warning[]): ReadLattice {
  const texts = { a: '', b: '', c: '', alpha: '', beta: '', gamma: '' };
  const values = { a: 0, b: 0, c: 0, alpha: 0, beta: 0, gamma: 0 };
  const assumed: string[] = [];
  for (const [name, tag] of tags) {
    const found = readOne(block, tag);
    if (found) {
      texts[name] = found.digits;
      values[name] = found.value;
    } else if (tag.startsWith('_cell_angle')) {
      texts[name] = '90';
      values[name] = 90;
      assumed.push(tag);
    } else {
      throw new Problem('cif.missing_value', `${tag} is missing: the cell has no edge ${name}.`, {
        line: block.line,
      });
    }
  }
  if (assumed.length > 0) {
    warnings.push({
      code: 'cif.angles_assumed',
      message: `${assumed.join(', ')} not given: 90° was taken, as the CIF core dictionary says.`,
    });
  }
  return { texts, values };
}

function readOne(block: CifBlock, tag: string): { digits: string; value: number } | null {
  const value = findValue(block, tag, tag.replace('_cell_', '_cell.'));
  if (!value) {
    return null;
  }
  const number = numberOf(value, tag);
  if (number.value <= 0) {
    throw new Problem('cif.bad_value', `Line ${value.line}: ${tag} must be above zero.`, {
      line: value.line,
    });
  }
  return number;
}
