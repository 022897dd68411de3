import type { JSX } from 'react';

import { Button, ButtonLink } from '#client/components/button.tsx';
import { EmptyState } from '#client/components/empty-state.tsx';
import { isFiltered, type ShelfView } from '#client/features/shelf/shelf-view.ts';
import { useCan } from '#client/lib/session.ts';

interface ShelfEmptyProps {
  workspace: string;
  view: ShelfView;
  onChange: (change: Partial<ShelfView>) => void;
}

/** An empty shelf, and why: nothing found, nothing deleted, nothing yet. */
export function ShelfEmpty({ workspace, view, onChange }: ShelfEmptyProps): JSX.Element {
  const can = useCan();
  if (view.page > 1) {
    return (
      <EmptyState
        title="The shelf is not that long"
        action={<Button onClick={() => onChange({ page: 1 })}>To the first page</Button>}
      />
    );
  }
  if (isFiltered(view)) {
    return (
      <EmptyState
        title="Nothing fits"
        action={
          <Button onClick={() => onChange({ search: '', state: undefined })}>
            Show all lattices
          </Button>
        }
      >
        No lattice has this in its name, formula or tags in the chosen state.
      </EmptyState>
    );
  }
  if (view.deleted) {
    return (
      <EmptyState title="Nothing is deleted">
        A deleted lattice stays here for 30 days and can be put back.
      </EmptyState>
    );
  }
  return can('lattice.create') ? (
    <EmptyState
      title="The shelf is empty"
      action={
        <ButtonLink to={`/w/${workspace}/new`} variant="primary">
          New lattice
        </ButtonLink>
      }
    >
      Start from a structure type such as rock salt or rutile, from a CIF, or from a blank cell.
    </EmptyState>
  ) : (
    <EmptyState title="The shelf is empty">
      Lattices appear here when a crystallographer of this workspace saves the first one.
    </EmptyState>
  );
}
