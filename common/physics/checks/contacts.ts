import {
  limit,
  notJudged,
  type CheckResult,
  type CheckSubject,
} from '#common/physics/checks/check-result';
import { likeShells, oppositeShells } from '#common/physics/checks/surroundings';
import { ionName } from '#common/physics/energetics/ion-sizes';
import type { CheckWord } from '#common/schemas/energetics';
import { formatFixed } from '#common/units/format';

const key = 'contacts';
const name = 'Closest contacts';

interface Contact {
  readonly label: string;
  readonly neighbour: string;
  readonly distanceA: number;
  /** Distance over the sum of the radii. */
  readonly share: number;
}

function nearestContacts({ result, ions }: CheckSubject): Contact[] {
  const kinds = new Map(ions.map((ion) => [ion.speciesKey, ion]));
  return result.sites.flatMap((site) => {
    const [nearest] = oppositeShells(site, result);
    const own = kinds.get(site.speciesKey)?.radiusA;
    const other = nearest && kinds.get(nearest.speciesKey);
    return nearest === undefined || !own || !other?.radiusA
      ? []
      : [
          {
            label: site.label,
            neighbour: ionName(other),
            distanceA: nearest.distanceA,
            share: nearest.distanceA / (own + other.radiusA),
          },
        ];
  });
}

/** Ions of like charge nearer to one another than any to its counter-ion, or null. */
function crowded({ result }: CheckSubject): CheckResult | null {
  const d0 = result.shortestUnlikeDistanceA;
  const pairs = result.sites.flatMap((site) =>
    likeShells(site, result)
      .slice(0, 1)
      .map(({ distanceA }) => ({ label: site.label, distanceA })),
  );
  if (d0 === null || pairs.length === 0) {
    return null;
  }
  const closest = pairs.reduce((a, b) => (b.distanceA < a.distanceA ? b : a));
  const share = closest.distanceA / d0;
  return share >= limit('likeDoubtful')
    ? null
    : {
        ...{ key, name },
        word: share < limit('likeFails') ? 'fails' : 'doubtful',
        finding: `${closest.label} has an ion of its own sign at ${formatFixed(closest.distanceA, 3)} Å, nearer than any cation is to an anion.`,
        value: share,
        unit: 'of the shortest cation–anion distance',
        limits: ['likeDoubtful', 'likeFails'],
        labels: [closest.label],
      };
}

/** Ions of opposite charge about as far apart as their radii say, and like ions farther. */
export function checkContacts(subject: CheckSubject): CheckResult {
  const unsized = subject.ions.find(({ chargeE, radiusA }) => chargeE !== 0 && radiusA === null);
  if (unsized !== undefined) {
    return notJudged(key, name, `The tables have no ionic radius for ${ionName(unsized)}.`);
  }
  const likeIons = crowded(subject);
  if (likeIons !== null) {
    return likeIons;
  }
  const contacts = nearestContacts(subject);
  if (contacts.length === 0) {
    return notJudged(key, name, 'There are no ions of both signs.');
  }
  const closest = contacts.reduce((a, b) => (b.share < a.share ? b : a));
  const loosest = contacts.reduce((a, b) => (b.share > a.share ? b : a));
  const isLoose =
    closest.share >= limit('contactDoubtful') && loosest.share > limit('contactLoose');
  const shown = isLoose ? loosest : closest;
  const word: CheckWord =
    closest.share < limit('contactFails')
      ? 'fails'
      : closest.share < limit('contactDoubtful') || isLoose
        ? 'doubtful'
        : 'holds';
  return {
    ...{ key, name, word },
    finding:
      `${shown.label} has its nearest ${shown.neighbour} at ${formatFixed(shown.distanceA, 3)} Å, ` +
      `${formatFixed(shown.share, 3)} of the sum of their radii.`,
    value: shown.share,
    unit: 'of the radius sum',
    limits: ['contactDoubtful', 'contactFails', 'contactLoose'],
    labels: word === 'holds' ? [] : [shown.label],
  };
}
