import {
  limit,
  notJudged,
  wordBelow,
  type CheckResult,
  type CheckSubject,
} from '#common/physics/checks/check-result';
import { oppositeShells, shellWidth } from '#common/physics/checks/surroundings';
import { formatFixed, formatSigned } from '#common/units/format';

const key = 'bond_strengths';
const name = 'Electrostatic valence';

/** Nearest anion of each cation kind, Å: what is little farther is in its shell. */
function nearestByCation({ result }: CheckSubject): Map<string, number> {
  const nearest = new Map<string, number>();
  for (const site of result.sites.filter(({ charge }) => charge > 0)) {
    const [first] = oppositeShells(site, result);
    if (first !== undefined) {
      const known = nearest.get(site.speciesKey) ?? Infinity;
      nearest.set(site.speciesKey, Math.min(known, first.distanceA));
    }
  }
  return nearest;
}

/**
 * Pauling's second rule: strengths z/CN of the bonds that reach an anion add up to its charge.
 * Source: L. Pauling (1929) J. Am. Chem. Soc. 51, 1010.
 */
export function checkBondStrengths(subject: CheckSubject): CheckResult {
  const { result, ions } = subject;
  const nearest = nearestByCation(subject);
  const kinds = new Map(ions.map((ion) => [ion.speciesKey, ion]));
  const anions = result.sites.filter(({ charge }) => charge < 0);
  if (anions.length === 0 || nearest.size === 0) {
    return notJudged(key, name, 'There are no ions of both signs.');
  }
  const sums = anions.map((site) => {
    const sum = oppositeShells(site, result)
      .filter(
        ({ speciesKey, distanceA }) =>
          distanceA <= shellWidth * (nearest.get(speciesKey) ?? 0) * (1 + 1e-9),
      )
      .reduce((total, { speciesKey, multiplicity }) => {
        const cation = kinds.get(speciesKey)!;
        return total + (multiplicity * cation.chargeE) / cation.coordination;
      }, 0);
    return { site, sum, off: sum + site.charge };
  });
  const worst = sums.reduce((a, b) => (Math.abs(b.off) > Math.abs(a.off) ? b : a));
  const word = wordBelow(Math.abs(worst.off), limit('strengthDoubtful'), limit('strengthFails'));
  return {
    ...{ key, name, word },
    finding: `The bonds that reach ${worst.site.label} have strengths of ${formatFixed(worst.sum, 3)} in all, ${formatSigned(worst.off, 3)} from its charge.`,
    value: Math.abs(worst.off),
    unit: 'e',
    limits: ['strengthDoubtful', 'strengthFails'],
    labels: word === 'holds' ? [] : [worst.site.label],
  };
}
