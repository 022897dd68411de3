import type {
  FormationLevelGroup,
  FormationRise,
} from '#common/physics/energetics/formation-levels';
import { middleOf } from '#common/physics/energetics/formation-line';
import type { ValueRange } from '#common/schemas/energetics';

/** A level drawn as a tread, in px. */
export interface Tread {
  readonly group: FormationLevelGroup;
  readonly from: number;
  readonly to: number;
  readonly y: number;
  /** Height that the range spans, and its upper end. */
  readonly top: number;
  readonly spread: number;
  /** True where the words stand above, since what comes next lies below. */
  readonly isLabelledAbove: boolean;
}

/** A line drawn as a riser from the level before to the level after. */
export interface Riser {
  readonly rise: FormationRise;
  readonly number: number;
  readonly x: number;
  readonly width: number;
  readonly from: number;
  readonly to: number;
}

export interface LevelLayout {
  readonly width: number;
  readonly height: number;
  readonly zeroY: number;
  readonly treads: readonly Tread[];
  readonly risers: readonly Riser[];
}

/** Room above and below for the words of the outermost levels. */
const margin = { top: 62, bottom: 52 } as const;
const widestRiser = 22;

function extent(groups: readonly FormationLevelGroup[]): ValueRange {
  const ranges = groups.flatMap(({ energyKjPerMol, rises }) => [
    energyKjPerMol,
    ...rises.map((rise) => rise.toKjPerMol),
  ]);
  return {
    low: Math.min(0, ...ranges.map(({ low }) => low)),
    high: Math.max(0, ...ranges.map(({ high }) => high)),
  };
}

/** Widths of treads and of the slots that risers stand in: what the treads leave is shared. */
function shares(groups: readonly FormationLevelGroup[], width: number) {
  const count = groups.reduce((sum, { rises }) => sum + rises.length, 0);
  const least = width < 480 ? 56 : 76;
  const slot = Math.max(8, Math.min(34, (width - least * groups.length) / Math.max(1, count)));
  return { slot, tread: (width - slot * count) / groups.length };
}

/**
 * Levels as treads and lines as risers, from left to right, on one scale of energy.
 *
 * @param groups levels with the lines that lead on
 * @param numbers place of each line in the account
 */
export function layOutLevels(
  groups: readonly FormationLevelGroup[],
  numbers: ReadonlyMap<string, number>,
  width: number,
  height: number,
): LevelLayout {
  const { low, high } = extent(groups);
  const inner = height - margin.top - margin.bottom;
  const yOf = (energy: number): number =>
    margin.top + (high > low ? (inner * (high - energy)) / (high - low) : inner / 2);
  const { slot, tread } = shares(groups, width);
  const treads: Tread[] = [];
  const risers: Riser[] = [];
  let x = 0;
  let before = 0;
  for (const group of groups) {
    const { energyKjPerMol, rises } = group;
    const y = yOf(middleOf(energyKjPerMol));
    const next = rises.at(-1)?.toKjPerMol;
    const after = next === undefined ? 0 : middleOf(next) - middleOf(energyKjPerMol);
    treads.push({
      group,
      from: x,
      to: x + tread,
      y,
      top: yOf(energyKjPerMol.high),
      spread: yOf(energyKjPerMol.low) - yOf(energyKjPerMol.high),
      isLabelledAbove: after < 0 || (after === 0 && before > 0),
    });
    x += tread;
    for (const rise of rises) {
      risers.push({
        rise,
        number: numbers.get(rise.line.key) ?? 0,
        x: x + slot / 2,
        width: Math.min(widestRiser, slot * 0.72),
        from: yOf(middleOf(rise.fromKjPerMol)),
        to: yOf(middleOf(rise.toKjPerMol)),
      });
      x += slot;
    }
    before = after;
  }
  return { width, height, zeroY: yOf(0), treads, risers };
}
