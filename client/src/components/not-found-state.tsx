import type { JSX, ReactNode } from 'react';

import { ButtonLink } from '#client/components/button.tsx';
import { EmptyState } from '#client/components/empty-state.tsx';

/** There is nothing at this address, or nothing the person may see. */
export function NotFoundState({ children }: { children?: ReactNode }): JSX.Element {
  return (
    <div className="py-10">
      <title>Not found · Holdfast</title>
      <EmptyState title="Nothing stands here" action={<ButtonLink to="/">To the shelf</ButtonLink>}>
        {children ??
          'The address may be mistyped, or what was here is gone or not open to you. Ask for access if a colleague sent the link.'}
      </EmptyState>
    </div>
  );
}
