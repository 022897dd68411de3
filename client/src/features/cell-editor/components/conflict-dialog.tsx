import type { JSX } from 'react';

import type { Draft } from '#common/schemas/lattice';
import { Button } from '#client/components/button.tsx';
import { Dialog } from '#client/components/dialog.tsx';
import { RelativeTime } from '#client/components/relative-time.tsx';
import { differences } from '#client/features/cell-editor/model/content-difference.ts';
import {
  contentOf,
  type EditorContent,
} from '#client/features/cell-editor/model/editor-history.ts';

interface ConflictDialogProps {
  theirs: Draft | null;
  mine: EditorContent;
  onTakeTheirs: () => void;
  onKeepMine: () => void;
}

const shown = 12;

function Differences({ mine, theirs }: { mine: EditorContent; theirs: Draft }): JSX.Element {
  const list = differences(mine, contentOf(theirs));
  return (
    <div className="max-h-80 overflow-auto">
      <table className="w-full border-collapse text-small">
        <thead>
          <tr className="border-b border-line text-left text-soft">
            <th scope="col" className="py-1.5 pr-3 font-normal">
              where
            </th>
            <th scope="col" className="pr-3 font-normal">
              yours
            </th>
            <th scope="col" className="font-normal">
              theirs
            </th>
          </tr>
        </thead>
        <tbody className="rule-list">
          {list.slice(0, shown).map((one) => (
            <tr key={one.field}>
              <th scope="row" className="py-1.5 pr-3 text-left font-medium">
                {one.field}
              </th>
              <td className="pr-3">{one.mine}</td>
              <td>{one.theirs}</td>
            </tr>
          ))}
        </tbody>
      </table>
      {list.length > shown && (
        <p className="pt-2 text-small text-soft">and {list.length - shown} more places</p>
      )}
    </div>
  );
}

/** Two people edited the same draft: nothing is overwritten until one of them decides. */
export function ConflictDialog(props: ConflictDialogProps): JSX.Element {
  const { theirs, mine } = props;
  const name = theirs?.updatedBy?.name ?? 'Someone else';
  return (
    <Dialog
      open={theirs !== null}
      // Closing without a choice would leave the edit unsaved: one of the two it must be.
      onClose={() => undefined}
      title={`${name} changed this draft too`}
      width="wide"
      footer={
        <>
          <Button onClick={props.onTakeTheirs}>Take theirs</Button>
          <Button variant="primary" onClick={props.onKeepMine}>
            Keep mine
          </Button>
        </>
      }
    >
      {theirs !== null && (
        <div className="grid gap-4">
          <p>
            {name} saved an edit{' '}
            {theirs.updatedAt !== null && <RelativeTime at={theirs.updatedAt} />} while you were
            editing. Keep mine replaces their draft with yours; take theirs drops your edit (undo
            brings it back).
          </p>
          <Differences mine={mine} theirs={theirs} />
        </div>
      )}
    </Dialog>
  );
}
