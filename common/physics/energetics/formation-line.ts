import type { Sourced } from '#common/chemistry/sourced';
import type {
  FormationParticle,
  FormationStepKind,
} from '#common/physics/energetics/formation-steps';
import type { ValueRange } from '#common/schemas/energetics';

/** `heat` turns a model's lattice energy into an enthalpy; it is never typed, left out or solved. */
export type FormationLineKind = FormationStepKind | 'lattice' | 'heat' | 'formation';

/** Where a line's number comes from. */
export type FormationOrigin =
  | 'table'
  /** A table value that the workspace replaced by its own. */
  | 'workspace'
  /** Typed over the tables for this lattice. */
  | 'typed'
  | 'model'
  | 'measured'
  /** Follows from formula and temperature alone. */
  | 'computed'
  /** What closes the account. */
  | 'solved'
  /** No number anywhere. */
  | 'missing';

/** A number with where it comes from; what a line would show if it were not solved, say. */
export interface KnownValue {
  /** kJ per mole of the step: of atoms or ions, or of formula units for lattice and formation. */
  readonly valueKjPerMol: ValueRange;
  readonly origin: FormationOrigin;
  readonly source: string;
  readonly status: Sourced['status'] | null;
}

/** One line of the account. */
export interface FormationLine {
  /** `atomisation:Na`, `ionisation:Na:1`, `affinity:O:2`, `lattice`, `formation`; `heat` is not stored. */
  readonly key: string;
  readonly kind: FormationLineKind;
  /** Null for lattice, heat and formation. */
  readonly element: string | null;
  /** In words, lower case: `second ionisation of magnesium`. */
  readonly name: string;
  readonly from: readonly FormationParticle[];
  readonly to: readonly FormationParticle[];
  /** Moles of the step per mole of formula units. */
  readonly coefficient: number;
  /** kJ per mole of the step; null where there is none. */
  readonly valueKjPerMol: ValueRange | null;
  /** coefficient × value per mole of formula units; 0 for a line left out; null where there is none. */
  readonly contributionKjPerMol: ValueRange | null;
  /** Sum of this line and all above it; null from the first open line on. */
  readonly runningKjPerMol: ValueRange | null;
  /** What kind of number the value is. */
  readonly quantity: 'enthalpy_298' | 'energy_0';
  readonly origin: FormationOrigin;
  readonly source: string;
  readonly status: Sourced['status'] | null;
  /** Why there is no number, and what would give one. */
  readonly reason: string | null;
  /** Beside the name: `½ D of Cl₂`, `from white phosphorus`. */
  readonly remark: string | null;
  readonly isExcluded: boolean;
  readonly isSolved: boolean;
  readonly isTyped: boolean;
  /** What the line would be without the typed value, and beside the solved one for comparison. */
  readonly known: KnownValue | null;
  /** Whether the value may be typed, the line left out, and solved for. */
  readonly mayType: boolean;
  readonly mayExclude: boolean;
}

export const exactly = (value: number): ValueRange => ({ low: value, high: value });

export const addRanges = (a: ValueRange, b: ValueRange): ValueRange => ({
  low: a.low + b.low,
  high: a.high + b.high,
});

/** a − b, where the two are independent. */
export const subtractRanges = (a: ValueRange, b: ValueRange): ValueRange => ({
  low: a.low - b.high,
  high: a.high - b.low,
});

/** A range times a factor ≥ 0. */
export const scaleRange = (range: ValueRange, factor: number): ValueRange => ({
  low: range.low * factor,
  high: range.high * factor,
});

export const middleOf = ({ low, high }: ValueRange): number => low + (high - low) / 2;
