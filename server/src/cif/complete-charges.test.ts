import { describe, expect, it } from 'vitest';

import { CifService } from './cif.service.js';
import { completeCharges } from './complete-charges.js';
import { readStructure } from './read-structure.js';

const cif = (sites: string, types = '') => `data_x
_cell_length_a 5
_cell_length_b 5
_cell_length_c 5
_space_group_name_H-M_alt 'P 1'
loop_
_atom_site_label
_atom_site_type_symbol
_atom_site_fract_x
_atom_site_fract_y
_atom_site_fract_z
${sites}
${types}`;

const calciumFluoride = cif('Ca1 Ca 0 0 0\nF1 F .5 .5 0\nF2 F .5 0 .5');
const ironOxide = cif('Fe1 Fe 0 0 0\nFe2 Fe .5 .5 .5\nO1 O .5 0 0\nO2 O 0 .5 0\nO3 O 0 0 .5');

const chargesOf = (text: string, given: Record<string, number> = {}) => {
  const completed = completeCharges(readStructure(text), new Map(Object.entries(given)));
  return {
    charges: completed.cell.sites.map(({ charge }) => Number(charge)),
    codes: completed.warnings.map(({ code }) => code),
    missing: completed.missing,
    choices: completed.choices,
  };
};

describe('charges of a structure', () => {
  it('are those of the file where it has them', () => {
    const types = 'loop_\n_atom_type_symbol\n_atom_type_oxidation_number\nCa 2\nF -1';
    const read = chargesOf(cif('Ca1 Ca 0 0 0\nF1 F .5 .5 0\nF2 F .5 0 .5', types));
    expect(read).toEqual({ charges: [2, -1, -1], codes: [], missing: [], choices: [] });
  });

  it('are the only neutral choice of common ones, with a warning that says so', () => {
    expect(chargesOf(calciumFluoride)).toEqual({
      charges: [2, -1, -1],
      codes: ['cif.charges_suggested'],
      missing: [],
      choices: [],
    });
  });

  it('are those given from outside, a label before its element', () => {
    const { charges } = chargesOf(ironOxide, { Fe: 3, Fe2: 3.5, O: -2 });
    expect(charges).toEqual([3, 3.5, -2, -2, -2]);
  });

  it('complete what is given in part', () => {
    expect(chargesOf(ironOxide, { Fe1: 2, Fe2: 4 }).charges).toEqual([2, 4, -2, -2, -2]);
  });

  it('are asked for when several choices are neutral, naming them', () => {
    const ilmenite = cif('Fe1 Fe 0 0 0\nTi1 Ti .5 .5 .5\nO1 O .5 0 0\nO2 O 0 .5 0\nO3 O 0 0 .5');
    const { charges, missing, choices } = chargesOf(ilmenite);
    expect(charges).toEqual([0, 0, 0, 0, 0]);
    expect(missing).toEqual(['Fe', 'Ti', 'O']);
    expect(choices).toEqual(['Fe=3,Ti=3,O=-2', 'Fe=2,Ti=4,O=-2']);
  });

  it('are asked for when no choice is neutral', () => {
    expect(chargesOf(cif('Na1 Na 0 0 0\nMg1 Mg .5 .5 .5'))).toEqual({
      charges: [0, 0],
      codes: [],
      missing: ['Na', 'Mg'],
      choices: [],
    });
  });

  it('given for nothing in the file are warned about', () => {
    const { charges, codes } = chargesOf(calciumFluoride, { Ca: 2, F: -1, Cl: -1 });
    expect(charges).toEqual([2, -1, -1]);
    expect(codes).toEqual(['charges.unused']);
  });
});

describe('the CIF service', () => {
  it('leaves unknown charges at 0 and says so', () => {
    const read = new CifService().read(cif('Na1 Na 0 0 0\nMg1 Mg .5 .5 .5'));
    expect(read.cell.sites.map(({ charge }) => charge)).toEqual(['0', '0']);
    expect(read.warnings.map(({ code }) => code)).toContain('cif.charges_missing');
  });
});
