import { readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';

import { describe, expect, it } from 'vitest';

import { Problem } from '#common/errors/problem';
import { composition } from '#common/physics/composition';
import { resolveCell } from '#common/physics/resolve-cell';
import { symmetryOf } from '#server/symmetry/space-groups';

import { readStructure } from './read-structure.js';

// The files and what a reader must make of them: tests/fixtures/cif/SOURCE.md and expected.json.
const folder = path.resolve(import.meta.dirname, '../../../tests/fixtures/cif');
const fixture = (name: string) => readFileSync(path.join(folder, name), 'utf8');

function readAll(text: string) {
  const structure = readStructure(text);
  const symmetry = symmetryOf(structure.cell.symmetry);
  const { cell, problems } = resolveCell(structure.cell, symmetry);
  return { structure, symmetry, cell, problems };
}

function problemOf(read: () => unknown): { code: string; line: number | undefined } {
  try {
    read();
  } catch (error) {
    if (error instanceof Problem) {
      return { code: error.code, line: error.details?.line };
    }
    throw error;
  }
  throw new Error('read without complaint');
}

interface Expected {
  readonly group: number;
  readonly sites: number;
  readonly formula: string;
  /** Charges by site in the order of the file; null where the file does not say. */
  readonly charges: readonly (number | null)[];
  readonly warnings: readonly string[];
}

const given: Readonly<Record<string, Expected>> = {
  t01_hm_only: { group: 225, sites: 8, formula: 'NaCl', charges: [1, -1], warnings: [] },
  t02_hm_nospace: { group: 225, sites: 8, formula: 'NaCl', charges: [null, null], warnings: [] },
  t03_hm_old_m3m: { group: 225, sites: 8, formula: 'NaCl', charges: [null, null], warnings: [] },
  t04_it_only: { group: 136, sites: 6, formula: 'TiO2', charges: [null, null], warnings: [] },
  t05_fd3m_no_origin: {
    group: 227,
    sites: 56,
    formula: 'MgAl2O4',
    charges: [null, null, null],
    warnings: ['cif.origin_chosen'],
  },
  t06_r3m_hex_unmarked: {
    group: 166,
    sites: 9,
    formula: 'CdCl2',
    charges: [null, null],
    warnings: [],
  },
  t07_special_rounding: {
    group: 186,
    sites: 4,
    formula: 'ZnO',
    charges: [null, null],
    warnings: [],
  },
  t08_partial_mixed: {
    group: 225,
    sites: 8,
    formula: 'Mg0.75Fe0.25O',
    charges: [2, 2, -2],
    warnings: [],
  },
  t11_missing_angle: {
    group: 225,
    sites: 8,
    formula: 'NaCl',
    charges: [null, null],
    warnings: ['cif.angles_assumed'],
  },
  t12_crlf_tabs: { group: 225, sites: 8, formula: 'NaCl', charges: [1, -1], warnings: [] },
  t13_cr_only: { group: 225, sites: 8, formula: 'NaCl', charges: [1, -1], warnings: [] },
  t14_bom: {
    group: 225,
    sites: 8,
    formula: 'NaCl',
    charges: [null, null],
    warnings: ['cif.byte_order_mark'],
  },
  t15_quotes: { group: 225, sites: 8, formula: 'NaCl', charges: [null, null], warnings: [] },
  t18_symop_vs_hm_conflict: {
    group: 2,
    sites: 2,
    formula: 'NaCl',
    charges: [null, null],
    warnings: ['cif.symmetry_conflict'],
  },
  t19_two_blocks: { group: 221, sites: 2, formula: 'CsCl', charges: [null, null], warnings: [] },
  t20_charge_forms: { group: 221, sites: 5, formula: 'SrTiO3', charges: [2, 4, -2], warnings: [] },
  t21_deuterium: {
    group: 225,
    sites: 8,
    formula: 'LiH',
    charges: [null, null],
    warnings: ['cif.isotope'],
  },
  t22_symop_formats: { group: 136, sites: 6, formula: 'TiO2', charges: [null, null], warnings: [] },
  t23_cartn_only: {
    group: 1,
    sites: 2,
    formula: 'CsCl',
    charges: [null, null],
    warnings: ['cif.cartesian'],
  },
  t24_cif2: { group: 221, sites: 2, formula: 'CsCl', charges: [null, null], warnings: [] },
};

const refused: Readonly<Record<string, { code: string; line: number }>> = {
  t10_missing_coord: { code: 'cif.missing_value', line: 15 },
  t16_dup_tag: { code: 'cif.duplicate_tag', line: 8 },
  t17_loop_bad_count: { code: 'cif.loop_count', line: 16 },
};

describe('difficult files', () => {
  it.each(Object.entries(given))('%s', (name, expected) => {
    const { structure, symmetry, cell, problems } = readAll(fixture(`${name}.cif`));
    expect(problems).toEqual([]);
    expect(symmetry.setting?.number).toBe(expected.group);
    expect(cell!.sites).toHaveLength(expected.sites);
    expect(sortedFormula(composition(cell!).parts)).toBe(sortedFormula(partsOf(expected.formula)));
    expect(structure.warnings.map(({ code }) => code)).toEqual(expected.warnings);
    const charges = structure.cell.sites.map(({ charge }, index) =>
      structure.chargesGiven[index] ? Number(charge) : null,
    );
    expect(charges).toEqual(expected.charges);
  });

  it.each(Object.entries(refused))('%s is refused with its line', (name, expected) => {
    expect(problemOf(() => readStructure(fixture(`${name}.cif`)))).toEqual(expected);
  });

  it('t09: more than one ion on a place is a problem of the cell, naming the occupancy', () => {
    const { cell, problems } = readAll(fixture('t09_occ_over_one.cif'));
    expect(cell).toBeNull();
    expect(problems.map(({ code }) => code)).toContain('cell.occupancy');
  });

  it('all of them have their expectation here', () => {
    const files = readdirSync(folder).filter((name) => name.endsWith('.cif'));
    expect(files.map((name) => name.replace('.cif', '')).sort()).toEqual(
      [...Object.keys(given), ...Object.keys(refused), 't09_occ_over_one'].sort(),
    );
  });
});

/** Formula without a convention of order, for structures whose charges are not known yet. */
function sortedFormula(parts: readonly { element: string; count: number }[]): string {
  return parts
    .map(({ element, count }) => `${element}${Number(count.toFixed(4))}`)
    .sort()
    .join(' ');
}

function partsOf(formula: string): { element: string; count: number }[] {
  return [...formula.matchAll(/([A-Z][a-z]?)([\d.]*)/g)].map(([, element, count]) => ({
    element: element!,
    count: Number(count || 1),
  }));
}

const header = (a: string, group: string) => `data_x
_cell_length_a ${a}
_cell_length_b ${a}
_cell_length_c ${a}
_cell_angle_alpha 90
_cell_angle_beta 90
_cell_angle_gamma 90
${group}
loop_
_atom_site_label
_atom_site_fract_x
_atom_site_fract_y
_atom_site_fract_z
`;

describe('reading structures', () => {
  it('keeps digits as written and drops uncertainties', () => {
    const { cell } = readStructure(fixture('t01_hm_only.cif'));
    expect(cell.lattice).toMatchObject({ a: '5.640', b: '5.640', alpha: '90' });
  });

  it('writes rounded special positions as fractions, refined ones as they are', () => {
    const { cell } = readStructure(fixture('t07_special_rounding.cif'));
    expect(cell.sites[1]).toMatchObject({ x: '1/3', y: '2/3', z: '0.3819' });
  });

  it('keeps operations that are no tabulated setting', () => {
    const operations = "loop_\n_symmetry_equiv_pos_as_xyz\nx,y,z\n'x+1/2,y+1/2,z+1/2'\n";
    const { cell } = readStructure(`${header('4', operations)}Cs1 0 0 0\n`);
    expect(cell.symmetry).toEqual({
      kind: 'operations',
      operations: ['x,y,z', 'x+1/2,y+1/2,z+1/2'],
    });
  });

  it('recognises listed operations as the setting they are', () => {
    const { cell } = readStructure(fixture('t22_symop_formats.cif'));
    expect(cell.symmetry).toEqual({ kind: 'setting', hallNumber: 419 });
  });

  it('prefers the Hall symbol to the Hermann–Mauguin symbol', () => {
    const names = `_space_group_name_Hall 'F 4d 2 3 -1d'\n_space_group_name_H-M_alt 'F d -3 m'`;
    const { cell } = readStructure(`${header('8', names)}Mg1 0 0 0\n`);
    expect(cell.symmetry).toEqual({ kind: 'setting', hallNumber: 525 });
  });

  it('asks when the sites fit both origins', () => {
    const text = `${header('5.43', "_space_group_name_H-M_alt 'F d -3 m'")}Si1 0.11 0.23 0.37\n`;
    expect(problemOf(() => readStructure(text)).code).toBe('cif.ambiguous_origin');
  });

  it('tells the origin by special positions when charges can’t', () => {
    const text = `${header('5.43', "_space_group_name_H-M_alt 'F d -3 m'")}Si1 0.125 0.125 0.125\n`;
    const structure = readStructure(text);
    expect(structure.cell.symmetry).toEqual({ kind: 'setting', hallNumber: 526 });
    expect(structure.warnings[0]!.message).toContain('Origin choice 2 was taken');
  });

  it('tells the origin by the stated formula first', () => {
    // Spinel with the cations exchanged: Al in the eightfold place, Mg in the sixteenfold one.
    const group = `_space_group_name_H-M_alt 'F d -3 m'\n_chemical_formula_sum 'Al Mg2 O4'`;
    const sites = 'Mg1 0.125 0.125 0.125\nAl1 0.5 0.5 0.5\nO1 0.2624 0.2624 0.2624\n';
    const structure = readStructure(`${header('8.08', group)}${sites}`);
    expect(structure.cell.symmetry).toEqual({ kind: 'setting', hallNumber: 525 });
  });

  it('takes the whole list as the cell when no symmetry is named, and says so', () => {
    const structure = readStructure(`${header('4.1', '')}Cs1 0 0 0\nCl1 .5 .5 .5\n`);
    expect(structure.cell.symmetry).toEqual({ kind: 'setting', hallNumber: 1 });
    expect(structure.warnings.map(({ code }) => code)).toEqual(['cif.no_symmetry']);
  });

  it('gives repeated labels their own names', () => {
    const structure = readStructure(`${header('4.1', '')}O 0 0 0\nO .5 .5 .5\n`);
    expect(structure.cell.sites.map(({ label }) => label)).toEqual(['O', 'O_2']);
  });

  it.each([
    ['', 'cif.no_structure'],
    ['data_x\n_a 1\n', 'cif.no_structure'],
    [`${header('4', '')}`, 'cif.no_structure'],
    [`${header('?', '')}Cs1 0 0 0`, 'cif.missing_value'],
    [`${header('four', '')}Cs1 0 0 0`, 'cif.bad_value'],
    [`${header('-4', '')}Cs1 0 0 0`, 'cif.bad_value'],
    [`${header('4', '')}Cs1 0 0 here`, 'cif.bad_value'],
    [`${header('4', '')}Xx1 0 0 0`, 'cif.bad_value'],
    [`${header('4', "_space_group_name_H-M_alt 'Q 17'")}Cs1 0 0 0`, 'cif.symmetry'],
    [`${header('4', "_space_group_name_H-M_alt 'P 6/m m m'")}Cs1 0 0 0`, 'cif.symmetry'],
    [`${header('4', '_space_group_IT_number 231')}Cs1 0 0 0`, 'cif.symmetry'],
    [`${header('4', "_symmetry_equiv_pos_as_xyz 'x,y'")}Cs1 0 0 0`, 'cif.symmetry'],
    [
      `${header('4', "loop_\n_symmetry_equiv_pos_as_xyz\nx,y,z\n'-y,x,z'")}Cs1 0 0 0`,
      'cif.symmetry',
    ],
  ])('refuses %j', (text, code) => {
    expect(problemOf(() => readStructure(text)).code).toBe(code);
  });
});
