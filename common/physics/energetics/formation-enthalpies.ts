import type { Sourced } from '#common/chemistry/sourced';

const handbook =
  'handbook table of standard thermodynamic properties, 298.15 K; of the form that is stable there';
const memory = `${handbook} (from memory)`;

/**
 * Standard enthalpies of formation of solids at 298.15 K, kJ per mole of formula units.
 * The first list was read in one stored table, the second is from memory.
 */
const read =
  'LiF -616.0; LiCl -408.6; LiBr -351.2; LiI -270.4; NaF -576.6; NaCl -411.2; NaBr -361.1; ' +
  'NaI -287.8; KCl -436.5; KBr -393.8; AgCl -127.0; MgF2 -1124.2; CaF2 -1228.0; CdF2 -700.4; ' +
  'MgCl2 -641.3; CaCl2 -795.4; CdCl2 -391.5; CdI2 -203.3; AlF3 -1510.4; MgO -601.6; CaO -634.9; ' +
  'SrO -592.0; BaO -548.0; ZnO -350.5';
const remembered =
  'KF -567.3; KI -327.9; RbCl -435.4; CsCl -443.0; AgF -204.6; AgBr -100.4; AgI -61.8; ' +
  'SrF2 -1216.3; BaF2 -1207.1; SrCl2 -828.9; BaCl2 -855.0; Li2O -597.9; Na2O -414.2; ' +
  'Cu2O -168.6; Al2O3 -1675.7; TiO2 -944.0';

function readTable(text: string, source: string, status: Sourced['status']): [string, Sourced][] {
  return text.split('; ').map((entry) => {
    const [formula = '', value = ''] = entry.split(' ');
    return [formula, { value: Number(value), source, status }];
  });
}

const table = new Map([
  ...readTable(remembered, memory, 'from-memory'),
  ...readTable(read, handbook, 'single-source'),
]);

/**
 * Standard enthalpy of formation of a solid, kJ mol⁻¹ at 298.15 K, or null where the table has none.
 * The table knows formulas, not structures: of several forms it means the stable one.
 *
 * @param formula cations first, as {@link composition} writes it: `CaF2`
 */
export function formationEnthalpyKjPerMol(formula: string): Sourced | null {
  return table.get(formula) ?? null;
}
