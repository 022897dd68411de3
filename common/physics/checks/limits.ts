/** A limit of a check: what it is, its usual value, and who says so. */
export interface CheckLimit {
  readonly name: string;
  readonly value: number;
  readonly unit: string;
  readonly source: string;
}

const practice = 'common practice, no source';
const touching = 'geometry of spheres that just touch';
const instability = 'global instability index, rule of thumb of bond-valence practice';

/** Where each check draws its lines. */
export const checkLimits = {
  contactDoubtful: {
    name: 'contact shorter than',
    value: 0.9,
    unit: 'of the radius sum',
    source: practice,
  },
  contactFails: {
    name: 'contact shorter than',
    value: 0.8,
    unit: 'of the radius sum',
    source: practice,
  },
  contactLoose: {
    name: 'nearest contact longer than',
    value: 1.2,
    unit: 'of the radius sum',
    source: practice,
  },
  likeDoubtful: {
    name: 'ions of one sign nearer than',
    value: 1,
    unit: 'of the shortest cation–anion distance',
    source: practice,
  },
  likeFails: {
    name: 'ions of one sign nearer than',
    value: 0.8,
    unit: 'of the shortest cation–anion distance',
    source: practice,
  },
  potentialWeak: {
    name: 'potential below',
    value: 0.5,
    unit: 'of the strongest of its kind',
    source: practice,
  },
  ratioForThree: {
    name: 'radius ratio for 3 neighbours',
    value: 2 / Math.sqrt(3) - 1,
    unit: '',
    source: touching,
  },
  ratioForFour: {
    name: 'radius ratio for 4 neighbours',
    value: Math.sqrt(1.5) - 1,
    unit: '',
    source: touching,
  },
  ratioForSix: {
    name: 'radius ratio for 6 neighbours',
    value: Math.SQRT2 - 1,
    unit: '',
    source: touching,
  },
  ratioForEight: {
    name: 'radius ratio for 8 neighbours',
    value: Math.sqrt(3) - 1,
    unit: '',
    source: touching,
  },
  ratioForTwelve: { name: 'radius ratio for 12 neighbours', value: 1, unit: '', source: touching },
  strengthDoubtful: {
    name: 'bond strengths off by more than',
    value: 0.25,
    unit: 'e',
    source: 'L. Pauling (1929) J. Am. Chem. Soc. 51, 1010: deviations up to about a sixth occur',
  },
  strengthFails: {
    name: 'bond strengths off by more than',
    value: 0.6,
    unit: 'e',
    source: practice,
  },
  instabilityDoubtful: {
    name: 'instability index above',
    value: 0.1,
    unit: 'v.u.',
    source: instability,
  },
  instabilityFails: {
    name: 'instability index above',
    value: 0.2,
    unit: 'v.u.',
    source: instability,
  },
  energyDoubtful: {
    name: 'lattice energy off by more than',
    value: 0.1,
    unit: '',
    source: practice,
  },
  energyFails: { name: 'lattice energy off by more than', value: 0.25, unit: '', source: practice },
  exponentLow: {
    name: 'exponent below',
    value: 5,
    unit: '',
    source: 'Pauling’s exponents run from 5 to 12',
  },
  exponentHigh: {
    name: 'exponent above',
    value: 12,
    unit: '',
    source: 'Pauling’s exponents run from 5 to 12',
  },
  restDoubtful: {
    name: 'at rest away by more than',
    value: 0.01,
    unit: 'of the spacing',
    source: practice,
  },
  restFails: {
    name: 'at rest away by more than',
    value: 0.05,
    unit: 'of the spacing',
    source: practice,
  },
} as const satisfies Record<string, CheckLimit>;

export type CheckLimitKey = keyof typeof checkLimits;
