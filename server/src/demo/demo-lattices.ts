import type { CellDefinition } from '#common/schemas/cell';
import { applyPrototype } from '#server/prototypes/apply-prototype';
import type { Prototype } from '#server/prototypes/prototypes';

import type { DemoPersonKey } from './demo-people.js';

/** How far a lattice of the demo has come. */
type DemoProgress = 'draft' | 'saved' | 'in_review' | 'returned' | 'accepted';

export interface DemoLattice {
  readonly name: string;
  readonly tags: readonly string[];
  readonly author: DemoPersonKey;
  readonly prototype: string;
  /** Element and charge for each role of the structure type; its own ions when left out. */
  readonly ions?: readonly (readonly [string, number])[];
  /** Edge of a cubic cell in Å, where it isn't that of the structure type's own example. */
  readonly edgeA?: string;
  readonly note: string;
  readonly progress: DemoProgress;
}

/** What a small group that screens separator ceramics for a thermal battery has on its shelf. */
export const demoLattices: readonly DemoLattice[] = [
  {
    name: 'Caesium chloride, for comparison',
    tags: ['halide'],
    author: 'imke',
    prototype: 'caesium-chloride',
    note: 'Measured edge, 4.123 Å (COD 9008789).',
    progress: 'saved',
  },
  {
    name: 'Sphalerite',
    tags: ['sulfide', 'rivals'],
    author: 'teodor',
    prototype: 'zinc-blende',
    note: 'Measured edge, 5.4093 Å (COD 9000107).',
    progress: 'accepted',
  },
  {
    name: 'Wurtzite',
    tags: ['sulfide', 'rivals'],
    author: 'teodor',
    prototype: 'wurtzite',
    note: 'Measured edges (COD 9008878), u at its ideal 3/8.',
    progress: 'saved',
  },
  {
    name: 'Corundum',
    tags: ['oxide', 'separator'],
    author: 'imke',
    prototype: 'corundum',
    note: 'Edges and coordinates rounded.',
    progress: 'saved',
  },
  {
    name: 'Spinel',
    tags: ['oxide', 'separator'],
    author: 'imke',
    prototype: 'spinel',
    note: 'Normal spinel, u for origin choice 2.',
    progress: 'accepted',
  },
  {
    name: 'Strontium titanate',
    tags: ['oxide', 'perovskite'],
    author: 'teodor',
    prototype: 'perovskite',
    note: 'Cubic, 3.905 Å.',
    progress: 'saved',
  },
  {
    name: 'Rutile, first refinement',
    tags: ['oxide', 'pigment'],
    author: 'teodor',
    prototype: 'rutile',
    note: 'Edges of COD 9009083, u = 0.3053.',
    progress: 'returned',
  },
  {
    name: 'Fluorite',
    tags: ['halide', 'separator'],
    author: 'imke',
    prototype: 'fluorite',
    edgeA: '5.463',
    note: 'Edge 5.463 Å.',
    progress: 'saved',
  },
  {
    name: 'Fluorite, charges to mend',
    tags: ['halide'],
    author: 'imke',
    prototype: 'fluorite',
    ions: [
      ['Ca', 1],
      ['F', -1],
    ],
    edgeA: '5.463',
    note: '',
    progress: 'draft',
  },
  {
    name: 'Lithium fluoride',
    tags: ['halide', 'separator'],
    author: 'teodor',
    prototype: 'rock-salt',
    ions: [
      ['Li', 1],
      ['F', -1],
    ],
    edgeA: '4.0279',
    note: 'Edge 4.0279 Å, powder data.',
    progress: 'accepted',
  },
  {
    name: 'Periclase, trial 3',
    tags: ['oxide', 'separator'],
    author: 'teodor',
    prototype: 'rock-salt',
    ions: [
      ['Mg', 2],
      ['O', -2],
    ],
    edgeA: '4.212',
    note: 'Edge 4.212 Å; trials 1 and 2 had it from radii.',
    progress: 'in_review',
  },
];

/** The cell of a lattice of the demo. */
export function demoCell(lattice: DemoLattice, prototypes: readonly Prototype[]): CellDefinition {
  const prototype = prototypes.find(({ facts }) => facts.id === lattice.prototype);
  if (prototype === undefined) {
    throw new Error(`The demo needs the structure type ${lattice.prototype}.`);
  }
  const ions = prototype.summary.roles.map(({ element, charge }, index) => {
    const [given, chargeE] = lattice.ions?.[index] ?? [element, charge];
    return { element: given, chargeE };
  });
  const { cell } = applyPrototype(prototype, ions);
  const { edgeA } = lattice;
  return edgeA === undefined
    ? cell
    : { ...cell, lattice: { ...cell.lattice, a: edgeA, b: edgeA, c: edgeA } };
}
