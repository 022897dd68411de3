import { Problem } from '#common/errors/problem';
import type { Warning } from '#common/schemas/evaluation';

import { readCifDocument, type CifBlock } from '../format/cif-document.js';
import { hasSites } from './read-sites.js';

/**
 * The first data block that holds a structure.
 * @throws Problem `cif.no_structure`, or what {@link readCifDocument} throws
 */
export function structureBlock(text: string, warnings: Warning[]): CifBlock {
  if (text.startsWith('\uFEFF')) {
    warnings.push({
      code: 'cif.byte_order_mark',
      message:
        'The file begins with a byte order mark, which CIF does not have; it was passed over.',
    });
  }
  const blocks = readCifDocument(text);
  if (blocks.length === 0) {
    throw new Problem(
      'cif.no_structure',
      'The file holds no data block: nothing begins with “data_”.',
    );
  }
  const [first, ...others] = blocks.filter(hasSites);
  if (!first) {
    throw new Problem(
      'cif.no_structure',
      'The CIF holds no structure: no block lists sites with coordinates (_atom_site_fract_x …).',
      { line: blocks[0]!.line },
    );
  }
  if (others.length > 0) {
    warnings.push({
      code: 'cif.several_structures',
      message: `The file holds ${others.length + 1} structures; “${first.name}” was read.`,
    });
  }
  return first;
}
