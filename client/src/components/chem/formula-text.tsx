import type { JSX } from 'react';

/** A chemical formula with its counts set low: CaF₂. */
export function FormulaText({ formula }: { formula: string }): JSX.Element {
  const parts = formula.split(/((?<=[A-Za-z)\]])\d+(?:\.\d+)?)/);
  return (
    <span className="whitespace-nowrap">
      {parts.map((part, index) =>
        index % 2 === 1 ? (
          <sub key={index} className="leading-none">
            {part}
          </sub>
        ) : (
          part
        ),
      )}
    </span>
  );
}
