import {
  limit,
  notJudged,
  type CheckResult,
  type CheckSubject,
} from '#common/physics/checks/check-result';
import { ionName, type SizedIon } from '#common/physics/energetics/ion-sizes';
import { formatFixed } from '#common/units/format';

const key = 'radius_ratio';
const name = 'Coordination and radius ratio';

const classes = [
  { neighbours: 3, limit: 'ratioForThree' },
  { neighbours: 4, limit: 'ratioForFour' },
  { neighbours: 6, limit: 'ratioForSix' },
  { neighbours: 8, limit: 'ratioForEight' },
  { neighbours: 12, limit: 'ratioForTwelve' },
] as const;

const classOfCoordination = (count: number): number =>
  Math.max(
    0,
    classes.findLastIndex(({ neighbours }) => neighbours <= count),
  );
const classOfRatio = (ratio: number): number =>
  Math.max(
    0,
    classes.findLastIndex((one) => limit(one.limit) <= ratio),
  );

/** Classes between the coordination a ratio asks for and the one there is. */
function classesApart(ratio: number, coordination: number): number {
  const actual = classOfCoordination(coordination);
  // A cation larger than its anions is as content with eight neighbours as with twelve.
  return ratio >= 1
    ? Math.max(0, classes.length - 2 - actual)
    : Math.abs(classOfRatio(ratio) - actual);
}

function meanRadiusA(ions: readonly SizedIon[]): number {
  const count = ions.reduce((sum, { perFormulaUnit }) => sum + perFormulaUnit, 0);
  return ions.reduce((sum, ion) => sum + ion.radiusA! * ion.perFormulaUnit, 0) / count;
}

/** Cations have about as many neighbours as their size lets touch them. */
export function checkRadiusRatio({ ions }: CheckSubject): CheckResult {
  const unsized = ions.find(({ chargeE, radiusA }) => chargeE !== 0 && radiusA === null);
  const cations = ions.filter(({ chargeE }) => chargeE > 0);
  const anions = ions.filter(({ chargeE }) => chargeE < 0);
  if (unsized !== undefined || cations.length === 0 || anions.length === 0) {
    const why =
      unsized === undefined
        ? 'There are no ions of both signs.'
        : `The tables have no ionic radius for ${ionName(unsized)}.`;
    return notJudged(key, name, why);
  }
  const anionA = meanRadiusA(anions);
  const judged = cations.map((ion) => {
    const ratio = ion.radiusA! / anionA;
    const apart = classesApart(ratio, ion.coordination);
    return { ion, ratio, apart };
  });
  const worst = judged.reduce((a, b) => (b.apart > a.apart ? b : a));
  const expected = worst.ratio >= 1 ? '8 to 12' : classes[classOfRatio(worst.ratio)]!.neighbours;
  return {
    ...{ key, name },
    word: worst.apart === 0 ? 'holds' : worst.apart === 1 ? 'doubtful' : 'fails',
    finding:
      `${ionName(worst.ion)} has ${worst.ion.coordination} neighbours at a radius ratio of ` +
      `${formatFixed(worst.ratio, 3)}, which asks for ${expected}.`,
    value: worst.ratio,
    unit: '',
    limits: classes.map((one) => one.limit),
    labels: [],
  };
}
