import type { FieldProblem } from '#common/errors/problem';

/** Problems by the path of their field, relative to the cell: `sites.0.x`. */
export type ProblemsByField = ReadonlyMap<string, readonly FieldProblem[]>;

/** The server names fields from the body's root (`cell.sites.0.x`); the form from the cell. */
function fieldOf(problem: FieldProblem): string {
  return problem.field.replace(/^cell\./, '');
}

/** Collects problems of client and server by field; the same said twice counts once. */
export function problemsByField(...lists: readonly (readonly FieldProblem[])[]): ProblemsByField {
  const map = new Map<string, FieldProblem[]>();
  for (const problem of lists.flat()) {
    const field = fieldOf(problem);
    const known = map.get(field) ?? [];
    if (!known.some((one) => one.code === problem.code)) {
      map.set(field, [...known, { ...problem, field }]);
    }
  }
  return map;
}

/** What to print beside a field, or null. */
export function messageFor(problems: ProblemsByField, field: string): string | null {
  const found = problems.get(field);
  return found === undefined ? null : found.map((problem) => problem.message).join(' ');
}

/** Problems that belong to no field of the form: shown above it. */
export function problemsOutside(
  problems: ProblemsByField,
  isField: (field: string) => boolean,
): readonly FieldProblem[] {
  return [...problems.entries()].filter(([field]) => !isField(field)).flatMap(([, list]) => list);
}
