import { CircleAlert } from 'lucide-react';
import type { JSX } from 'react';

/** What is wrong with a field and how to mend it; nothing when nothing is. */
export function FieldErrors({
  id,
  message,
}: {
  id: string;
  message: string | null;
}): JSX.Element | null {
  return message === null ? null : (
    <p id={id} className="mt-1 flex gap-1.5 text-small text-fails">
      <CircleAlert aria-hidden className="mt-0.5 size-3.5 shrink-0" />
      <span>{message}</span>
    </p>
  );
}
