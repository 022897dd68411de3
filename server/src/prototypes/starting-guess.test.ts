import { describe, expect, it } from 'vitest';

import { guessEdge, ionText, type FindRadius, type GuessContact } from './starting-guess.js';

// Shannon, Acta Cryst. A32 (1976) 751: crystal-ionic radii in Å at the coordination given.
const radii: Readonly<Record<string, number>> = {
  'Mg2@6': 0.72,
  'O-2@6': 1.4,
  'O-2@4': 1.38,
  'Mg2@4': 0.57,
  'Al3@6': 0.535,
};
const findRadius: FindRadius = (element, charge, coordination = 6) => {
  const radiusA = radii[`${element}${charge}@${coordination}`];
  return radiusA === undefined ? null : { radiusA, coordination };
};

const magnesiumOxide: GuessContact = {
  cation: { element: 'Mg', chargeE: 2 },
  cationCoordination: 6,
  anion: { element: 'O', chargeE: -2 },
  anionCoordination: 6,
  edgeOverDistance: 2,
  exactFactor: '2',
  bonds: 1,
};

describe('the starting guess', () => {
  it('adds radii and says so', () => {
    const guess = guessEdge([magnesiumOxide], findRadius);
    expect(guess).toEqual({
      kind: 'guess',
      aA: expect.closeTo(4.24, 12),
      sentence: 'a = 2 (r(Mg²⁺, 6) + r(O²⁻, 6)) = 2 (0.72 + 1.40) = 4.24 Å',
    });
  });

  it('takes the mean over contacts, weighted by bonds', () => {
    const tetrahedral: GuessContact = {
      ...magnesiumOxide,
      cationCoordination: 4,
      anionCoordination: 4,
      edgeOverDistance: 4.2,
      exactFactor: null,
      bonds: 4,
    };
    const octahedral: GuessContact = {
      ...tetrahedral,
      cation: { element: 'Al', chargeE: 3 },
      cationCoordination: 6,
      edgeOverDistance: 4.1925,
      bonds: 12,
    };
    const guess = guessEdge([tetrahedral, octahedral], findRadius);
    expect(guess.kind === 'guess' && guess.aA).toBeCloseTo(
      (4 * 4.2 * (0.57 + 1.38) + 12 * 4.1925 * (0.535 + 1.38)) / 16,
      10,
    );
    expect(guess.kind === 'guess' && guess.sentence).toContain(
      '[4 · 4.2000 (r(Mg²⁺, 4) + r(O²⁻, 4)) + 12 · 4.1925 (r(Al³⁺, 6) + r(O²⁻, 4))] / 16',
    );
  });

  it('names the ions it has no radius for', () => {
    const odd: GuessContact = { ...magnesiumOxide, cation: { element: 'Mg', chargeE: 7 } };
    expect(guessEdge([odd], findRadius)).toEqual({ kind: 'no-radius', ions: ['Mg⁷⁺'] });
  });

  it('writes ions as chemists do', () => {
    expect(ionText({ element: 'Na', chargeE: 1 })).toBe('Na⁺');
    expect(ionText({ element: 'Cl', chargeE: -1 })).toBe('Cl⁻');
    expect(ionText({ element: 'Ar', chargeE: 0 })).toBe('Ar');
  });
});
