import { Problem } from '#common/errors/problem';

import { isMissing, type CifBlock, type CifLoop, type CifValue } from './cif-document.js';
import { readCifNumber, type CifNumber } from './cif-number.js';
import { shortened } from './shortened.js';

/** The first of these data names that has a known value, single or in a loop of one row. */
export function findValue(block: CifBlock, ...tags: readonly string[]): CifValue | null {
  for (const tag of tags) {
    const value = block.items.get(tag) ?? valueOfOnlyRow(block, tag);
    if (value && !isMissing(value)) {
      return value;
    }
  }
  return null;
}

function valueOfOnlyRow(block: CifBlock, tag: string): CifValue | undefined {
  const loop = findLoop(block, tag);
  return loop?.rows.length === 1 ? loop.rows[0]![loop.tags.indexOf(tag)] : undefined;
}

/** The loop that carries the first of these data names that any loop carries. */
export function findLoop(block: CifBlock, ...tags: readonly string[]): CifLoop | null {
  for (const tag of tags) {
    const found = block.loops.find((loop) => loop.tags.includes(tag));
    if (found) {
      return found;
    }
  }
  return null;
}

/** Reads columns of a loop by data name. */
export function columnReader(
  loop: CifLoop,
): (row: readonly CifValue[], ...tags: readonly string[]) => CifValue | null {
  const positions = new Map(loop.tags.map((tag, index) => [tag, index]));
  return (row, ...tags) => {
    for (const tag of tags) {
      const position = positions.get(tag);
      const value = position === undefined ? undefined : row[position];
      if (value && !isMissing(value)) {
        return value;
      }
    }
    return null;
  };
}

/**
 * The number a value stands for.
 * @throws Problem `cif.bad_value` naming the data name and the line
 */
export function numberOf(value: CifValue, tag: string): CifNumber {
  const number = readCifNumber(value.text);
  if (!number) {
    throw new Problem(
      'cif.bad_value',
      `Line ${value.line}: ${tag} is “${shortened(value.text)}”, which is not a number.`,
      { line: value.line },
    );
  }
  return number;
}
