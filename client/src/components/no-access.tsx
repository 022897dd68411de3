import { LockKeyhole } from 'lucide-react';
import type { JSX, ReactNode } from 'react';

/** In the place of what the person's role does not open; says whom to ask. */
export function NoAccess({ children }: { children: ReactNode }): JSX.Element {
  return (
    <div className="px-4 py-16 text-center">
      <LockKeyhole aria-hidden className="mx-auto mb-3 size-7 text-soft" strokeWidth={1.6} />
      <p className="mx-auto max-w-md text-soft">{children}</p>
    </div>
  );
}
