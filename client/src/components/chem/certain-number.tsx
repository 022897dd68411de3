import { Copy } from 'lucide-react';
import { Fragment, useId, useState, type JSX } from 'react';

import { certainDigits } from '#common/units/certain-digits';
import { formatBound, plainNumberText, THIN_SPACE } from '#common/units/format';
import { useToast } from '#client/components/toast.tsx';
import { classNames } from '#client/lib/class-names.ts';
import { copyText } from '#client/lib/copy-text.ts';

interface CertainNumberProps {
  value: number;
  /** Absolute bound, same unit as the value. */
  bound: number;
  /** Unit after the number; also copied. */
  unit?: string;
  /** What the number means: its convention in one sentence. */
  convention?: string;
  maxDecimals?: number;
  /** Which side the note grows from; `end` near the right edge. */
  align?: 'start' | 'end';
  /** Leaves the unit out of sight; it is still copied and read aloud. */
  isUnitHidden?: boolean;
  className?: string;
}

/** Digits with a gap of fixed width between groups: the font's own thin space is hardly one. */
function Digits({ text }: { text: string }): JSX.Element {
  return (
    <>
      {text.split(THIN_SPACE).map((group, index) => (
        <Fragment key={index}>
          {index > 0 && <span className="inline-block w-[0.22em]">{THIN_SPACE}</span>}
          {group}
        </Fragment>
      ))}
    </>
  );
}

function Note({
  id,
  lines,
  align,
  isCopied = true,
}: {
  id: string;
  lines: readonly string[];
  align: 'start' | 'end';
  /** Whether a click copies what the note is about. */
  isCopied?: boolean;
}): JSX.Element {
  return (
    <span
      id={id}
      role="tooltip"
      className={classNames(
        'animate-appear absolute top-full z-30 mt-1 block w-max max-w-72 rounded-control border border-line bg-raised',
        'px-3 py-2 text-left text-small font-normal tracking-normal whitespace-normal text-ink shadow-sheet',
        align === 'end' ? 'right-0' : 'left-0',
      )}
    >
      {lines.map((line) => (
        <span key={line} className="block">
          {line}
        </span>
      ))}
      {isCopied && (
        <span className="mt-1 flex items-center gap-1.5 text-soft">
          <Copy aria-hidden className="size-3.5" /> Click copies it with its unit.
        </span>
      )}
    </span>
  );
}

/** A number that ends where its certainty ends; hover or focus says why, a click copies it. */
export function CertainNumber({
  value,
  bound,
  unit = '',
  convention,
  maxDecimals,
  align = 'start',
  isUnitHidden = false,
  className,
}: CertainNumberProps): JSX.Element {
  const show = useToast();
  const noteId = useId();
  const [isOpen, setOpen] = useState(false);
  const { text } = certainDigits(value, bound, maxDecimals);
  const copied = `${plainNumberText(text)}${unit === '' ? '' : ` ${unit}`}`;
  const certainty = `certain to ± ${formatBound(bound)}${unit === '' ? '' : ` ${unit}`}`;
  const lines = convention === undefined ? [certainty] : [convention, certainty];

  const copy = (): void => {
    copyText(copied).then(
      () => show({ message: `Copied ${copied}` }),
      () => show({ message: 'The browser did not allow copying.', tone: 'failure' }),
    );
  };
  return (
    <span
      className={classNames('relative inline-block', className)}
      onPointerEnter={() => setOpen(true)}
      onPointerLeave={() => setOpen(false)}
    >
      <button
        type="button"
        aria-describedby={isOpen ? noteId : undefined}
        onFocus={() => setOpen(true)}
        onBlur={() => setOpen(false)}
        onKeyDown={(event) => {
          if (event.key === 'Escape' && isOpen) {
            event.stopPropagation();
            setOpen(false);
          }
        }}
        onClick={copy}
        className="cursor-copy rounded-control text-left whitespace-nowrap decoration-faint decoration-dotted decoration-1 underline-offset-4 hover:underline"
      >
        <Digits text={text} />
        {unit !== '' && (
          <>
            {' '}
            <span className={isUnitHidden ? 'sr-only' : 'text-soft'}>{unit}</span>
          </>
        )}
      </button>
      {isOpen && <Note id={noteId} lines={lines} align={align} />}
    </span>
  );
}

/** The same digits without the note, for cells of a table; the bound is in the title. */
export function CertainText({
  value,
  bound,
  unit = '',
  maxDecimals,
}: Pick<CertainNumberProps, 'value' | 'bound' | 'unit' | 'maxDecimals'>): JSX.Element {
  const { text } = certainDigits(value, bound, maxDecimals);
  return (
    <span
      className="whitespace-nowrap"
      title={`certain to ± ${formatBound(bound)}${unit === '' ? '' : ` ${unit}`}`}
    >
      <Digits text={text} />
    </span>
  );
}

/** In place of a number that means nothing here; hover or focus says why. */
export function NoNumber({
  reason,
  align = 'start',
}: {
  reason: string;
  align?: 'start' | 'end';
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
        aria-label={`not defined: ${reason}`}
        onFocus={() => setOpen(true)}
        onBlur={() => setOpen(false)}
        onClick={() => setOpen(true)}
        className="cursor-help rounded-control text-body font-normal text-soft underline decoration-faint decoration-dotted underline-offset-4"
      >
        not defined
      </button>
      {isOpen && <Note id={noteId} lines={[reason]} align={align} isCopied={false} />}
    </span>
  );
}
