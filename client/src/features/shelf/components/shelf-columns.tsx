import { createColumnHelper, rowSortingFeature, tableFeatures } from '@tanstack/react-table';

import type { LatticeSummary } from '#common/schemas/lattice';
import { FormulaText } from '#client/components/chem/formula-text.tsx';
import { PersonBadge } from '#client/components/person-badge.tsx';
import { RelativeTime } from '#client/components/relative-time.tsx';
import {
  EnergyCell,
  MadelungCell,
  Missing,
  NameCell,
  SpaceGroupCell,
  StateCell,
} from '#client/features/shelf/components/lattice-cells.tsx';
import { LatticeActions } from '#client/features/shelf/components/lattice-actions.tsx';

interface ShelfColumnMeta {
  /** On header and cells alike: alignment, and from which width the column is there. */
  className?: string;
}

const columnMeta: ShelfColumnMeta = {};

/** The server sorts and pages; the table keeps the columns and which one sorts. */
export const shelfFeatures = tableFeatures({
  rowSortingFeature,
  columnMeta,
});

const helper = createColumnHelper<typeof shelfFeatures, LatticeSummary>();
const numeric = 'text-right';

/** Columns of the shelf; the id of one that sorts is the API's name of the order. */
export const shelfColumns = (workspace: string, isDeletedView: boolean) =>
  helper.columns([
    helper.accessor('name', {
      header: 'Name',
      meta: { className: 'min-w-36 lg:min-w-48' },
      cell: ({ row }) => (
        <NameCell
          lattice={row.original}
          address={isDeletedView ? null : `/w/${workspace}/lattices/${row.original.id}`}
        />
      ),
    }),
    helper.accessor('formula', {
      header: 'Formula',
      cell: ({ row }) =>
        row.original.formula === null ? (
          <Missing what="no formula" />
        ) : (
          <FormulaText formula={row.original.formula} />
        ),
    }),
    helper.accessor('prototype', {
      header: 'Structure type',
      enableSorting: false,
      meta: { className: 'max-[1320px]:hidden' },
      cell: ({ row }) =>
        row.original.prototype === null ? (
          <Missing what="no structure type" />
        ) : (
          <span className="whitespace-nowrap">{row.original.prototype.replaceAll('-', ' ')}</span>
        ),
    }),
    helper.display({
      id: 'spaceGroup',
      header: 'Space group',
      enableSorting: true,
      meta: { className: 'max-lg:hidden' },
      cell: ({ row }) => <SpaceGroupCell lattice={row.original} />,
    }),
    helper.display({
      id: 'madelung',
      header: 'M, reduced',
      meta: { className: `${numeric} max-wide:hidden` },
      cell: ({ row }) => <MadelungCell lattice={row.original} />,
    }),
    helper.display({
      id: 'energy',
      header: 'eV per formula unit',
      meta: { className: numeric },
      cell: ({ row }) => <EnergyCell lattice={row.original} />,
    }),
    helper.accessor('state', {
      header: 'State',
      cell: ({ row }) => <StateCell lattice={row.original} />,
    }),
    helper.accessor((lattice) => lattice.author.name, {
      id: 'author',
      header: 'Author',
      meta: { className: 'max-[1320px]:hidden' },
      cell: ({ row }) => <PersonBadge {...row.original.author} />,
    }),
    helper.accessor('updatedAt', {
      id: 'updated',
      header: isDeletedView ? 'Deleted' : 'Changed',
      sortDescFirst: true,
      meta: { className: 'text-soft' },
      cell: ({ row }) => <RelativeTime at={row.original.deletedAt ?? row.original.updatedAt} />,
    }),
    helper.display({
      id: 'actions',
      header: '',
      enableSorting: false,
      meta: { className: 'w-0 pl-0 text-right' },
      cell: ({ row }) => <LatticeActions lattice={row.original} workspace={workspace} />,
    }),
  ]);
