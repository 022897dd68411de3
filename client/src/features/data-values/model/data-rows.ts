import { catalogue, shippedValue } from '#common/chemistry/data-catalogue';
import { readDataKey, type DataKey } from '#common/chemistry/data-key';
import { findElement } from '#common/chemistry/elements';
import type { Sourced } from '#common/chemistry/sourced';
import type { OwnDataValue } from '#common/schemas/data-values';
import { formatCharge } from '#common/units/format';
import type { DataView } from '#client/features/data-values/model/data-view.ts';
import { subjectOf } from '#client/features/data-values/model/subject.ts';

/** A tabulated quantity: what is shipped, and what the workspace has in its place. */
export interface DataRow extends DataKey {
  readonly key: string;
  /** Null where the workspace gave a value and none is shipped. */
  readonly shipped: Sourced | null;
  readonly own: OwnDataValue | null;
  /** Symbols of the elements it is about. */
  readonly elements: ReadonlySet<string>;
  /** What a search looks through, in small letters. */
  readonly words: string;
}

const statusWords = {
  verified: 'verified',
  'single-source': 'one source',
  'computed-here': 'computed here',
  'from-memory': 'from memory',
  own: 'ours',
} as const satisfies Record<Sourced['status'], string>;

/** How far a value was verified, in words. */
export const statusWord = (status: Sourced['status']): string => statusWords[status];

function elementsIn(subject: string): Set<string> {
  const symbols = subject.match(/[A-Z][a-z]?/g) ?? [];
  return new Set(symbols.filter((symbol) => findElement(symbol) !== null));
}

function rowOf(key: string, read: DataKey, shipped: Sourced | null): DataRow {
  const elements = elementsIn(read.subject);
  const names = [...elements].map((symbol) => findElement(symbol)?.name ?? '');
  const status = shipped === null ? '' : statusWord(shipped.status);
  const { formulas, detail } = subjectOf(read);
  // Ions as people type them: Fe2+, O2-.
  const ions = formulas.map(({ formula, chargeE }) =>
    `${formula}${formatCharge(chargeE)}`.replace('−', '-'),
  );
  const words = [read.facts.name, read.subject, detail, status, shipped?.source ?? ''];
  return {
    key,
    ...read,
    shipped,
    own: null,
    elements,
    words: [...words, ...ions, ...names].join(' ').toLowerCase(),
  };
}

let shippedRows: readonly DataRow[] | null = null;

/** Every shipped value; the same for everyone, so made once. */
function allShipped(): readonly DataRow[] {
  shippedRows ??= catalogue().map(({ key, facts, subject, shipped }) =>
    rowOf(key, { facts, subject }, shipped),
  );
  return shippedRows;
}

/** A row for a key that the lists lack. */
function extraRow(own: OwnDataValue): DataRow[] {
  const read = readDataKey(own.key);
  return read === null ? [] : [{ ...rowOf(own.key, read, shippedValue(own.key)), own }];
}

/** All shipped values with the workspace's own, those it added first within the list. */
export function dataRows(own: readonly OwnDataValue[]): DataRow[] {
  const byKey = new Map(own.map((value) => [value.key, value]));
  const rows = allShipped().map((row) => {
    const mine = byKey.get(row.key);
    byKey.delete(row.key);
    return mine === undefined ? row : { ...row, own: mine };
  });
  return [...[...byKey.values()].flatMap(extraRow), ...rows];
}

/** Whether a row answers one word: an element's symbol stands for the element and nothing else. */
function answers(row: DataRow, word: string): boolean {
  const element = findElement(word);
  if (element !== null) {
    return row.elements.has(element.symbol);
  }
  return `${row.words} ${row.own?.note.toLowerCase() ?? ''}`.includes(word.toLowerCase());
}

/** The rows that a view shows, on all its pages. */
export function rowsInView(rows: readonly DataRow[], view: DataView): DataRow[] {
  const words = view.search.split(/\s+/).filter(Boolean);
  return rows.filter(
    (row) =>
      (view.kind === 'all' || row.facts.kind === view.kind) &&
      (!view.isOwnOnly || row.own !== null) &&
      words.every((word) => answers(row, word)),
  );
}
