import type { ResolvedCell } from '#common/physics/resolved-cell';

/**
 * Short cautions by element. General knowledge, no source: they point to the safety data sheet and
 * never stand in for it.
 */
const byElement: Readonly<Record<string, string>> = {
  Be: 'Beryllium compounds are carcinogenic as dust, and sensitise the lungs.',
  As: 'Arsenic compounds are toxic and carcinogenic.',
  Cd: 'Cadmium compounds are toxic and carcinogenic.',
  Hg: 'Mercury compounds are toxic, many through the skin.',
  Tl: 'Thallium compounds are highly toxic, also through the skin.',
  Pb: 'Lead compounds are toxic, and harm unborn children.',
  Sb: 'Antimony compounds are harmful; some are toxic.',
  Se: 'Selenium compounds are toxic; with acids they may give off hydrogen selenide.',
  Te: 'Tellurium compounds are toxic; with acids they may give off hydrogen telluride.',
  Ba: 'Soluble barium compounds are toxic.',
  Ni: 'Nickel compounds are carcinogenic as dust, and sensitise the skin.',
  Co: 'Cobalt compounds are suspected carcinogens as dust, and sensitise.',
  Os: 'Osmium compounds may form the volatile, highly toxic tetroxide.',
  V: 'Vanadium oxides irritate the lungs and are toxic.',
};

/** Elements without a stable isotope: Tc, Pm and everything from polonium on (general knowledge). */
const radioactive = new Set(
  'Tc Pm Po At Rn Fr Ra Ac Th Pa U Np Pu Am Cm Bk Cf Es Fm Md No Lr'.split(' '),
);

interface Ions {
  readonly has: (element: string, chargeE?: number) => boolean;
  readonly elements: ReadonlySet<string>;
}

const alkali = ['Li', 'Na', 'K', 'Rb', 'Cs'];
const reactive = [...alkali, 'Mg', 'Ca', 'Sr', 'Ba', 'Al'];

/** Cautions that need a combination of ions. */
const byClass: readonly { applies: (ions: Ions) => boolean; note: string }[] = [
  {
    applies: ({ has }) => has('H', -1),
    note: 'Ionic hydrides react with water and moist air and give off hydrogen, which may ignite.',
  },
  {
    applies: ({ has, elements }) =>
      has('F', -1) && [...alkali, 'Ag'].some((one) => elements.has(one)),
    note: 'Soluble fluorides are toxic, and give off hydrogen fluoride with acids.',
  },
  {
    applies: ({ has }) => has('Cr', 6),
    note: 'Chromium(VI) compounds are carcinogenic and oxidising.',
  },
  {
    applies: ({ has }) => has('S', -2),
    note: 'Many sulfides give off hydrogen sulfide, which is toxic, with acids or moisture.',
  },
  {
    applies: ({ has, elements }) =>
      (has('N', -3) || has('P', -3) || has('C', -4)) && reactive.some((one) => elements.has(one)),
    note: 'Nitrides, phosphides and carbides of reactive metals react with water; phosphides give off toxic phosphine.',
  },
  {
    applies: ({ has, elements }) =>
      has('O', -2) &&
      elements.size === 2 &&
      [...alkali, 'Ca', 'Sr', 'Ba'].some((one) => elements.has(one)),
    note: 'Oxides of alkali and alkaline-earth metals react with water, give off heat and form caustic solutions.',
  },
  {
    applies: ({ has }) => has('O', -1),
    note: 'Peroxides are strong oxidisers and may burn or explode with organic matter.',
  },
];

/** Cautions that the ions of a cell call for; empty for those without well-known hazards. */
export function hazardsOf(cell: Pick<ResolvedCell, 'sites'>): string[] {
  const ions = cell.sites.flatMap(({ components }) => components);
  const elements = new Set(ions.map(({ element }) => element));
  const has = (element: string, chargeE?: number): boolean =>
    ions.some(
      (ion) => ion.element === element && (chargeE === undefined || ion.chargeE === chargeE),
    );
  const active = [...elements].filter((element) => radioactive.has(element));
  return [
    ...[...elements].flatMap((element) => byElement[element] ?? []),
    ...(active.length === 0
      ? []
      : [
          `${active.join(', ')} ${active.length === 1 ? 'is' : 'are'} radioactive: work with it is licensed.`,
        ]),
    ...byClass.filter(({ applies }) => applies({ has, elements })).map(({ note }) => note),
  ];
}
