import { describe, expect, it } from 'vitest';

import { formationComposition } from '#common/physics/energetics/formation-composition';
import { formationSteps } from '#common/physics/energetics/formation-steps';
import type { ResolvedCell, SiteComponent } from '#common/physics/resolved-cell';

function cellOf(...sites: SiteComponent[][]): ResolvedCell {
  return {
    lattice: { aA: 4, bA: 4, cA: 4, alphaDeg: 90, betaDeg: 90, gammaDeg: 90 },
    vectorsA: [4, 0, 0, 0, 4, 0, 0, 0, 4],
    volumeA3: 64,
    sites: sites.map((components, at) => ({
      definitionIndex: at,
      label: `${components[0]!.element}${at + 1}`,
      copy: 0,
      fractional: [at / sites.length, 0, 0],
      chargeE: components.reduce((sum, one) => sum + one.chargeE * one.occupancy, 0),
      element: components[0]!.element,
      components,
      speciesKey: components
        .map((one) => `${one.element}${one.chargeE}:${one.occupancy}`)
        .join('/'),
    })),
    operationCount: 1,
    hasPolarAxis: false,
    parameters: {},
  };
}

const ion = (element: string, chargeE: number, occupancy = 1): SiteComponent => ({
  element,
  chargeE,
  occupancy,
});

describe('formationComposition', () => {
  it('counts ions per formula unit, cations first', () => {
    const cell = cellOf([ion('F', -1)], [ion('F', -1)], [ion('Ca', 2)]);
    expect(formationComposition(cell)).toEqual({
      formula: 'CaF2',
      ions: [
        { element: 'Ca', chargeE: 2, count: 1 },
        { element: 'F', chargeE: -1, count: 2 },
      ],
      isMixed: false,
    });
  });

  it('counts shared and partly empty sites with their occupancies', () => {
    const cell = cellOf([ion('Mg', 2, 0.75), ion('Fe', 2, 0.25)], [ion('O', -2)]);
    const mixed = formationComposition(cell);
    expect(mixed).toMatchObject({ formula: 'Mg0.75Fe0.25O', isMixed: true });
    const steps = 'ions' in mixed ? formationSteps(mixed) : [];
    expect(steps.find(({ key }) => key === 'ionisation:Fe:2')?.coefficient).toBe(0.25);
  });

  it('takes thirds of a charge for what they are, and refuses them by name', () => {
    const cell = cellOf([ion('Fe', 8 / 3)], [ion('O', -8 / 3)]);
    const refused = formationComposition(cell);
    expect('reason' in refused ? refused.reason : '').toMatch(
      /^Fe1: Fe carries a charge of 2.6667/,
    );
  });

  it('refuses a charged cell and one without ions', () => {
    const charged = formationComposition(cellOf([ion('Na', 1)]));
    expect('reason' in charged ? charged.reason : '').toContain('net charge of 1');
    const neutral = formationComposition(cellOf([ion('Ar', 0)]));
    expect('reason' in neutral ? neutral.reason : '').toContain('no ions');
  });

  it('keeps neutral atoms: they are atomised and nothing else', () => {
    const cell = cellOf([ion('Na', 1)], [ion('Cl', -1)], [ion('Ar', 0)]);
    const kept = formationComposition(cell);
    const keys = 'ions' in kept ? formationSteps(kept).map(({ key }) => key) : [];
    expect(keys.filter((key) => key.includes(':Ar'))).toEqual(['atomisation:Ar']);
  });
});
