import { Injectable } from '@nestjs/common';

import type { ReadCifResponse } from '#common/schemas/prototype';

import { completeCharges } from './complete-charges.js';
import { readStructure } from './read-structure.js';

/** Reads CIF files people drop in. */
@Injectable()
export class CifService {
  /**
   * A cell from the text of a CIF. Charges the file lacks and no single neutral choice supplies are
   * left at 0 with a warning, to be typed in the cell form.
   * @throws Problem with a `cif.…` code and the line
   */
  read(text: string): ReadCifResponse {
    const structure = readStructure(text);
    const { cell, warnings, missing } = completeCharges(structure, new Map());
    const unknown = missing.length === 0 ? [] : [chargesMissing(missing)];
    return {
      suggestedName: structure.suggestedName,
      cell,
      warnings: [...structure.warnings, ...warnings, ...unknown],
    };
  }
}

function chargesMissing(elements: readonly string[]) {
  return {
    code: 'cif.charges_missing',
    message: `The file gives no oxidation number for ${elements.join(', ')} and usual ones leave no single neutral choice: type the charges.`,
  };
}
