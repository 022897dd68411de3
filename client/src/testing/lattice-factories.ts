import type { CellDefinition } from '#common/schemas/cell';
import { defaultEvaluationMethod } from '#common/schemas/cell';
import { defaultEnergeticModel } from '#common/schemas/energetics';
import type { EvaluationResult, PairLedger, StoredEvaluation } from '#common/schemas/evaluation';
import type { Draft, RevisionDetail } from '#common/schemas/lattice';
import type { Annotation } from '#common/schemas/review';
import type { SpaceGroupDetail } from '#common/schemas/symmetry';
import { idOf } from '#client/testing/factories.ts';

export const oda = { id: idOf(1), name: 'Oda Rehn', initials: 'OR' };
export const mara = { id: idOf(2), name: 'Mara Velt', initials: 'MV' };

/** Caesium chloride without symmetry: small enough for a test to follow. */
export const cellOf = (change: Partial<CellDefinition> = {}): CellDefinition => ({
  lattice: { a: '4.12', b: '4.12', c: '4.12', alpha: '90', beta: '90', gamma: '90' },
  symmetry: { kind: 'setting', hallNumber: 1 },
  parameters: [],
  sites: [
    { label: 'Cs1', element: 'Cs', charge: '1', x: '0', y: '0', z: '0', occupancy: '1' },
    { label: 'Cl1', element: 'Cl', charge: '-1', x: '1/2', y: '1/2', z: '1/2', occupancy: '1' },
  ],
  ...change,
});

export const spaceGroupOf = (change: Partial<SpaceGroupDetail> = {}): SpaceGroupDetail => ({
  hallNumber: 1,
  number: 1,
  symbol: 'P 1',
  hallSymbol: 'P 1',
  setting: '',
  crystalSystem: 'triclinic',
  hexagonalAxes: false,
  uniqueAxis: null,
  isStandard: true,
  operations: [{ rotation: [1, 0, 0, 0, 1, 0, 0, 0, 1], translation: [0, 0, 0] }],
  ...change,
});

/** Two rows and what lies beyond; energies as of caesium chloride with a = 4.12 Å. */
export const ledgerOf = (change: Partial<PairLedger> = {}): PairLedger => ({
  reachA: 4.2,
  view: 'bare',
  rows: [
    {
      key: 'Cs+1|Cl-1|3.568',
      speciesA: 'Cs+1',
      speciesB: 'Cl-1',
      distanceA: 3.568024663591888,
      pairsPerFormulaUnit: 8,
      pairEnergyEv: -4.0358,
      contributionEv: -32.286,
      runningEv: -32.286,
    },
    {
      key: 'Cs+1|Cs+1|4.120',
      speciesA: 'Cs+1',
      speciesB: 'Cs+1',
      distanceA: 4.12,
      pairsPerFormulaUnit: 3,
      pairEnergyEv: 3.4951,
      contributionEv: 10.485,
      runningEv: -21.801,
    },
  ],
  selfEv: 0,
  beyondEv: 14.688,
  totalEv: -7.113,
  ...change,
});

const site = (label: string, speciesKey: string, element: string, charge: number, at: number) => ({
  definitionIndex: label === 'Cs1' ? 0 : 1,
  label,
  speciesKey,
  element,
  charge,
  multiplicity: 1,
  fractional: [at, at, at],
  potentialV: -7.1131 * charge,
  fieldVPerA: [0, 0, 0],
  forceEvPerA: [0, 0, 0],
  energyShareEv: -3.55655,
  shells: [],
});

export const resultOf = (change: Partial<EvaluationResult> = {}): EvaluationResult => ({
  engine: 'test',
  method: defaultEvaluationMethod,
  formula: 'CsCl',
  formulaUnitsPerCell: 1,
  sitesPerCell: 2,
  volumeA3: 69.934528,
  densityGPerCm3: 3.998,
  spaceGroupNumber: 1,
  spaceGroupSymbol: 'P 1',
  shortestDistanceA: 3.568024663591888,
  shortestUnlikeDistanceA: 3.568024663591888,
  shortestUnlikePair: ['Cs1', 'Cl1'],
  energyEvPerCell: { value: -7.11310612345, bound: 2e-10 },
  energyEvPerFormulaUnit: { value: -7.11310612345, bound: 2e-10 },
  relativeErrorBound: 3e-11,
  madelung: {
    perDistance: { value: 1.762674773071, bound: 4e-11, reason: null },
    perCharge: { value: null, bound: null, reason: 'More than two kinds of ion.' },
    reduced: { value: 1.762674773071, bound: 4e-11, reason: null },
    perEdge: { value: 2.03536151, bound: 4e-8, reason: null },
  },
  potentialBoundV: 1e-9,
  species: [
    { key: 'Cs+1', element: 'Cs', charge: 1, perFormulaUnit: 1, isMixed: false },
    { key: 'Cl-1', element: 'Cl', charge: -1, perFormulaUnit: 1, isMixed: false },
  ],
  sites: [site('Cs1', 'Cs+1', 'Cs', 1, 0), site('Cl1', 'Cl-1', 'Cl', -1, 0.5)],
  stressEvPerA3: [0.0339, 0.0339, 0.0339, 0, 0, 0],
  stressBoundEvPerA3: 1e-11,
  pairLedger: ledgerOf(),
  sublatticeMatrix: {
    speciesKeys: ['Cs+1', 'Cl-1'],
    energiesEv: [
      [-4.9, 2.687],
      [2.687, -4.9],
    ],
    boundEv: 1e-10,
  },
  certificate: {
    splittingPerA: [0.5, 0.65],
    realCutoffA: 10,
    reciprocalCutoffPerA: 5,
    realTerms: 120,
    reciprocalTerms: 80,
    energyDifferenceEv: 1e-12,
    virialResidualEv: 1e-11,
    forceSumEvPerA: 0,
    potentialSumResidualEv: 1e-13,
    agrees: true,
  },
  hasPolarAxis: false,
  warnings: [],
  ...change,
});

export const evaluationOf = (change: Partial<EvaluationResult> = {}): StoredEvaluation => ({
  hash: 'ab'.repeat(32),
  computedAt: '2026-11-30T08:00:00Z',
  durationMs: 3,
  result: resultOf(change),
});

export const draftOf = (change: Partial<Draft> = {}): Draft => ({
  latticeId: idOf(100),
  etag: '"r4-v0"',
  baseRevision: 4,
  isChanged: false,
  cell: cellOf(),
  method: defaultEvaluationMethod,
  model: defaultEnergeticModel,
  prototype: 'caesium-chloride',
  updatedAt: null,
  updatedBy: null,
  ...change,
});

export const revisionOf = (change: Partial<RevisionDetail> = {}): RevisionDetail => ({
  id: idOf(400),
  number: 4,
  note: 'Edge from the second run.',
  state: 'draft',
  author: oda,
  createdAt: '2026-11-30T08:00:00Z',
  submittedBy: null,
  submittedAt: null,
  decidedBy: null,
  decidedAt: null,
  decisionReason: null,
  formula: 'CsCl',
  energyEvPerFormulaUnit: { value: -7.11310612345, bound: 2e-10 },
  evaluationHash: 'ab'.repeat(32),
  latticeId: idOf(100),
  latticeName: 'Caesium chloride, trial 3',
  cell: cellOf(),
  method: defaultEvaluationMethod,
  model: defaultEnergeticModel,
  prototype: 'caesium-chloride',
  evaluation: evaluationOf(),
  evaluationProblem: null,
  ...change,
});

export const annotationOf = (change: Partial<Annotation> = {}): Annotation => ({
  id: idOf(500),
  number: 1,
  revisionNumber: 4,
  anchor: { kind: 'site', label: 'Cs1' },
  text: 'Is this edge from the warm run?',
  author: mara,
  createdAt: '2026-11-30T09:00:00Z',
  resolvedAt: null,
  resolvedBy: null,
  replies: [],
  ...change,
});
