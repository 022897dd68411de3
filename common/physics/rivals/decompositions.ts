/** Ions of one formula unit: whole counts by species key (`Mg+2`). */
export type IonCounts = Readonly<Record<string, number>>;

/** A way to write one formula unit as amounts of salts. */
export interface Decomposition {
  /** Index into the salts, with the exact positive amount numerator / denominator, lowest terms. */
  readonly parts: readonly {
    readonly salt: number;
    readonly numerator: number;
    readonly denominator: number;
  }[];
}

/**
 * Every way to make a formula unit of linearly independent salts, each in a positive amount:
 * Σ_j x_j n_ij = n_i for each ion kind i. Solved exactly, in whole numbers of any length. Mixtures
 * of two answers are answers too and are not listed.
 * @param target ions of one formula unit, whole counts ≥ 0
 * @param salts ions of one formula unit of each salt
 * @throws RangeError when a count is not a whole number ≥ 0, or the target holds no ion
 */
export function decompositions(target: IonCounts, salts: readonly IonCounts[]): Decomposition[] {
  [target, ...salts].forEach(requireWhole);
  const kinds = Object.keys(target).filter((kind) => target[kind]! > 0);
  if (kinds.length === 0) {
    throw new RangeError('A formula unit without ions can not be made of anything.');
  }
  const usable = salts.flatMap((salt, index) => (fitsInto(salt, kinds) ? [index] : []));
  return subsets(usable, kinds.length).flatMap((chosen) => {
    const solved = solve(
      kinds.map((kind) => [
        ...chosen.map((index) => BigInt(salts[index]![kind] ?? 0)),
        BigInt(target[kind]!),
      ]),
    );
    return solved
      ? [{ parts: solved.map((amount, place) => ({ salt: chosen[place]!, ...amount })) }]
      : [];
  });
}

function requireWhole(counts: IonCounts): void {
  for (const [kind, count] of Object.entries(counts)) {
    if (!Number.isSafeInteger(count) || count < 0) {
      throw new RangeError(`${kind} stands ${count} times; it takes a whole number, 0 or more.`);
    }
  }
}

/** A salt can take part when it has ions and none the target lacks. */
function fitsInto(salt: IonCounts, kinds: readonly string[]): boolean {
  const own = Object.keys(salt).filter((kind) => salt[kind]! > 0);
  return own.length > 0 && own.every((kind) => kinds.includes(kind));
}

/** All subsets of 1 … size members, smallest first. */
function subsets(members: readonly number[], size: number): number[][] {
  const found: number[][] = [];
  let last: number[][] = [[]];
  for (let length = 1; length <= size; length += 1) {
    last = last.flatMap((start) =>
      members
        .filter((member) => start.length === 0 || member > start[start.length - 1]!)
        .map((member) => [...start, member]),
    );
    found.push(...last);
  }
  return found;
}

/**
 * Solves rows [coefficients…, right-hand side] by elimination without fractions.
 * @returns null when there is no solution, more than one, or an amount that is not positive
 */
function solve(
  rows: readonly (readonly bigint[])[],
): { numerator: number; denominator: number }[] | null {
  const matrix = rows.map((row) => [...row]);
  const unknowns = matrix[0]!.length - 1;
  for (let column = 0; column < unknowns; column += 1) {
    const pivot = matrix.findIndex((row, index) => index >= column && row[column] !== 0n);
    if (pivot === -1) {
      return null;
    }
    [matrix[column], matrix[pivot]] = [matrix[pivot]!, matrix[column]!];
    clearColumn(matrix, column);
  }
  if (matrix.slice(unknowns).some((row) => row[unknowns] !== 0n)) {
    return null;
  }
  const amounts = matrix.slice(0, unknowns).map((row, index) => {
    const sign = row[index]! < 0n ? -1n : 1n;
    return lowest(sign * row[unknowns]!, sign * row[index]!);
  });
  return amounts.every(({ numerator }) => numerator > 0) ? amounts : null;
}

function clearColumn(matrix: bigint[][], column: number): void {
  const pivotRow = matrix[column]!;
  const pivot = pivotRow[column]!;
  matrix.forEach((row, index) => {
    const factor = row[column]!;
    if (index !== column && factor !== 0n) {
      matrix[index] = row.map((value, place) => value * pivot - pivotRow[place]! * factor);
    }
  });
}

function lowest(numerator: bigint, denominator: bigint) {
  let [a, b] = [numerator < 0n ? -numerator : numerator, denominator];
  while (b !== 0n) {
    [a, b] = [b, a % b];
  }
  return { numerator: Number(numerator / a), denominator: Number(denominator / a) };
}
