/**
 * Oxidation states in ionic solids, most usual first. After the first bar stand those seen less
 * often, after the second the rare ones, looked at only where nothing else gives a neutral compound.
 * Common practice, no source: chosen so that well-known salts come out as chemists would write them.
 */
const data =
  'H 1|-1; Li 1; Be 2; B 3; C 4 -4; N -3 5||3; O -2; F -1; Na 1; Mg 2; Al 3; Si 4||-4; ' +
  'P 5 -3||3; S -2 6 4; Cl -1 7||5; K 1; Ca 2; Sc 3; Ti 4 3|2; V 5 4 3||2; Cr 3 6||2 4; ' +
  'Mn 2|3 4|6 7; Fe 3 2; Co 2 3; Ni 2||3 4; Cu 2 1; Zn 2; Ga 3||1; Ge 4||2 -4; As -3 5 3; ' +
  'Se -2 6 4; Br -1||5; Rb 1; Sr 2; Y 3; Zr 4; Nb 5||4 3 2; Mo 6 4||5 3; Tc 7||4; Ru 4 3; ' +
  'Rh 3||4; Pd 2||4; Ag 1||2; Cd 2; In 3||1; Sn 4 2||-4; Sb 3 5 -3; Te -2 6 4; I -1 5||7; Cs 1; ' +
  'Ba 2; La 3; Ce 4 3; Pr 3||4; Nd 3; Pm 3; Sm 3||2; Eu 3 2; Gd 3; Tb 3||4; Dy 3; Ho 3; Er 3; ' +
  'Tm 3; Yb 3||2; Lu 3; Hf 4; Ta 5||4; W 6||4 5; Re 6 7 4; Os 4||8; Ir 4||3; Pt 4 2; Au 1 3; ' +
  'Hg 2||1; Tl 1 3; Pb 2|4; Bi 3||5; Ra 2; Ac 3; Th 4; Pa 5; U 4 6||5 3; Np 4; Pu 4 3; Am 3; ' +
  'Cm 3; D 1|-1; T 1|-1';

/** States of one element by how often they are met. */
export interface OxidationStates {
  readonly usual: readonly number[];
  readonly occasional: readonly number[];
  readonly rare: readonly number[];
}

const readStates = (text = '') => text.split(' ').filter(Boolean).map(Number);

const states = new Map(
  data.split('; ').map((entry): [string, OxidationStates] => {
    const [symbol, lists] = [entry.split(' ')[0]!, entry.slice(entry.indexOf(' ') + 1)];
    const [usual, occasional, rare] = lists.split('|').map(readStates);
    return [symbol, { usual: usual!, occasional: occasional ?? [], rare: rare ?? [] }];
  }),
);

const unknown: OxidationStates = { usual: [], occasional: [], rare: [] };

/** Oxidation states of an element in ionic solids; all lists empty if there are none. */
export function oxidationStates(symbol: string): OxidationStates {
  return states.get(symbol) ?? unknown;
}

/** Common oxidation states of an element in ionic solids, most usual first; empty if none is. */
export function commonOxidationStates(symbol: string): readonly number[] {
  const { usual, occasional } = oxidationStates(symbol);
  return [...usual, ...occasional];
}
