import {
  addRanges,
  exactly,
  middleOf,
  scaleRange,
  subtractRanges,
  type FormationLine,
} from '#common/physics/energetics/formation-line';
import type { ValueRange } from '#common/schemas/energetics';

/** Why the account does not close yet. */
export interface OpenAccount {
  /** Lines without a number, the one to solve for among them. */
  readonly keys: readonly string[];
  readonly message: string;
  /** A line to solve for instead, with which the account would close at once; null if there is none. */
  readonly solveInstead: string | null;
}

interface ClosedAccount {
  readonly lines: readonly FormationLine[];
  readonly formation: FormationLine;
  readonly open: OpenAccount | null;
  readonly residualKjPerMol: number | null;
}

const sumOf = (lines: readonly FormationLine[]): ValueRange =>
  lines.reduce((sum, line) => addRanges(sum, line.contributionKjPerMol ?? exactly(0)), exactly(0));

function listed(names: readonly string[]): string {
  return names.length < 2 ? names.join('') : `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;
}

function openAccount(missing: readonly FormationLine[], solved: FormationLine): OpenAccount {
  const keys = [solved.key, ...missing.map(({ key }) => key)];
  const names = [...missing, solved].map(({ name }) => name);
  const [only] = missing;
  const canSwap = missing.length === 1 && only !== undefined && solved.known !== null;
  const need =
    missing.length === 1
      ? `Type a value for ${only?.name ?? ''}, or solve for it and give ${solved.name}.`
      : `One can be solved from the rest: type values for ${listed(missing.map(({ name }) => name))}, or leave lines out.`;
  return {
    keys,
    message: `The account is open: ${listed(names)} have no value. ${need}`,
    solveInstead: canSwap ? only.key : null,
  };
}

const isOpen = (line: FormationLine): boolean =>
  !line.isSolved && line.contributionKjPerMol === null;

/**
 * Solves the marked line from the rest: value = (formation − Σ others) / coefficient, or the sum
 * where the formation enthalpy itself is asked for. With any other line missing the account stays
 * open and says which.
 */
export function closeAccount(
  lines: readonly FormationLine[],
  formation: FormationLine,
): ClosedAccount {
  const all = [...lines, formation];
  const solved = all.find(({ isSolved }) => isSolved) ?? formation;
  const missing = all.filter(isOpen);
  if (missing.length > 0) {
    const open = openAccount(missing, solved);
    return { lines, formation, open, residualKjPerMol: null };
  }
  const others = sumOf(lines.filter((line) => line !== solved));
  const contribution =
    solved === formation
      ? others
      : subtractRanges(formation.contributionKjPerMol ?? exactly(0), others);
  const filled: FormationLine = {
    ...solved,
    contributionKjPerMol: contribution,
    valueKjPerMol: scaleRange(contribution, 1 / solved.coefficient),
  };
  const closedLines = lines.map((line) => (line === solved ? filled : line));
  const closedFormation = solved === formation ? filled : formation;
  return {
    lines: closedLines,
    formation: closedFormation,
    open: null,
    residualKjPerMol:
      middleOf(sumOf(closedLines)) - middleOf(closedFormation.contributionKjPerMol ?? exactly(0)),
  };
}
