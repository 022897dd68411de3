import type { JSX, ReactNode } from 'react';

import type { RevisionState } from '#common/schemas/lattice';
import { FormulaText } from '#client/components/chem/formula-text.tsx';
import { SpaceGroupText } from '#client/components/chem/space-group-text.tsx';
import { StateBadge } from '#client/components/state-badge.tsx';

export interface LatticeMeta {
  readonly formula: string | null;
  /** Structure type it was started from: `rock-salt`. */
  readonly prototype: string | null;
  readonly spaceGroup: { symbol: string; number: number } | null;
  /** 0 when nothing is saved yet. */
  readonly revision: number;
  readonly state: RevisionState;
  /** There are edits on top of the revision. */
  readonly isEdited: boolean;
}

function revisionWords({ revision, isEdited }: LatticeMeta): string {
  if (revision === 0) {
    return 'not saved as a revision yet';
  }
  return isEdited ? `edited since revision ${revision}` : `revision ${revision}`;
}

/** Title row: name, what it is, how it stands, what one may do. */
export function LatticeHeader({
  name,
  meta,
  actions,
}: {
  name: ReactNode;
  meta: LatticeMeta;
  actions: ReactNode;
}): JSX.Element {
  return (
    <header className="flex flex-wrap items-center gap-x-4 gap-y-3">
      <div className="flex min-w-0 flex-wrap items-baseline gap-x-6 gap-y-1">
        {name}
        <p className="flex flex-wrap items-center gap-x-3.5 gap-y-1 text-soft">
          {meta.formula !== null && <FormulaText formula={meta.formula} />}
          {meta.prototype !== null && <span>{meta.prototype.replaceAll('-', ' ')}</span>}
          {meta.spaceGroup !== null && (
            <span className="whitespace-nowrap">
              <SpaceGroupText symbol={meta.spaceGroup.symbol} /> · {meta.spaceGroup.number}
            </span>
          )}
          <span>{revisionWords(meta)}</span>
          <span className="text-ink">
            <StateBadge state={meta.isEdited || meta.revision === 0 ? 'draft' : meta.state} />
          </span>
        </p>
      </div>
      <div className="flex flex-wrap gap-2 empty:hidden md:ml-auto">{actions}</div>
    </header>
  );
}
