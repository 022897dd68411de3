import { describe, expect, it } from 'vitest';

import { bondValenceKeys, bondValenceParameters } from '#common/chemistry/bond-valence';

type Ion = readonly [element: string, chargeE: number];

function valenceSum(cation: Ion, anion: Ion, distancesA: readonly number[]): number {
  const parameters = bondValenceParameters(...cation, ...anion);
  if (parameters === null) {
    throw new Error(`No parameters for ${cation[0]} and ${anion[0]}.`);
  }
  const { r0A, bA } = parameters;
  return distancesA.reduce((sum, dA) => sum + Math.exp((r0A.value - dA) / bA.value), 0);
}

const six = (distanceA: number): number[] => Array<number>(6).fill(distanceA);
const eight = (distanceA: number): number[] => Array<number>(8).fill(distanceA);

describe('bond-valence sums of well-known salts', () => {
  // Distances follow from measured cell edges (common handbook values, from memory). A sum of
  // well-determined structures lies near the charge; large anions about a small cation, and small
  // ones about a large cation, stretch that to some 20 %.
  it.each<[string, Ion, Ion, number[]]>([
    ['LiF', ['Li', 1], ['F', -1], six(2.014)],
    ['LiCl', ['Li', 1], ['Cl', -1], six(2.57)],
    ['LiBr', ['Li', 1], ['Br', -1], six(2.751)],
    ['NaF', ['Na', 1], ['F', -1], six(2.317)],
    ['NaCl', ['Na', 1], ['Cl', -1], six(2.82)],
    ['NaBr', ['Na', 1], ['Br', -1], six(2.989)],
    ['NaI', ['Na', 1], ['I', -1], six(3.237)],
    ['KF', ['K', 1], ['F', -1], six(2.674)],
    ['KCl', ['K', 1], ['Cl', -1], six(3.147)],
    ['KBr', ['K', 1], ['Br', -1], six(3.298)],
    ['KI', ['K', 1], ['I', -1], six(3.533)],
    ['RbF', ['Rb', 1], ['F', -1], six(2.815)],
    ['RbCl', ['Rb', 1], ['Cl', -1], six(3.291)],
    ['RbBr', ['Rb', 1], ['Br', -1], six(3.445)],
    ['RbI', ['Rb', 1], ['I', -1], six(3.671)],
    ['CsF', ['Cs', 1], ['F', -1], six(3.004)],
    ['CsCl', ['Cs', 1], ['Cl', -1], eight(3.571)],
    ['CsBr', ['Cs', 1], ['Br', -1], eight(3.72)],
    ['CsI', ['Cs', 1], ['I', -1], eight(3.955)],
    ['AgCl', ['Ag', 1], ['Cl', -1], six(2.774)],
    ['AgBr', ['Ag', 1], ['Br', -1], six(2.887)],
    ['MgO', ['Mg', 2], ['O', -2], six(2.106)],
    ['CaO', ['Ca', 2], ['O', -2], six(2.405)],
    ['SrO', ['Sr', 2], ['O', -2], six(2.58)],
    ['BaO', ['Ba', 2], ['O', -2], six(2.77)],
    ['MnO', ['Mn', 2], ['O', -2], six(2.223)],
    ['NiO', ['Ni', 2], ['O', -2], six(2.089)],
    ['CaF2', ['Ca', 2], ['F', -1], eight(2.366)],
    ['SrF2', ['Sr', 2], ['F', -1], eight(2.511)],
    ['CdF2', ['Cd', 2], ['F', -1], eight(2.333)],
    ['BaF2', ['Ba', 2], ['F', -1], eight(2.685)],
    ['CeO2', ['Ce', 4], ['O', -2], eight(2.343)],
    ['UO2', ['U', 4], ['O', -2], eight(2.368)],
    ['ZnS', ['Zn', 2], ['S', -2], [2.342, 2.342, 2.342, 2.342]],
    ['Al2O3', ['Al', 3], ['O', -2], [1.855, 1.855, 1.855, 1.971, 1.971, 1.971]],
    ['Cu2O', ['Cu', 1], ['O', -2], [1.849, 1.849]],
  ])('come near the cation’s charge: %s', (_salt, cation, anion, distancesA) => {
    const ratio = valenceSum(cation, anion, distancesA) / cation[1];
    expect(ratio).toBeGreaterThan(0.8);
    expect(ratio).toBeLessThan(1.2);
  });

  it('is the Pauling strength 1/3 for magnesium in MgO', () => {
    expect(valenceSum(['Mg', 2], ['O', -2], [2.106])).toBeCloseTo(1 / 3, 1);
  });
});

describe('bondValenceParameters', () => {
  it('names its source and standing', () => {
    expect(bondValenceParameters('Na', 1, 'O', -2)).toEqual({
      r0A: {
        value: 1.803,
        source: 'Brown & Altermatt (1985) Acta Cryst. B41, 244',
        status: 'single-source',
      },
      bA: {
        value: 0.37,
        source: 'Brown & Altermatt (1985) Acta Cryst. B41, 244',
        status: 'single-source',
      },
    });
    expect(bondValenceParameters('Zn', 2, 'S', -2)?.r0A.source).toMatch(/Brese/);
    expect(bondValenceParameters('Al', 3, 'O', -2)?.r0A.status).toBe('from-memory');
  });

  it('holds 56 published pairs and 24 from memory', () => {
    const pairs = bondValenceKeys.filter((key) => key.startsWith('bond-valence-r0:'));
    expect(new Set(pairs).size).toBe(80);
    const remembered = pairs.filter((key) => {
      const [, cation, up, anion, down] = /:(\w+)(\+\d)\|(\w+)(-\d)$/.exec(key)!;
      const found = bondValenceParameters(cation!, Number(up), anion!, Number(down));
      return found?.r0A.status === 'from-memory';
    });
    expect(remembered.length).toBe(24);
  });

  it('tells charges apart', () => {
    expect(bondValenceParameters('Fe', 2, 'O', -2)?.r0A.value).toBe(1.734);
    expect(bondValenceParameters('Fe', 3, 'O', -2)?.r0A.value).toBe(1.759);
    expect(bondValenceParameters('Fe', 4, 'O', -2)).toBeNull();
  });

  it('takes the workspace’s own, each parameter by itself', () => {
    const own = new Map([
      ['bond-valence-r0:Na+1|O-2', { value: 1.8, note: 'ours' }],
      ['bond-valence-r0:Xe+2|F-1', { value: 2, note: '' }],
    ]);
    expect(bondValenceParameters('Na', 1, 'O', -2, own)).toMatchObject({
      r0A: { value: 1.8, status: 'own', source: 'ours' },
      bA: { value: 0.37, status: 'single-source' },
    });
    expect(bondValenceParameters('Xe', 2, 'F', -1, own)).toMatchObject({
      r0A: { value: 2, status: 'own' },
      bA: { value: 0.37, status: 'from-memory' },
    });
  });
});
