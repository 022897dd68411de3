import { CircleAlert } from 'lucide-react';
import type { JSX, ReactNode } from 'react';

import { classNames } from '#client/lib/class-names.ts';

interface FieldFrameProps {
  id: string;
  label: string;
  isLabelHidden?: boolean;
  error?: string | null;
  hint?: ReactNode;
  className?: string;
  children: ReactNode;
}

/** Shared look of everything one can type into. */
export const fieldLook =
  'block w-full rounded-control border border-faint bg-raised text-ink outline-offset-1 ' +
  'hover:border-soft disabled:opacity-55 aria-invalid:border-fails';

/** Ids a field is described by, as far as they exist. */
export function describedBy(id: string, error: unknown, hint: unknown): string | undefined {
  const ids = [error ? `${id}-error` : '', hint ? `${id}-hint` : ''].filter((one) => one !== '');
  return ids.length === 0 ? undefined : ids.join(' ');
}

/** Label above, hint and error below a field. */
export function FieldFrame({
  id,
  label,
  isLabelHidden = false,
  error,
  hint,
  className,
  children,
}: FieldFrameProps): JSX.Element {
  return (
    <div className={classNames('min-w-0', className)}>
      <label
        htmlFor={id}
        className={isLabelHidden ? 'sr-only' : 'mb-1 block text-small font-medium text-ink'}
      >
        {label}
      </label>
      {children}
      {error && (
        <p id={`${id}-error`} className="mt-1 flex gap-1.5 text-small text-fails">
          <CircleAlert aria-hidden className="mt-0.5 size-3.5 shrink-0" />
          <span>{error}</span>
        </p>
      )}
      {hint && (
        <p id={`${id}-hint`} className="mt-1 text-small text-soft">
          {hint}
        </p>
      )}
    </div>
  );
}
