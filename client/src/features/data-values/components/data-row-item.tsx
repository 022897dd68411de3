import { Pencil } from 'lucide-react';
import type { JSX } from 'react';

import { IconButton } from '#client/components/button.tsx';
import { RelativeTime } from '#client/components/relative-time.tsx';
import { SubjectText } from '#client/features/data-values/components/subject-text.tsx';
import { statusWord, type DataRow } from '#client/features/data-values/model/data-rows.ts';
import { subjectText } from '#client/features/data-values/model/subject.ts';
import { valueText } from '#client/features/data-values/model/value-text.ts';

/** Columns of the list from the tablet on; on a phone each row is a small block. */
export const dataColumns =
  'md:grid md:grid-cols-[minmax(0,5fr)_minmax(0,4fr)_minmax(0,6fr)_2.25rem] md:gap-x-5';

function Value({ row: { facts, shipped, own } }: { row: DataRow }): JSX.Element {
  const unit = facts.unit !== '' && <span className="text-soft"> {facts.unit}</span>;
  if (own === null) {
    return (
      <span className="tabular-nums">
        {shipped === null ? '–' : valueText(shipped.value, facts.unit)}
        {unit}
      </span>
    );
  }
  return (
    <span className="tabular-nums">
      <span className="font-medium">{valueText(own.value, facts.unit)}</span>
      {unit}{' '}
      <span className="ml-1 rounded-control border border-bind px-1.5 text-small whitespace-nowrap text-bind">
        ours
      </span>
      <span className="block text-small text-soft">
        {shipped === null ? 'none shipped' : `shipped: ${valueText(shipped.value, facts.unit)}`}
      </span>
    </span>
  );
}

function Origin({ row: { shipped, own } }: { row: DataRow }): JSX.Element {
  if (own !== null) {
    return (
      <span className="min-w-0">
        <span className="block break-words">{own.note === '' ? 'No source given' : own.note}</span>
        <span className="block text-small text-soft">
          {own.setBy.name}, <RelativeTime at={own.setAt} />
        </span>
      </span>
    );
  }
  return (
    <span className="min-w-0">
      <span className="block break-words">{shipped?.source}</span>
      {shipped !== null && (
        <span
          className={`block text-small ${shipped.status === 'from-memory' ? 'text-oppose' : 'text-soft'}`}
        >
          {statusWord(shipped.status)}
        </span>
      )}
    </span>
  );
}

/** One quantity: what of, value, where it comes from, and the way to the workspace's own. */
export function DataRowItem({
  row,
  onEdit,
}: {
  row: DataRow;
  /** Null for those who may only read. */
  onEdit: ((row: DataRow) => void) | null;
}): JSX.Element {
  return (
    <li className={`relative grid gap-y-1 py-3 pr-11 md:pr-0 ${dataColumns}`}>
      <span className="min-w-0">
        <SubjectText of={row} />
        <span className="block text-small text-soft">{row.facts.name}</span>
      </span>
      <Value row={row} />
      <Origin row={row} />
      {onEdit !== null && (
        <IconButton
          label={`${row.own === null ? 'Put our own value' : 'Change our value'}: ${row.facts.name} of ${subjectText(row)}`}
          icon={<Pencil aria-hidden className="size-4" />}
          onClick={() => onEdit(row)}
          className="absolute top-2.5 right-0 md:static"
        />
      )}
    </li>
  );
}
