import { CircleSlash } from 'lucide-react';
import type { JSX, ReactNode } from 'react';

import type { FieldProblem } from '#common/errors/problem';
import { Button } from '#client/components/button.tsx';

interface EvaluationProblemProps {
  problem: { code: string; message: string; fields: readonly FieldProblem[] };
  onRetry?: (() => void) | null;
  /** A way to mend it. */
  action?: ReactNode;
}

/** In place of the numbers: why there are none, and what would give them. */
export function EvaluationProblem({
  problem,
  onRetry = null,
  action,
}: EvaluationProblemProps): JSX.Element {
  return (
    <div role="alert" className="border-l-3 border-fails bg-wash px-4 py-4">
      <h2 className="flex items-center gap-2 text-lead">
        <CircleSlash aria-hidden className="size-4.5 text-fails" />
        No energy for this cell
      </h2>
      <p className="mt-1">{problem.message}</p>
      {problem.fields.length > 0 && (
        <ul className="mt-2 grid list-disc gap-1 pl-5 text-small">
          {problem.fields.map((field) => (
            <li key={`${field.field}${field.code}`}>{field.message}</li>
          ))}
        </ul>
      )}
      <div className="mt-3 flex flex-wrap gap-2 empty:hidden">
        {onRetry !== null && <Button onClick={onRetry}>Try again</Button>}
        {action}
      </div>
    </div>
  );
}
