import { useQuery } from '@tanstack/react-query';
import { Plus } from 'lucide-react';
import type { JSX } from 'react';

import { ButtonLink } from '#client/components/button.tsx';
import { ErrorState } from '#client/components/error-state.tsx';
import { PageHeader } from '#client/components/page.tsx';
import { Paging } from '#client/components/paging.tsx';
import { shelfPageQuery } from '#client/features/shelf/api/shelf.ts';
import { ShelfCards } from '#client/features/shelf/components/shelf-cards.tsx';
import { ShelfEmpty } from '#client/features/shelf/components/shelf-empty.tsx';
import { ShelfSkeleton } from '#client/features/shelf/components/shelf-skeleton.tsx';
import { ShelfTable } from '#client/features/shelf/components/shelf-table.tsx';
import { ShelfToolbar } from '#client/features/shelf/components/shelf-toolbar.tsx';
import { shelfPageSize, writeShelfView } from '#client/features/shelf/shelf-view.ts';
import { useShelfView } from '#client/features/shelf/use-shelf-view.ts';
import { useCan } from '#client/lib/session.ts';
import { useMedia } from '#client/lib/use-media.ts';

function ShelfBody({ workspace }: { workspace: string }): JSX.Element {
  const [view, change] = useShelfView();
  const isPhone = useMedia('(max-width: 767px)');
  const shelf = useQuery(shelfPageQuery(workspace, view));

  if (shelf.isPending) {
    return <ShelfSkeleton />;
  }
  if (shelf.data === undefined) {
    return (
      <ErrorState
        error={shelf.error}
        title="The shelf could not be fetched"
        onRetry={() => void shelf.refetch()}
      />
    );
  }
  const { items, total } = shelf.data;
  if (items.length === 0) {
    return <ShelfEmpty {...{ workspace, view }} onChange={change} />;
  }
  return (
    <>
      {isPhone ? (
        <ShelfCards workspace={workspace} lattices={items} />
      ) : (
        <ShelfTable
          {...{ workspace, view }}
          lattices={items}
          onSort={change}
          isStale={shelf.isPlaceholderData}
        />
      )}
      <Paging
        page={view.page}
        pageSize={shelfPageSize}
        total={total}
        addressOf={(page) => ({ search: writeShelfView({ ...view, page }) })}
      />
    </>
  );
}

/** All lattices of a workspace: find, sort, open, tidy up. */
export function Shelf({ workspace }: { workspace: string }): JSX.Element {
  const can = useCan();
  const [view, change] = useShelfView();
  const { data } = useQuery(shelfPageQuery(workspace, view));
  return (
    <>
      <PageHeader
        title={view.deleted ? 'Deleted lattices' : 'Lattices'}
        meta={view.deleted ? 'kept for 30 days, then gone for good' : undefined}
        actions={
          can('lattice.create') &&
          !view.deleted && (
            <ButtonLink to={`/w/${workspace}/new`} variant="primary">
              <Plus aria-hidden className="size-4" />
              New lattice
            </ButtonLink>
          )
        }
      />
      <ShelfToolbar {...{ workspace, view }} total={data?.total} onChange={change} />
      <ShelfBody workspace={workspace} />
    </>
  );
}
