/**
 * Oxidation states that are usual in ionic solids, most usual first.
 * Common practice, no source: chosen for this table so that well-known salts come out as chemists
 * would write them.
 */
const data =
  'H 1 -1; Li 1; Be 2; B 3; C 4 -4; N -3 5; O -2; F -1; Na 1; Mg 2; Al 3; Si 4; P 5 -3; S -2 6 4; ' +
  'Cl -1 7; K 1; Ca 2; Sc 3; Ti 4 3 2; V 5 4 3; Cr 3 6; Mn 2 3 4; Fe 3 2; Co 2 3; Ni 2; Cu 2 1; ' +
  'Zn 2; Ga 3; Ge 4; As -3 5 3; Se -2 6 4; Br -1; Rb 1; Sr 2; Y 3; Zr 4; Nb 5; Mo 6 4; Tc 7; ' +
  'Ru 4 3; Rh 3; Pd 2; Ag 1; Cd 2; In 3; Sn 4 2; Sb 3 5 -3; Te -2 6 4; I -1 5; Cs 1; Ba 2; La 3; ' +
  'Ce 4 3; Pr 3; Nd 3; Pm 3; Sm 3; Eu 3 2; Gd 3; Tb 3; Dy 3; Ho 3; Er 3; Tm 3; Yb 3; Lu 3; Hf 4; ' +
  'Ta 5; W 6; Re 6 7 4; Os 4; Ir 4; Pt 4 2; Au 1 3; Hg 2; Tl 1 3; Pb 2 4; Bi 3; Ra 2; Ac 3; Th 4; ' +
  'Pa 5; U 4 6; Np 4; Pu 4 3; Am 3; Cm 3; D 1 -1; T 1 -1';

const states = new Map(
  data.split('; ').map((entry) => {
    const [symbol, ...values] = entry.split(' ') as [string, ...string[]];
    return [symbol, values.map(Number)];
  }),
);

/** Usual oxidation states of an element in ionic solids, most usual first; empty if none is. */
export function commonOxidationStates(symbol: string): readonly number[] {
  return states.get(symbol) ?? [];
}
