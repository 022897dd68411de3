import {
  limit,
  notJudged,
  type CheckResult,
  type CheckSubject,
} from '#common/physics/checks/check-result';
import { oppositeShells } from '#common/physics/checks/surroundings';
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
  const radii = new Map(ions.map(({ speciesKey, radiusA }) => [speciesKey, radiusA]));
  return result.sites.flatMap((site) => {
    const [nearest] = oppositeShells(site, result);
    const own = radii.get(site.speciesKey);
    const other = nearest === undefined ? null : radii.get(nearest.speciesKey);
    return nearest === undefined || !own || !other
      ? []
      : [
          {
            label: site.label,
            neighbour: nearest.speciesKey,
            distanceA: nearest.distanceA,
            share: nearest.distanceA / (own + other),
          },
        ];
  });
}

/** Ions of opposite charge about as far apart as their radii say. */
export function checkContacts(subject: CheckSubject): CheckResult {
  const unsized = subject.ions.find(({ chargeE, radiusA }) => chargeE !== 0 && radiusA === null);
  if (unsized !== undefined) {
    return notJudged(key, name, `The tables have no ionic radius for ${unsized.speciesKey}.`);
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
