import { describe, expect, it } from 'vitest';

import { atomicMass } from '#common/chemistry/atomic-mass';
import { catalogue, shippedValue } from '#common/chemistry/data-catalogue';
import { dataKinds, readDataKey, valueFault } from '#common/chemistry/data-key';
import { ionicRadii, ionicRadiusA, radiusKey } from '#common/chemistry/ionic-radii';
import { thermochemicalRadiusA } from '#common/chemistry/thermochemical-radius';

const rows = catalogue();

function groupBy<T>(items: readonly T[], keyOf: (item: T) => string): Map<string, T[]> {
  const groups = new Map<string, T[]>();
  items.forEach((item) => groups.set(keyOf(item), [...(groups.get(keyOf(item)) ?? []), item]));
  return groups;
}

describe('the catalogue', () => {
  it('lists every shipped value once, under a key that reads back', () => {
    expect(rows.length).toBe(1199);
    expect(new Set(rows.map(({ key }) => key)).size).toBe(rows.length);
    for (const { key, facts, subject } of rows) {
      expect(`${facts.kind}:${subject}`).toBe(key);
    }
  });

  it('holds all 497 radii, each under its own coordination and spin state', () => {
    const radii = rows.filter(({ facts }) => facts.kind === 'radius');
    expect(radii.map(({ key, shipped }) => [key, shipped.value])).toEqual(
      ionicRadii.map((row) => [radiusKey(row), row.radiusA]),
    );
  });

  it('has a source and a value of possible size in every row', () => {
    for (const { key, facts, shipped } of rows) {
      expect(shipped.source, key).not.toBe('');
      expect(valueFault(facts, shipped.value), key).toBeNull();
      expect(shipped.status, key).not.toBe('own');
    }
  });

  it('says “from memory” in the source exactly where the status does, or that it is practice', () => {
    for (const { key, shipped } of rows) {
      const isSaid = /from memory|common practice/.test(shipped.source);
      expect(isSaid, `${key}: ${shipped.source}`).toBe(shipped.status === 'from-memory');
    }
  });

  it('has rows of every kind', () => {
    for (const { kind } of dataKinds) {
      expect(
        rows.some(({ facts }) => facts.kind === kind),
        kind,
      ).toBe(true);
    }
  });
});

describe('readDataKey', () => {
  it('reads each kind’s example', () => {
    for (const facts of dataKinds) {
      expect(readDataKey(facts.example)?.facts).toBe(facts);
    }
  });

  it.each([
    '',
    'mass',
    'mass:Xx',
    'mass:NA',
    'radius:Na+1',
    'radius:OH:6',
    'toString:Na',
    'mass:Na ',
  ])('refuses %j', (key) => expect(readDataKey(key)).toBeNull());
});

describe('valueFault', () => {
  const facts = readDataKey('radius:Na+1:6')!.facts;
  it.each([NaN, Infinity, -Infinity, -0.6, 4.1])('names the range for %d', (value) => {
    expect(valueFault(facts, value)).toBe('Ionic radius must lie between −0.5 Å and 4 Å.');
  });
});

describe('ionic radii', () => {
  /** Ions of one spin state or geometry, by rising coordination. */
  const series = groupBy(ionicRadii, ({ element, charge, state }) =>
    [element, charge, state].join(' '),
  );

  it('grow with coordination, or stay, but for one that the published table has smaller', () => {
    const smaller = [...series].flatMap(([name, unsorted]) => {
      const sorted = [...unsorted].sort((a, b) => a.coordination - b.coordination);
      return sorted
        .slice(1)
        .filter((row, index) => row.radiusA < sorted[index]!.radiusA)
        .map((row) => `${name.trim()}: ${row.coordination}`);
    });
    // Shannon (1976) prints 0.80 Å for five neighbours of Sb³⁺ and 0.76 Å for six.
    expect(smaller).toEqual(['Sb 3: 6']);
  });

  it('shrink as charge rises, at six neighbours and the same state', () => {
    const plain = ionicRadii.filter(
      ({ coordination, state, charge }) => coordination === 6 && state === '' && charge > 0,
    );
    for (const [element, unsorted] of groupBy(plain, (row) => row.element)) {
      const sorted = [...unsorted].sort((a, b) => a.charge - b.charge);
      sorted.slice(1).forEach((row, index) => {
        expect(row.radiusA, `${element} ${row.charge}`).toBeLessThan(sorted[index]!.radiusA);
      });
    }
  });

  it('are larger in high spin than in low spin', () => {
    const low = ionicRadii.filter(({ state }) => state === 'lowspin');
    expect(low.length).toBeGreaterThan(5);
    for (const { element, charge, coordination, radiusA } of low) {
      const high = ionicRadii.find(
        (row) =>
          row.state === 'highspin' &&
          row.element === element &&
          row.charge === charge &&
          row.coordination === coordination,
      );
      expect(high === undefined || high.radiusA > radiusA, element).toBe(true);
    }
  });

  it('give way to the workspace’s own, which may add coordinations', () => {
    const own = new Map([
      ['radius:Na+1:6', { value: 1.05, note: 'ours' }],
      ['radius:Cl-1:8', { value: 1.9, note: '' }],
      ['radius:Fe+2:6:lowspin', { value: 0.6, note: '' }],
    ]);
    expect(ionicRadiusA('Na', 1, 6, undefined, own)).toEqual({
      value: 1.05,
      radiusA: 1.05,
      coordination: 6,
      source: 'ours',
      status: 'own',
    });
    expect(ionicRadiusA('Na', 1, 8, undefined, own)?.value).toBe(1.18);
    expect(ionicRadiusA('Cl', -1, 8, undefined, own)).toMatchObject({
      value: 1.9,
      coordination: 8,
      status: 'own',
    });
    expect(ionicRadiusA('Fe', 2, 6, 'low', own)?.value).toBe(0.6);
    expect(ionicRadiusA('Fe', 2, 6, 'high', own)?.value).toBe(0.78);
  });
});

describe('masses and thermochemical radii', () => {
  it('give way to the workspace’s own', () => {
    const own = new Map([
      ['mass:Li', { value: 7.016, note: 'enriched ⁷Li' }],
      ['thermochemical-radius:SO4-2', { value: 2.2, note: '' }],
    ]);
    expect(atomicMass('Li', own)).toEqual({ value: 7.016, source: 'enriched ⁷Li', status: 'own' });
    expect(atomicMass('Li')).toMatchObject({ value: 6.94, status: 'verified' });
    expect(atomicMass('Xx')).toBeNull();
    expect(thermochemicalRadiusA('SO4', -2, 'current', own)?.value).toBe(2.2);
    expect(thermochemicalRadiusA('SO4', -2, 'older', own)?.value).toBe(2.3);
  });

  // Handbook page for the first two (verified); the rest Jenkins & Roobottom, from memory.
  it.each([
    ['NH4', 1, 1.36, 'verified'],
    ['HF2', -1, 1.72, 'verified'],
    ['NO3', -1, 2, 'from-memory'],
    ['SO4', -2, 2.18, 'from-memory'],
  ] as const)('%s %i', (group, chargeE, value, status) => {
    expect(thermochemicalRadiusA(group, chargeE)).toMatchObject({ value, status });
  });

  it('says of a mass number that it is one', () => {
    expect(shippedValue('mass:Tc')?.source).toMatch(/mass number/i);
    expect(shippedValue('mass:D')?.status).toBe('from-memory');
  });
});
