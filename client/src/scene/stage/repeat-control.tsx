import type { JSX } from 'react';

import { repeatLimit, type Repeat } from '../model/block.ts';

interface RepeatControlProps {
  repeat: Repeat;
  /** The wanted repeat would draw too many ions; what is shown is less. */
  isCut: boolean;
  onChange: (repeat: Repeat) => void;
}

const axes = ['a', 'b', 'c'] as const;
const counts = Array.from({ length: repeatLimit }, (_, at) => at + 1);

/** How many cells are drawn along a, b and c. */
export function RepeatControl({ repeat, isCut, onChange }: RepeatControlProps): JSX.Element {
  const change = (at: number, value: number): void => {
    const [na, nb, nc] = repeat.map((count, axis) => (axis === at ? value : count));
    onChange([na ?? 1, nb ?? 1, nc ?? 1]);
  };
  return (
    <fieldset className="flex items-center gap-1">
      <legend className="sr-only">Cells drawn</legend>
      <span aria-hidden className="mr-1">
        Repeat
      </span>
      {axes.map((axis, at) => (
        <span key={axis} className="flex items-center gap-1">
          {at > 0 && <span aria-hidden>×</span>}
          <select
            aria-label={`Cells along ${axis}`}
            value={repeat[at]}
            onChange={(event) => change(at, Number(event.target.value))}
            className="h-7 rounded-control border border-line bg-raised px-1 font-medium text-ink"
          >
            {counts.map((count) => (
              <option key={count}>{count}</option>
            ))}
          </select>
        </span>
      ))}
      {isCut && <span className="ml-2">as many as can be drawn</span>}
    </fieldset>
  );
}
