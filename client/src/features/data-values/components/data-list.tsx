import type { JSX } from 'react';

import { Button } from '#client/components/button.tsx';
import { EmptyState } from '#client/components/empty-state.tsx';
import { Paging } from '#client/components/paging.tsx';
import {
  dataColumns,
  DataRowItem,
} from '#client/features/data-values/components/data-row-item.tsx';
import type { DataRow } from '#client/features/data-values/model/data-rows.ts';
import { writeDataView, type DataView } from '#client/features/data-values/model/data-view.ts';

const pageSize = 50;

interface DataListProps {
  /** All rows in view, on whatever page. */
  rows: readonly DataRow[];
  view: DataView;
  onEdit: ((row: DataRow) => void) | null;
  /** Shows everything again. */
  onClear: () => void;
}

function NothingFound({ view, onClear }: Pick<DataListProps, 'view' | 'onClear'>): JSX.Element {
  const isNoneOurs = view.isOwnOnly && view.search === '' && view.kind === 'all';
  return (
    <EmptyState
      title={isNoneOurs ? 'No value of our own' : 'No such value'}
      action={<Button onClick={onClear}>Show all values</Button>}
    >
      {isNoneOurs
        ? 'Everything is computed with the shipped tables.'
        : 'Search for an element, an ion, or a quantity.'}
    </EmptyState>
  );
}

/** A page of quantities with their values. */
export function DataList({ rows, view, onEdit, onClear }: DataListProps): JSX.Element {
  if (rows.length === 0) {
    return <NothingFound view={view} onClear={onClear} />;
  }
  const page = Math.min(view.page, Math.ceil(rows.length / pageSize));
  return (
    <>
      <div
        aria-hidden
        className={`mt-5 hidden border-b border-line pb-2 text-small text-soft ${dataColumns}`}
      >
        <span>Of</span>
        <span>Value</span>
        <span>Source</span>
      </div>
      <ul
        aria-label="Values"
        className="rule-list border-b border-line max-md:mt-4 max-md:border-t"
      >
        {rows.slice((page - 1) * pageSize, page * pageSize).map((row) => (
          <DataRowItem key={row.key} row={row} onEdit={onEdit} />
        ))}
      </ul>
      <Paging
        page={page}
        pageSize={pageSize}
        total={rows.length}
        addressOf={(target) => ({ search: writeDataView({ ...view, page: target }).toString() })}
      />
    </>
  );
}
