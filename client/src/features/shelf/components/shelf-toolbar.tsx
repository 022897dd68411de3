import { Trash2 } from 'lucide-react';
import type { JSX } from 'react';

import { revisionState, type RevisionState } from '#common/schemas/lattice';
import { Button } from '#client/components/button.tsx';
import { LatticeSearch } from '#client/components/lattice-search.tsx';
import { Segmented } from '#client/components/segmented.tsx';
import { stateWord } from '#client/components/state-badge.tsx';
import type { ShelfView } from '#client/features/shelf/shelf-view.ts';

interface ShelfToolbarProps {
  workspace: string;
  view: ShelfView;
  total: number | undefined;
  onChange: (change: Partial<ShelfView>) => void;
}

const states: readonly { value: RevisionState | 'all'; label: string }[] = [
  { value: 'all', label: 'All' },
  ...revisionState.options.map((state) => ({ value: state, label: stateWord(state) })),
];

function countText(total: number, view: ShelfView): string {
  const noun = total === 1 ? 'lattice' : 'lattices';
  return view.search === '' ? `${total} ${noun}` : `${total} ${noun} for “${view.search}”`;
}

/** Search (on a phone), state filter, how many there are, the way to the deleted ones. */
export function ShelfToolbar({ workspace, view, total, onChange }: ShelfToolbarProps): JSX.Element {
  return (
    <div className="mt-5 mb-3 flex flex-wrap items-center gap-x-5 gap-y-3">
      <LatticeSearch workspace={workspace} className="w-full md:hidden" />
      <Segmented
        label="State"
        options={states}
        value={view.state ?? 'all'}
        onChange={(state) => onChange({ state: state === 'all' ? undefined : state })}
        className="max-w-full overflow-x-auto"
      />
      <span role="status" className="text-small text-soft">
        {total === undefined ? '' : countText(total, view)}
      </span>
      <Button
        variant="quiet"
        size="small"
        className="ml-auto text-soft"
        aria-pressed={view.deleted}
        onClick={() => onChange({ deleted: !view.deleted, state: undefined })}
      >
        <Trash2 aria-hidden className="size-4" />
        {view.deleted ? 'Back to the shelf' : 'Deleted'}
      </Button>
    </div>
  );
}
