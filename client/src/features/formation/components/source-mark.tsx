import { useId, useState, type JSX } from 'react';

import { classNames } from '#client/lib/class-names.ts';

/** Where a value comes from, in a word; hover, focus or a click tells the whole. */
export function SourceMark({
  word,
  lines,
  tone = 'soft',
  label,
}: {
  word: string;
  lines: readonly string[];
  tone?: 'soft' | 'own' | 'missing';
  /** Of which line, for who can't see the row. */
  label: string;
}): JSX.Element {
  const noteId = useId();
  const [isOpen, setOpen] = useState(false);
  return (
    <span
      className="relative inline-block"
      onPointerEnter={() => setOpen(true)}
      onPointerLeave={() => setOpen(false)}
    >
      <button
        type="button"
        aria-label={`${word}: source of ${label}`}
        aria-describedby={isOpen ? noteId : undefined}
        onFocus={() => setOpen(true)}
        onBlur={() => setOpen(false)}
        onClick={() => setOpen(true)}
        onKeyDown={(event) => {
          if (event.key === 'Escape' && isOpen) {
            event.stopPropagation();
            setOpen(false);
          }
        }}
        className={classNames(
          'cursor-help rounded-control text-small whitespace-nowrap underline decoration-faint decoration-dotted underline-offset-4',
          tone === 'soft' && 'text-soft',
          tone === 'own' && 'font-medium text-ink',
          tone === 'missing' && 'text-fails',
        )}
      >
        {word}
      </button>
      {isOpen && (
        <span
          id={noteId}
          role="tooltip"
          className="animate-appear absolute top-full left-0 z-30 mt-1 block w-max max-w-64 rounded-control border border-line bg-raised px-3 py-2 text-left text-small whitespace-normal text-ink shadow-sheet"
        >
          {lines.map((line) => (
            <span key={line} className="block">
              {line}
            </span>
          ))}
        </span>
      )}
    </span>
  );
}
