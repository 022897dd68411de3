import type { JSX } from 'react';

import type { RevisionState } from '#common/schemas/lattice';

const looks: Record<RevisionState, { word: string; colour: string; shape: JSX.Element }> = {
  draft: {
    word: 'Draft',
    colour: 'text-unjudged',
    shape: <circle cx="6" cy="6" r="4.2" fill="none" stroke="currentColor" strokeWidth="1.6" />,
  },
  in_review: {
    word: 'In review',
    colour: 'text-doubtful',
    shape: <path d="M6 .6 11.4 6 6 11.4.6 6Z" fill="currentColor" />,
  },
  accepted: {
    word: 'Accepted',
    colour: 'text-holds',
    shape: <circle cx="6" cy="6" r="5" fill="currentColor" />,
  },
  returned: {
    word: 'Returned',
    colour: 'text-fails',
    shape: <path d="M11 1.2v9.6L2 6Z" fill="currentColor" />,
  },
};

/** Word of a revision's state, as lists and filters print it. */
export function stateWord(state: RevisionState): string {
  return looks[state].word;
}

/** State of a revision: a word and a shape, never colour alone. */
export function StateBadge({ state }: { state: RevisionState }): JSX.Element {
  const { word, colour, shape } = looks[state];
  return (
    <span className="inline-flex items-center gap-1.5 text-small font-medium whitespace-nowrap">
      <svg aria-hidden viewBox="0 0 12 12" className={`size-3 shrink-0 ${colour}`}>
        {shape}
      </svg>
      {word}
    </span>
  );
}
