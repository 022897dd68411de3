/** A table of the methods page; cells are plain text. */
export interface MethodTable {
  readonly caption: string;
  readonly heads: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

export type MethodBlock =
  | { readonly kind: 'text'; readonly text: string }
  | { readonly kind: 'formula'; readonly text: string }
  | { readonly kind: 'table'; readonly table: MethodTable };

/** One section; its id is the anchor that other pages link to. */
export interface MethodSection {
  readonly id: string;
  readonly title: string;
  readonly blocks: readonly MethodBlock[];
}

export const say = (text: string): MethodBlock => ({ kind: 'text', text });
export const formula = (text: string): MethodBlock => ({ kind: 'formula', text });
export const tabulate = (
  caption: string,
  heads: readonly string[],
  rows: readonly (readonly string[])[],
): MethodBlock => ({ kind: 'table', table: { caption, heads, rows } });
