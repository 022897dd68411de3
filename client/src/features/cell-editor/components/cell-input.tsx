import type { ComponentProps, JSX } from 'react';

import { fieldLook } from '#client/components/field-frame.tsx';
import { classNames } from '#client/lib/class-names.ts';

interface CellInputProps extends Omit<ComponentProps<'input'>, 'onChange'> {
  /** Read aloud; the column says it to the eye. */
  label: string;
  onText: (text: string) => void;
  /** Id of the message that says what is wrong; null when nothing is. */
  errorId: string | null;
}

/** A field of a table: takes a number or an expression, no frame around it. */
export function CellInput({
  label,
  onText,
  errorId,
  className,
  ...rest
}: CellInputProps): JSX.Element {
  return (
    <input
      type="text"
      autoComplete="off"
      autoCapitalize="off"
      spellCheck={false}
      {...rest}
      aria-label={label}
      aria-invalid={errorId === null ? undefined : true}
      aria-describedby={errorId ?? undefined}
      onChange={(event) => onText(event.target.value)}
      className={classNames(
        fieldLook,
        'h-8 min-w-0 px-2 read-only:border-line read-only:bg-wash read-only:text-soft',
        className,
      )}
    />
  );
}
