import { limit, type CheckResult, type CheckSubject } from '#common/physics/checks/check-result';
import type { SiteResult } from '#common/schemas/evaluation';
import { formatFixed, formatSigned } from '#common/units/format';

/** |φ| over the largest of the sites with the same charge. */
function strength(site: SiteResult, sites: readonly SiteResult[]): number {
  const like = sites.filter(({ charge }) => charge === site.charge);
  return (
    Math.abs(site.potentialV) / Math.max(...like.map(({ potentialV }) => Math.abs(potentialV)))
  );
}

/** A cation wants a negative potential, an anion a positive one, and neither much less than its like. */
export function checkPotentials({ result }: CheckSubject): CheckResult {
  const charged = result.sites.filter(({ charge }) => charge !== 0);
  const common = { key: 'potentials', name: 'Site potentials', unit: 'V' } as const;
  const wrong = charged.filter(({ charge, potentialV }) => charge * potentialV >= 0);
  if (wrong.length > 0) {
    const [first] = wrong;
    return {
      ...common,
      word: 'fails',
      finding: `${first!.label} (${formatSigned(first!.charge, 0)}) sits at ${formatSigned(first!.potentialV, 3)} V: its surroundings push it out. Check its charge and its place.`,
      value: first!.potentialV,
      limits: [],
      labels: wrong.map(({ label }) => label),
    };
  }
  const weakest = charged.reduce((a, b) => (strength(b, charged) < strength(a, charged) ? b : a));
  const share = strength(weakest, charged);
  const isWeak = share < limit('potentialWeak');
  return {
    ...common,
    word: isWeak ? 'doubtful' : 'holds',
    finding: isWeak
      ? `${weakest.label} sits at ${formatSigned(weakest.potentialV, 3)} V, only ${formatFixed(share, 2)} of what others of its charge have.`
      : 'Every cation sits at a negative and every anion at a positive potential.',
    value: weakest.potentialV,
    limits: ['potentialWeak'],
    labels: isWeak ? [weakest.label] : [],
  };
}
