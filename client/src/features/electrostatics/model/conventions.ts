import type { EvaluationResult } from '#common/schemas/evaluation';

/** What each number means, in one sentence; shown on hover and focus. */
export const conventions = {
  energy:
    'Electrostatic energy of one formula unit against ions infinitely far apart, point charges, conducting surroundings.',
  distance: 'Shortest distance between a cation and an anion.',
} as const;

export type MadelungName = keyof EvaluationResult['madelung'];

/** The four conventions of the Madelung constant, in the order shown. */
export const madelungConventions: readonly {
  readonly name: MadelungName;
  readonly symbol: string;
  readonly caption: string;
  readonly convention: string;
}[] = [
  {
    name: 'perDistance',
    symbol: 'M(d₀)',
    caption: 'charges included',
    convention: 'M(d₀) = −E d₀ / k_e, with E per formula unit and charges included.',
  },
  {
    name: 'perCharge',
    symbol: 'M′',
    caption: 'per charge product',
    convention: 'M′ = M(d₀) / |z₊ z₋|; means something for two kinds of ion only.',
  },
  {
    name: 'reduced',
    symbol: 'M̃',
    caption: 'reduced',
    convention: 'M̃ = 2 M(d₀) / Σz² over the formula unit (Templeton 1953); for any composition.',
  },
  {
    name: 'perEdge',
    symbol: 'M(a)',
    caption: 'per cell edge',
    convention: 'M(a) = −E a / k_e, with the first cell edge a in place of d₀.',
  },
];
