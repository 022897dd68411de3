import type { JSX } from 'react';

import type { RevisionSummary } from '#common/schemas/lattice';
import { RelativeTime } from '#client/components/relative-time.tsx';

/** Why a revision came back, where its author can't miss it. */
export function ReturnReason({
  revision,
}: {
  revision: Pick<
    RevisionSummary,
    'state' | 'number' | 'decidedBy' | 'decidedAt' | 'decisionReason'
  >;
}): JSX.Element | null {
  const { state, number, decidedBy, decidedAt, decisionReason } = revision;
  if (state !== 'returned' || decidedBy === null || decidedAt === null) {
    return null;
  }
  return (
    <div className="mt-3 border-l-3 border-fails bg-wash px-4 py-2.5">
      <p>
        <strong className="font-medium">
          {decidedBy.name} returned revision {number}
        </strong>{' '}
        <span className="text-soft">
          <RelativeTime at={decidedAt} />
        </span>
      </p>
      {decisionReason !== null && <p className="whitespace-pre-wrap">{decisionReason}</p>}
    </div>
  );
}
