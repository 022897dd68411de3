import { useTable, type SortingState, type Updater } from '@tanstack/react-table';
import { ArrowDown, ArrowUp } from 'lucide-react';
import { useMemo, type JSX, type MouseEvent } from 'react';
import { useNavigate } from 'react-router-dom';

import { shelfSort, type LatticeSummary } from '#common/schemas/lattice';
import { shelfColumns, shelfFeatures } from '#client/features/shelf/components/shelf-columns.tsx';
import type { ShelfView } from '#client/features/shelf/shelf-view.ts';
import { classNames } from '#client/lib/class-names.ts';

interface ShelfTableProps {
  workspace: string;
  lattices: LatticeSummary[];
  view: ShelfView;
  onSort: (sort: Pick<ShelfView, 'sort' | 'order'>) => void;
  isStale: boolean;
}

interface SortHeaderProps {
  title: string;
  direction: 'asc' | 'desc' | false;
  isEnd: boolean;
  onToggle: () => void;
}

function SortHeader({ title, direction, isEnd, onToggle }: SortHeaderProps): JSX.Element {
  const Arrow = direction === 'asc' ? ArrowUp : ArrowDown;
  return (
    <button
      type="button"
      onClick={onToggle}
      className={classNames(
        'group inline-flex items-center gap-1 rounded-control align-middle hover:text-ink',
        direction !== false && 'font-medium text-ink',
        isEnd && 'flex-row-reverse',
      )}
    >
      {title}
      <Arrow
        aria-hidden
        className={classNames(
          'size-3.5',
          direction === false && 'opacity-0 group-hover:opacity-60 group-focus-visible:opacity-60',
        )}
      />
    </button>
  );
}

/** Whether a click in a row was meant for something in it, or marked text. */
function isForSomethingElse(event: MouseEvent<HTMLElement>): boolean {
  const target = event.target as HTMLElement;
  return (
    // Menus and dialogs of a row are drawn elsewhere, yet their clicks come through React.
    !event.currentTarget.contains(target) ||
    target.closest('a, button, [role="menuitem"], [role="dialog"]') !== null ||
    window.getSelection()?.toString() !== ''
  );
}

function useShelfTable({ workspace, lattices, view, onSort }: ShelfTableProps) {
  const columns = useMemo(() => shelfColumns(workspace, view.deleted), [workspace, view.deleted]);
  const sorting: SortingState = useMemo(
    () => [{ id: view.sort, desc: view.order === 'desc' }],
    [view.sort, view.order],
  );
  return useTable({
    features: shelfFeatures,
    columns,
    data: lattices,
    getRowId: (lattice) => lattice.id,
    manualSorting: true,
    enableSortingRemoval: false,
    state: { sorting },
    onSortingChange: (change: Updater<SortingState>) => {
      const [next] = typeof change === 'function' ? change(sorting) : change;
      const sort = shelfSort.safeParse(next?.id);
      if (next !== undefined && sort.success) {
        onSort({ sort: sort.data, order: next.desc ? 'desc' : 'asc' });
      }
    },
  });
}

type ShelfModel = ReturnType<typeof useShelfTable>;
type ShelfHeader = ReturnType<ShelfModel['getHeaderGroups']>[number]['headers'][number];

const cellLook = 'py-2 pr-5 align-middle first:pl-2 last:pr-2';
const ariaSort = { asc: 'ascending', desc: 'descending' } as const;

function Heading({ header: { column } }: { header: ShelfHeader }): JSX.Element {
  const { header, meta, enableSorting, sortDescFirst } = column.columnDef;
  const title = String(header ?? '');
  const direction = column.getIsSorted();
  const toggle = (): void =>
    column.toggleSorting(direction === false ? sortDescFirst === true : direction === 'asc');
  const plain = title === '' ? <span className="sr-only">Actions</span> : title;
  return (
    <th
      scope="col"
      aria-sort={direction === false ? undefined : ariaSort[direction]}
      className={classNames(cellLook, 'font-normal whitespace-nowrap', meta?.className)}
    >
      {enableSorting === false ? (
        plain
      ) : (
        <SortHeader
          {...{ title, direction }}
          isEnd={meta?.className?.includes('text-right') === true}
          onToggle={toggle}
        />
      )}
    </th>
  );
}

function Body({
  table,
  onOpen,
}: {
  table: ShelfModel;
  /** Missing where a row can't be opened. */
  onOpen?: (id: string) => void;
}): JSX.Element {
  return (
    <tbody>
      {table.getRowModel().rows.map((row) => (
        <tr
          key={row.id}
          onClick={(event) => {
            if (!isForSomethingElse(event)) {
              onOpen?.(row.id);
            }
          }}
          className={classNames(
            'h-13 border-b border-line hover:bg-raised',
            onOpen !== undefined && 'cursor-pointer',
          )}
        >
          {row.getAllCells().map((cell) => (
            <td
              key={cell.id}
              className={classNames(cellLook, cell.column.columnDef.meta?.className)}
            >
              <table.FlexRender cell={cell} />
            </td>
          ))}
        </tr>
      ))}
    </tbody>
  );
}

/** The shelf as a table: a header sorts, a row opens. */
export function ShelfTable(props: ShelfTableProps): JSX.Element {
  const { workspace, view, isStale } = props;
  const table = useShelfTable(props);
  const navigate = useNavigate();
  const open = (id: string): void => void navigate(`/w/${workspace}/lattices/${id}`);
  return (
    <div className="-mx-2 overflow-x-auto">
      <table className={classNames('w-full border-collapse text-left', isStale && 'opacity-60')}>
        <caption className="sr-only">Lattices of the workspace</caption>
        <thead className="border-b border-line text-small text-soft">
          {table.getHeaderGroups().map((group) => (
            <tr key={group.id}>
              {group.headers.map((header) => (
                <Heading key={header.id} header={header} />
              ))}
            </tr>
          ))}
        </thead>
        <Body table={table} onOpen={view.deleted ? undefined : open} />
      </table>
    </div>
  );
}
