import type { CellDefinition, EvaluationMethod } from '#common/schemas/cell';
import type { EnergeticModel } from '#common/schemas/energetics';

/** What is edited: the cell, how it is evaluated and what its energetics need beyond it. */
export interface EditorContent {
  readonly cell: CellDefinition;
  readonly method: EvaluationMethod;
  readonly model: EnergeticModel;
}

/** The editable part of a draft or a revision. */
export const contentOf = ({ cell, method, model }: EditorContent): EditorContent => ({
  cell,
  method,
  model,
});

/** Content with the way back and the way forth. */
export interface EditorHistory {
  readonly past: readonly EditorContent[];
  readonly present: EditorContent;
  readonly future: readonly EditorContent[];
  /** Field of the last edit and when it was, so that typing a word is one step back. */
  readonly last: { readonly field: string; readonly atMs: number } | null;
}

const mergeWithinMs = 1_200;
const depth = 200;

export function startHistory(content: EditorContent): EditorHistory {
  return { past: [], present: content, future: [], last: null };
}

/**
 * A new step. Edits of the same field shortly after one another are one step.
 *
 * @param field name of the field for merging; null for a step that always stands alone
 */
export function pushEdit(
  history: EditorHistory,
  content: EditorContent,
  field: string | null,
  atMs: number,
): EditorHistory {
  if (isSameContent(history.present, content)) {
    return history;
  }
  const isMerged =
    field !== null &&
    history.last?.field === field &&
    atMs - history.last.atMs < mergeWithinMs &&
    history.past.length > 0;
  return {
    past: isMerged ? history.past : [...history.past, history.present].slice(-depth),
    present: content,
    future: [],
    last: field === null ? null : { field, atMs },
  };
}

export function undo(history: EditorHistory): EditorHistory {
  const previous = history.past.at(-1);
  return previous === undefined
    ? history
    : {
        past: history.past.slice(0, -1),
        present: previous,
        future: [history.present, ...history.future],
        last: null,
      };
}

export function redo(history: EditorHistory): EditorHistory {
  const [next, ...future] = history.future;
  return next === undefined
    ? history
    : { past: [...history.past, history.present], present: next, future, last: null };
}

/** Plain JSON with its keys in order. */
function sorted(value: unknown): unknown {
  if (Array.isArray(value)) {
    return value.map(sorted);
  }
  if (typeof value !== 'object' || value === null) {
    return value;
  }
  const entries = Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1));
  return entries.map(([key, one]) => [key, sorted(one)]);
}

/** Whether two contents say the same, in whatever order their keys stand. */
export function isSameContent(one: EditorContent, other: EditorContent): boolean {
  return (
    one === other ||
    (JSON.stringify(canonical(one.cell)) === JSON.stringify(canonical(other.cell)) &&
      one.method.toleranceRelative === other.method.toleranceRelative &&
      one.method.uniformBackground === other.method.uniformBackground &&
      JSON.stringify(sorted(one.model)) === JSON.stringify(sorted(other.model)))
  );
}

/** Keys in one order: JSON from the database may come with another. */
function canonical(cell: CellDefinition): unknown {
  const { a, b, c, alpha, beta, gamma } = cell.lattice;
  return [
    [a, b, c, alpha, beta, gamma],
    cell.symmetry.kind === 'setting' ? cell.symmetry.hallNumber : cell.symmetry.operations,
    cell.parameters.map(({ name, expression }) => [name, expression]),
    cell.sites.map((site) => [
      site.label,
      site.element,
      site.charge,
      site.x,
      site.y,
      site.z,
      site.occupancy,
    ]),
  ];
}
