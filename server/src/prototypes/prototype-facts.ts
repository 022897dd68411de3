/** A place of a structure type that takes an ion; named by its label in the file. */
interface RoleFacts {
  readonly label: string;
  readonly coordination: number;
}

/** A coordinate the space group leaves free. */
interface FreeCoordinateFacts {
  /** The name it goes by in the literature: `u`, `x`, `z`. */
  readonly name: string;
  /** Site and axis whose value in the file it takes. */
  readonly label: string;
  readonly axis: 'x' | 'y' | 'z';
  /** Expressions over the name for that site; an axis left out keeps its number. */
  readonly expressions: { readonly x?: string; readonly y?: string; readonly z?: string };
}

/** A contact from which the cell's size is guessed. */
interface ContactFacts {
  readonly cation: string;
  readonly anion: string;
  /** Edge a in units of this contact where it follows from the type alone: `2`, `4/√3`. */
  readonly exactFactor: string | null;
  /** Share in the mean over contacts: the number of such bonds per formula unit. */
  readonly bonds: number;
}

/** What is known of a structure type beyond its CIF file. */
export interface PrototypeFacts {
  /** Name of the file in structures/ without its ending. */
  readonly id: string;
  readonly name: string;
  readonly description: string;
  readonly roles: readonly RoleFacts[];
  readonly freeCoordinates: readonly FreeCoordinateFacts[];
  readonly contacts: readonly ContactFacts[];
}

const contact = (
  cation: string,
  anion: string,
  exactFactor: string | null,
  bonds = 1,
): ContactFacts => ({ cation, anion, exactFactor, bonds });

const role = (label: string, coordination: number): RoleFacts => ({ label, coordination });

/** The structure types in the order they are offered: by formula, simplest first. */
export const prototypeFacts: readonly PrototypeFacts[] = [
  {
    id: 'rock-salt',
    name: 'Rock salt',
    description: 'Cations and anions alternate along all three edges; each has six neighbours.',
    roles: [role('Na1', 6), role('Cl1', 6)],
    freeCoordinates: [],
    contacts: [contact('Na1', 'Cl1', '2')],
  },
  {
    id: 'caesium-chloride',
    name: 'Caesium chloride',
    description: 'A cation in the middle of a cube of anions; each has eight neighbours.',
    roles: [role('Cs1', 8), role('Cl1', 8)],
    freeCoordinates: [],
    contacts: [contact('Cs1', 'Cl1', '2/√3')],
  },
  {
    id: 'zinc-blende',
    name: 'Zinc blende',
    description: 'Cubic close packing of anions, cations in half the tetrahedral gaps.',
    roles: [role('Zn1', 4), role('S1', 4)],
    freeCoordinates: [],
    contacts: [contact('Zn1', 'S1', '4/√3')],
  },
  {
    id: 'wurtzite',
    name: 'Wurtzite',
    description:
      'Hexagonal close packing of anions, cations in half the tetrahedral gaps; polar along c.',
    roles: [role('Zn1', 4), role('S1', 4)],
    freeCoordinates: [{ name: 'u', label: 'S1', axis: 'z', expressions: { z: 'u' } }],
    contacts: [contact('Zn1', 'S1', null)],
  },
  {
    id: 'nickel-arsenide',
    name: 'Nickel arsenide',
    description:
      'Hexagonal close packing of anions, cations in all octahedral gaps; the octahedra share faces along c.',
    roles: [role('Fe1', 6), role('S1', 6)],
    freeCoordinates: [],
    contacts: [contact('Fe1', 'S1', null)],
  },
  {
    id: 'fluorite',
    name: 'Fluorite',
    description: 'Cations in cubic close packing, anions in all tetrahedral gaps.',
    roles: [role('Ca1', 8), role('F1', 4)],
    freeCoordinates: [],
    contacts: [contact('Ca1', 'F1', '4/√3')],
  },
  {
    id: 'antifluorite',
    name: 'Antifluorite',
    description:
      'Fluorite with the signs exchanged: anions packed, cations in all tetrahedral gaps.',
    roles: [role('Li1', 4), role('O1', 8)],
    freeCoordinates: [],
    contacts: [contact('Li1', 'O1', '4/√3')],
  },
  {
    id: 'rutile',
    name: 'Rutile',
    description: 'Chains of edge-sharing octahedra along c; each anion joins three cations.',
    roles: [role('Ti1', 6), role('O1', 3)],
    freeCoordinates: [{ name: 'u', label: 'O1', axis: 'x', expressions: { x: 'u', y: 'u' } }],
    contacts: [contact('Ti1', 'O1', null)],
  },
  {
    id: 'cadmium-iodide',
    name: 'Cadmium iodide',
    description: 'Layers of edge-sharing octahedra between two sheets of anions (form 1T).',
    roles: [role('Cd1', 6), role('I1', 3)],
    freeCoordinates: [{ name: 'z', label: 'I1', axis: 'z', expressions: { z: 'z' } }],
    contacts: [contact('Cd1', 'I1', null)],
  },
  {
    id: 'cuprite',
    name: 'Cuprite',
    description:
      'Two interwoven nets: anions in tetrahedra of cations, cations in line between two anions.',
    roles: [role('Cu1', 2), role('O1', 4)],
    freeCoordinates: [],
    contacts: [contact('Cu1', 'O1', '4/√3')],
  },
  {
    id: 'rhenium-trioxide',
    name: 'Rhenium trioxide',
    description: 'Octahedra sharing all corners, the cube between them empty.',
    roles: [role('Re1', 6), role('O1', 2)],
    freeCoordinates: [],
    contacts: [contact('Re1', 'O1', '2')],
  },
  {
    id: 'perovskite',
    name: 'Perovskite',
    description:
      'Corner-sharing octahedra around the small cation, the large cation in the cube between them.',
    roles: [role('Sr1', 12), role('Ti1', 6), role('O1', 6)],
    freeCoordinates: [],
    contacts: [contact('Ti1', 'O1', '2')],
  },
  {
    id: 'corundum',
    name: 'Corundum',
    description: 'Hexagonal close packing of anions, cations in two thirds of the octahedral gaps.',
    roles: [role('Al1', 6), role('O1', 4)],
    freeCoordinates: [
      { name: 'z', label: 'Al1', axis: 'z', expressions: { z: 'z' } },
      { name: 'x', label: 'O1', axis: 'x', expressions: { x: 'x' } },
    ],
    contacts: [contact('Al1', 'O1', null)],
  },
  {
    id: 'spinel',
    name: 'Spinel',
    description:
      'Cubic close packing of anions; first cation in tetrahedra, second in octahedra (normal spinel).',
    roles: [role('Mg1', 4), role('Al1', 6), role('O1', 4)],
    freeCoordinates: [
      { name: 'u', label: 'O1', axis: 'x', expressions: { x: 'u', y: 'u', z: 'u' } },
    ],
    contacts: [contact('Mg1', 'O1', null, 4), contact('Al1', 'O1', null, 12)],
  },
];
