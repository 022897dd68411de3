import { Problem } from '#common/errors/problem';
import type { Warning } from '#common/schemas/evaluation';
import type { SpaceGroupSetting } from '#common/schemas/symmetry';

/** How many of each element a reading of the file puts into the cell; null when it can't be read. */
export type CountElements = (setting: SpaceGroupSetting) => ReadonlyMap<string, number> | null;
/** Whether a composition can be neutral with the charges given or with usual ones. */
export type CanBeNeutral = (counts: ReadonlyMap<string, number>) => boolean;

interface Reading {
  readonly setting: SpaceGroupSetting;
  readonly counts: ReadonlyMap<string, number>;
}

/**
 * A symbol like `F d -3 m` has two origins in use. Where the file does not say which, its sites do:
 * only one origin gives the stated formula, a neutral compound, or puts them on special positions.
 * @throws Problem `cif.ambiguous_origin` when the sites fit both
 */
export function chooseOrigin(
  candidates: readonly SpaceGroupSetting[],
  evidence: {
    readonly count: CountElements;
    readonly formula: ReadonlyMap<string, number> | null;
    readonly canBeNeutral: CanBeNeutral;
  },
  warnings: Warning[],
): SpaceGroupSetting {
  const readings = candidates.flatMap((setting): Reading[] => {
    const counts = evidence.count(setting);
    return counts ? [{ setting, counts }] : [];
  });
  const tests: readonly [string, (reading: Reading) => boolean][] = [
    ['gives the stated formula', ({ counts }) => matchesFormula(counts, evidence.formula)],
    ['can be neutral', ({ counts }) => evidence.canBeNeutral(counts)],
    ['puts the sites on special positions', ({ counts }) => isFewest(counts, readings)],
  ];
  let left = readings;
  for (const [reason, passes] of tests) {
    const passing = left.filter(passes);
    const only = passing[0];
    if (passing.length === 1 && only && readings.length > 1) {
      warnings.push(originChosen(only.setting, reason));
      return only.setting;
    }
    left = passing.length > 0 ? passing : left;
  }
  const only = left[0];
  if (left.length === 1 && only) {
    warnings.push(originChosen(only.setting, 'can be read'));
    return only.setting;
  }
  const symbol = candidates[0]!.symbol;
  throw new Problem(
    'cif.ambiguous_origin',
    `${symbol} has two origins and the sites fit both. Write “${symbol} :1” or “${symbol} :2” in the file.`,
  );
}

function originChosen(setting: SpaceGroupSetting, reason: string): Warning {
  return {
    code: 'cif.origin_chosen',
    message:
      `${setting.symbol} has two origins and the file does not say which. Origin choice ` +
      `${setting.setting.charAt(0)} was taken: only it ${reason}.`,
  };
}

function matchesFormula(
  counts: ReadonlyMap<string, number>,
  formula: ReadonlyMap<string, number> | null,
): boolean {
  if (!formula || formula.size !== counts.size) {
    return false;
  }
  const ratios = [...formula].map(([element, count]) => (counts.get(element) ?? 0) / count);
  const first = ratios[0] ?? 0;
  return first > 0 && ratios.every((ratio) => Math.abs(ratio / first - 1) < 0.01);
}

function isFewest(counts: ReadonlyMap<string, number>, readings: readonly Reading[]): boolean {
  const total = (one: ReadonlyMap<string, number>) =>
    [...one.values()].reduce((sum, count) => sum + count, 0);
  return readings.every((other) => total(counts) <= total(other.counts) + 1e-6);
}
