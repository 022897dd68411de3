import { Ellipsis, Pencil, Tags, Trash2 } from 'lucide-react';
import { useState, type JSX } from 'react';

import type { LatticeSummary } from '#common/schemas/lattice';
import { Button } from '#client/components/button.tsx';
import { Menu, MenuItem, MenuSeparator } from '#client/components/menu.tsx';
import { useDeleteLattice, useRestoreLattice } from '#client/features/shelf/api/change-lattice.ts';
import { RenameDialog } from '#client/features/shelf/components/rename-dialog.tsx';
import { TagsDialog } from '#client/features/shelf/components/tags-dialog.tsx';
import { useCan } from '#client/lib/session.ts';

interface LatticeActionsProps {
  lattice: LatticeSummary;
  workspace: string;
}

const icon = 'size-4 text-soft';

function LatticeMenu({ lattice, workspace }: LatticeActionsProps): JSX.Element | null {
  const can = useCan();
  const remove = useDeleteLattice(workspace);
  const [dialog, setDialog] = useState<'rename' | 'tags' | null>(null);
  const close = (): void => setDialog(null);
  if (!can('lattice.update') && !can('lattice.delete')) {
    return null;
  }
  return (
    <>
      <Menu
        label={`What to do with ${lattice.name}`}
        trigger={<Ellipsis aria-hidden className="size-4" />}
        triggerClassName="inline-grid size-8 place-items-center rounded-control text-soft hover:bg-wash hover:text-ink data-open:bg-wash"
      >
        {can('lattice.update') && (
          <>
            <MenuItem
              icon={<Pencil aria-hidden className={icon} />}
              onSelect={() => setDialog('rename')}
            >
              Rename …
            </MenuItem>
            <MenuItem
              icon={<Tags aria-hidden className={icon} />}
              onSelect={() => setDialog('tags')}
            >
              Tags …
            </MenuItem>
          </>
        )}
        {can('lattice.delete') && (
          <>
            <MenuSeparator />
            <MenuItem
              isDangerous
              icon={<Trash2 aria-hidden className="size-4" />}
              onSelect={() => remove(lattice)}
            >
              Delete
            </MenuItem>
          </>
        )}
      </Menu>
      <RenameDialog {...{ lattice, workspace }} open={dialog === 'rename'} onClose={close} />
      <TagsDialog {...{ lattice, workspace }} open={dialog === 'tags'} onClose={close} />
    </>
  );
}

/** What can be done with a row: its menu, or for a deleted one the way back. */
export function LatticeActions({ lattice, workspace }: LatticeActionsProps): JSX.Element | null {
  const can = useCan();
  const restore = useRestoreLattice(workspace);
  if (lattice.deletedAt === null) {
    return <LatticeMenu lattice={lattice} workspace={workspace} />;
  }
  return can('lattice.restore') ? (
    <Button size="small" onClick={() => restore(lattice)} aria-label={`Restore ${lattice.name}`}>
      Restore
    </Button>
  ) : null;
}
