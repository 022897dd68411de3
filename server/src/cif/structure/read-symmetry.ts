import { Problem } from '#common/errors/problem';
import { formatOperation } from '#common/physics/symmetry-operation';
import type { CellSymmetry } from '#common/schemas/cell';
import type { Warning } from '#common/schemas/evaluation';
import type { SpaceGroupSetting, SymmetryOperation } from '#common/schemas/symmetry';
import {
  findByHallSymbol,
  findBySymbol,
  matchOperations,
  settingsOfNumber,
} from '#server/symmetry/space-groups';

import { findValue, numberOf } from '../format/block-values.js';
import type { CifBlock, CifValue } from '../format/cif-document.js';
import { shortened } from '../format/shortened.js';
import { fitsSetting } from './fits-cell.js';
import type { ReadLattice } from './read-lattice.js';
import { readOperations } from './read-operations.js';

/** Symmetry of a block: settled, or settings that differ in their origin only. */
export type ReadSymmetry =
  | { readonly kind: 'settled'; readonly symmetry: CellSymmetry }
  | { readonly kind: 'origins'; readonly candidates: readonly SpaceGroupSetting[] };

const symbolTags = [
  '_space_group_name_h-m_alt',
  '_space_group.name_h-m_alt',
  '_symmetry_space_group_name_h-m',
  '_symmetry.space_group_name_h-m',
  '_space_group_name_h-m_ref',
  '_space_group_name_h-m_full',
  '_symmetry_space_group_name_h-m_full',
] as const;
const hallTags = [
  '_space_group_name_hall',
  '_space_group.name_hall',
  '_symmetry_space_group_name_hall',
] as const;
const numberTags = [
  '_space_group_it_number',
  '_space_group.it_number',
  '_symmetry_int_tables_number',
] as const;

const settled = (setting: SpaceGroupSetting): ReadSymmetry => ({
  kind: 'settled',
  symmetry: { kind: 'setting', hallNumber: setting.hallNumber },
});

/**
 * Makes out the symmetry in the order that serves real files best: listed operations, Hall symbol,
 * Hermann–Mauguin symbol together with the shape of the cell, number.
 * @throws Problem `cif.symmetry` when what the file says can't be made out
 */
export function readSymmetry(
  block: CifBlock,
  lattice: ReadLattice,
  warnings: Warning[],
): ReadSymmetry {
  const operations = readOperations(block);
  if (operations) {
    return fromOperations(operations, block, lattice, warnings);
  }
  return (
    fromHallSymbol(block, lattice, warnings) ??
    fromSymbol(block, lattice, warnings) ??
    fromNumber(block, lattice) ??
    withoutSymmetry(warnings)
  );
}

function fromOperations(
  operations: readonly SymmetryOperation[],
  block: CifBlock,
  lattice: ReadLattice,
  warnings: Warning[],
): ReadSymmetry {
  const setting = matchOperations(operations);
  warnOfConflict(setting, operations, block, warnings);
  if (setting && fitsSetting(lattice, setting)) {
    return settled(setting);
  }
  if (setting) {
    throw misfit(setting.symbol, block.line);
  }
  return {
    kind: 'settled',
    symmetry: { kind: 'operations', operations: operations.map((one) => formatOperation(one)) },
  };
}

function warnOfConflict(
  setting: SpaceGroupSetting | null,
  operations: readonly SymmetryOperation[],
  block: CifBlock,
  warnings: Warning[],
): void {
  const symbol = findValue(block, ...symbolTags);
  const numberValue = findValue(block, ...numberTags);
  const bySymbol = symbol ? findBySymbol(symbol.text) : [];
  const declared = bySymbol[0]?.number ?? (numberValue ? Number(numberValue.text) : null);
  if (declared !== null && setting && setting.number !== declared) {
    warnings.push({
      code: 'cif.symmetry_conflict',
      message:
        `The ${operations.length} listed operations are those of ${setting.symbol} (no. ${setting.number}), ` +
        `but the file names ${symbol ? shortened(symbol.text) : 'the group'} (no. ${declared}). The operations were taken.`,
    });
  }
}

function fromHallSymbol(
  block: CifBlock,
  lattice: ReadLattice,
  warnings: Warning[],
): ReadSymmetry | null {
  const value = findValue(block, ...hallTags);
  if (!value) {
    return null;
  }
  const setting = findByHallSymbol(value.text);
  if (setting && fitsSetting(lattice, setting)) {
    return settled(setting);
  }
  warnings.push({
    code: 'cif.hall_symbol_passed_over',
    message: setting
      ? `The Hall symbol “${shortened(value.text)}” does not fit the shape of the cell; the other names were used.`
      : `The Hall symbol “${shortened(value.text)}” is not a tabulated one; the other names were used.`,
  });
  return null;
}

function fromSymbol(
  block: CifBlock,
  lattice: ReadLattice,
  warnings: Warning[],
): ReadSymmetry | null {
  const value = findValue(block, ...symbolTags);
  if (!value) {
    return null;
  }
  const found = findBySymbol(value.text);
  if (found.length === 0) {
    warnings.push({
      code: 'cif.symbol_passed_over',
      message: `Line ${value.line}: there is no space group “${shortened(value.text)}”; the number was used.`,
    });
    if (!findValue(block, ...numberTags)) {
      throw new Problem(
        'cif.symmetry',
        `Line ${value.line}: there is no space group “${shortened(value.text)}”, and no operations are listed.`,
        { line: value.line },
      );
    }
    return null;
  }
  return narrowed(found, lattice, value, shortened(value.text));
}

function fromNumber(block: CifBlock, lattice: ReadLattice): ReadSymmetry | null {
  const value = findValue(block, ...numberTags);
  if (!value) {
    return null;
  }
  const number = numberOf(value, numberTags[0]).value;
  const found = settingsOfNumber(number);
  if (found.length === 0) {
    throw new Problem(
      'cif.symmetry',
      `Line ${value.line}: there is no space group ${shortened(value.text)}.`,
      {
        line: value.line,
      },
    );
  }
  // Other axes are never meant by a bare number; rhombohedral axes and either origin may be.
  const usual = found.filter(
    ({ isStandard, setting, crystalSystem }) =>
      isStandard || setting === '1' || setting === 'R' || crystalSystem === 'monoclinic',
  );
  return narrowed(usual, lattice, value, `number ${shortened(value.text)}`);
}

/** Leaves what fits the cell's shape; if only the origin is open then, the sites must tell. */
function narrowed(
  found: readonly SpaceGroupSetting[],
  lattice: ReadLattice,
  value: CifValue,
  name: string,
): ReadSymmetry {
  const fitting = found.filter((setting) => fitsSetting(lattice, setting));
  const first = fitting[0];
  if (!first) {
    throw misfit(name, value.line);
  }
  const origins = fitting.filter(({ setting }) => /^[12]/.test(setting));
  return origins.length > 1 && origins.length === fitting.length
    ? { kind: 'origins', candidates: origins }
    : settled(first);
}

function misfit(name: string, line: number): Problem {
  return new Problem(
    'cif.symmetry',
    `The edges and angles of the cell do not have the shape that ${name} asks for.`,
    { line },
  );
}

function withoutSymmetry(warnings: Warning[]): ReadSymmetry {
  warnings.push({
    code: 'cif.no_symmetry',
    message: 'The file names no symmetry: the sites were taken as the whole cell (P 1).',
  });
  return { kind: 'settled', symmetry: { kind: 'setting', hallNumber: 1 } };
}
