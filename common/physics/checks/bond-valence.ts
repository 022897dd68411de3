import { bondValenceParameters } from '#common/chemistry/bond-valence';
import {
  limit,
  notJudged,
  wordBelow,
  type CheckResult,
  type CheckSubject,
} from '#common/physics/checks/check-result';
import { oppositeShells } from '#common/physics/checks/surroundings';
import type { SiteResult } from '#common/schemas/evaluation';
import { formatFixed } from '#common/units/format';

const key = 'bond_valence';
const name = 'Bond-valence sums';

/** Bonds longer than this carry next to nothing. */
const reachA = 6;

/** Σ exp((R₀ − d)/b) over a site's neighbours of opposite charge; a string names what is missing. */
export function bondValenceSum(site: SiteResult, subject: CheckSubject): number | string {
  const { result, overrides } = subject;
  const kinds = new Map(result.species.map((kind) => [kind.key, kind]));
  const own = kinds.get(site.speciesKey)!;
  let sum = 0;
  for (const { speciesKey, distanceA, multiplicity } of oppositeShells(site, result)) {
    if (distanceA > reachA) {
      continue;
    }
    const other = kinds.get(speciesKey)!;
    const [cation, anion] = own.charge > 0 ? [own, other] : [other, own];
    if (cation.isMixed || anion.isMixed) {
      return 'Shared or partly empty sites have no bond valence of their own.';
    }
    const parameters = bondValenceParameters(
      cation.element,
      cation.charge,
      anion.element,
      anion.charge,
      overrides,
    );
    if (parameters === null) {
      return `There are no bond-valence parameters for ${cation.key} and ${anion.key}: add them under the workspace’s data values.`;
    }
    sum += multiplicity * Math.exp((parameters.r0A.value - distanceA) / parameters.bA.value);
  }
  return sum;
}

/**
 * Bond-valence sums against the charges, and the global instability index, the root mean square of
 * the differences over all ions. Sources: I. D. Brown, D. Altermatt (1985) Acta Cryst. B41, 244;
 * A. Salinas-Sanchez et al. (1992) J. Solid State Chem. 100, 201 (from memory).
 */
export function checkBondValence(subject: CheckSubject): CheckResult {
  const sites = subject.result.sites.filter(({ charge }) => charge !== 0);
  let squares = 0;
  let count = 0;
  let worst = { label: '', sum: 0, off: 0 };
  for (const site of sites) {
    const sum = bondValenceSum(site, subject);
    if (typeof sum === 'string') {
      return notJudged(key, name, sum);
    }
    const off = sum - Math.abs(site.charge);
    squares += site.multiplicity * off * off;
    count += site.multiplicity;
    worst = Math.abs(off) >= Math.abs(worst.off) ? { label: site.label, sum, off } : worst;
  }
  const index = Math.sqrt(squares / count);
  const word = wordBelow(index, limit('instabilityDoubtful'), limit('instabilityFails'));
  return {
    ...{ key, name, word },
    finding: `Global instability index ${formatFixed(index, 3)} v.u.; farthest off is ${worst.label} with a sum of ${formatFixed(worst.sum, 3)} v.u.`,
    value: index,
    unit: 'v.u.',
    limits: ['instabilityDoubtful', 'instabilityFails'],
    labels: word === 'holds' ? [] : [worst.label],
  };
}
