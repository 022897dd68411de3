import { useId, type ComponentProps, type JSX, type ReactNode } from 'react';

import { describedBy, FieldFrame, fieldLook } from '#client/components/field-frame.tsx';
import { classNames } from '#client/lib/class-names.ts';

interface TextAreaFieldProps extends Omit<ComponentProps<'textarea'>, 'className'> {
  label: string;
  isLabelHidden?: boolean;
  error?: string | null;
  hint?: ReactNode;
  className?: string;
}

/** A field for several lines, with label, hint and error. */
export function TextAreaField({
  label,
  isLabelHidden = false,
  error,
  hint,
  className,
  id: givenId,
  ...rest
}: TextAreaFieldProps): JSX.Element {
  const ownId = useId();
  const id = givenId ?? ownId;
  return (
    <FieldFrame {...{ id, label, isLabelHidden, error, hint, className }}>
      <textarea
        rows={3}
        {...rest}
        id={id}
        aria-invalid={error ? true : undefined}
        aria-describedby={describedBy(id, error, hint)}
        className={classNames(fieldLook, 'min-h-20 px-3 py-2')}
      />
    </FieldFrame>
  );
}
