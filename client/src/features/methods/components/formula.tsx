import type { JSX } from 'react';

import {
  formulaLine,
  formulaParts,
  type FormulaPart,
} from '#client/features/methods/model/formula-parts.ts';

function Parts({ parts }: { parts: readonly FormulaPart[] }): JSX.Element {
  return (
    <>
      {parts.map((part, index) => {
        switch (part.kind) {
          case 'text':
            return <span key={index}>{part.text}</span>;
          case 'raised':
            return (
              <sup key={index} className="text-[0.72em] leading-none">
                <Parts parts={part.parts} />
              </sup>
            );
          case 'lowered':
            return (
              <sub key={index} className="text-[0.72em] leading-none">
                <Parts parts={part.parts} />
              </sub>
            );
          case 'fraction':
            return (
              <span key={index} className="mx-1 inline-flex flex-col text-center align-middle">
                <span className="border-b border-current px-1 pb-0.5">
                  <Parts parts={part.above} />
                </span>
                <span className="px-1 pt-0.5">
                  <Parts parts={part.below} />
                </span>
              </span>
            );
        }
      })}
    </>
  );
}

/** A formula on a line of its own; read aloud as one sentence. */
export function Formula({ text }: { text: string }): JSX.Element {
  const parts = formulaParts(text);
  return (
    <p className="my-3 border-l-3 border-line py-1.5 pl-4 text-lead leading-relaxed break-inside-avoid">
      <span className="sr-only">{formulaLine(parts)}</span>
      <span aria-hidden>
        <Parts parts={parts} />
      </span>
    </p>
  );
}
