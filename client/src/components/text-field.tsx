import { useId, type ComponentProps, type JSX, type ReactNode } from 'react';

import { describedBy, FieldFrame, fieldLook } from '#client/components/field-frame.tsx';
import { classNames } from '#client/lib/class-names.ts';

interface TextFieldProps extends Omit<ComponentProps<'input'>, 'size' | 'className'> {
  label: string;
  isLabelHidden?: boolean;
  /** Stands beside the field and names the fix. */
  error?: string | null;
  hint?: ReactNode;
  /** A unit or the like, inside the field at the right. */
  suffix?: ReactNode;
  /** Of the frame around label and field. */
  className?: string;
}

/** A one-line field with label, hint and error. */
export function TextField({
  label,
  isLabelHidden = false,
  error,
  hint,
  suffix,
  className,
  id: givenId,
  ...rest
}: TextFieldProps): JSX.Element {
  const ownId = useId();
  const id = givenId ?? ownId;
  return (
    <FieldFrame {...{ id, label, isLabelHidden, error, hint, className }}>
      <span className="relative block">
        <input
          type="text"
          {...rest}
          id={id}
          aria-invalid={error ? true : undefined}
          aria-describedby={describedBy(id, error, hint)}
          className={classNames(
            fieldLook,
            'h-9 px-3 read-only:bg-paper',
            Boolean(suffix) && 'pr-10',
          )}
        />
        {Boolean(suffix) && (
          <span className="pointer-events-none absolute inset-y-0 right-3 flex items-center text-small text-soft">
            {suffix}
          </span>
        )}
      </span>
    </FieldFrame>
  );
}
