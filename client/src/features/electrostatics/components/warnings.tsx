import { TriangleAlert } from 'lucide-react';
import type { JSX } from 'react';

import type { Warning } from '#common/schemas/evaluation';

/** What a reader of the numbers should know before using them. */
export function Warnings({ warnings }: { warnings: readonly Warning[] }): JSX.Element | null {
  if (warnings.length === 0) {
    return null;
  }
  return (
    <ul aria-label="Cautions" className="mt-4 grid gap-1.5">
      {warnings.map((warning) => (
        <li
          key={`${warning.code}${warning.message}`}
          className="flex gap-2 border-l-3 border-doubtful bg-wash px-3 py-2 text-small"
        >
          <TriangleAlert aria-hidden className="mt-0.5 size-4 shrink-0 text-doubtful" />
          <span>{warning.message}</span>
        </li>
      ))}
    </ul>
  );
}
