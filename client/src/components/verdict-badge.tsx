import type { JSX } from 'react';

import type { CheckWord } from '#common/schemas/energetics';

const looks: Record<CheckWord, { word: string; colour: string; shape: JSX.Element }> = {
  holds: {
    word: 'holds',
    colour: 'text-holds',
    shape: <path d="M1 6.4 4.5 10 11 2.4" fill="none" stroke="currentColor" strokeWidth="2.2" />,
  },
  doubtful: {
    word: 'doubtful',
    colour: 'text-doubtful',
    shape: <path d="M6 .6 11.4 6 6 11.4.6 6Z" fill="currentColor" />,
  },
  fails: {
    word: 'fails',
    colour: 'text-fails',
    shape: <path d="M2 2l8 8M10 2l-8 8" fill="none" stroke="currentColor" strokeWidth="2.4" />,
  },
  not_judged: {
    word: 'not judged',
    colour: 'text-unjudged',
    shape: <circle cx="6" cy="6" r="4.2" fill="none" stroke="currentColor" strokeWidth="1.6" />,
  },
};

/** What a check says: a word and a shape, never colour alone. */
export function VerdictBadge({
  word: checkWord,
  isLarge = false,
}: {
  word: CheckWord;
  isLarge?: boolean;
}): JSX.Element {
  const { word, colour, shape } = looks[checkWord];
  const size = isLarge ? 'text-title font-bold' : 'text-small font-medium';
  return (
    <span className={`inline-flex items-center gap-1.5 whitespace-nowrap ${size}`}>
      <svg
        aria-hidden
        viewBox="0 0 12 12"
        className={`shrink-0 ${colour} ${isLarge ? 'size-6' : 'size-3'}`}
      >
        {shape}
      </svg>
      {word}
    </span>
  );
}
