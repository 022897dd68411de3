import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { EvaluationResult } from '#common/schemas/evaluation';
import { resultOf } from '#client/testing/lattice-factories.ts';

const siteOf = (
  element: string,
  chargeE: number,
  speciesKey: string,
  at: number,
): ResolvedCell['sites'][number] => ({
  definitionIndex: at === 0 ? 0 : 1,
  label: `${element}1`,
  copy: 0,
  fractional: [at, at, at],
  chargeE,
  element,
  components: [{ element, chargeE, occupancy: 1 }],
  speciesKey,
});

/** Caesium chloride in numbers; a charge other than 1 on caesium unbalances it. */
export const caesiumChlorideCell = (caesiumE = 1): ResolvedCell => ({
  lattice: { aA: 4.12, bA: 4.12, cA: 4.12, alphaDeg: 90, betaDeg: 90, gammaDeg: 90 },
  vectorsA: [4.12, 0, 0, 0, 4.12, 0, 0, 0, 4.12],
  volumeA3: 69.934528,
  sites: [siteOf('Cs', caesiumE, 'Cs+1', 0), siteOf('Cl', -1, 'Cl-1', 0.5)],
  operationCount: 1,
  hasPolarAxis: false,
  parameters: {},
});

/** Its evaluation with the shells that sizes and checks are read from. */
export function caesiumChlorideResult(): EvaluationResult {
  const result = resultOf();
  const shellOf = (speciesKey: string) => ({
    ...{ speciesKey, distanceA: 3.568024663591888, multiplicity: 8 },
    ...{ energyEv: -32.29, runningEv: -32.29 },
  });
  return {
    ...result,
    sites: result.sites.map((site) => ({
      ...site,
      shells: [shellOf(site.charge > 0 ? 'Cl-1' : 'Cs+1')],
    })),
  };
}
