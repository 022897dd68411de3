import { useRef, type JSX } from 'react';

import { placeEdgeLetters } from '../model/edge-letters.ts';
import type { BlockModel } from '../model/scene-model.ts';
import { useOnFrame, type StageFrames } from './frames.ts';

interface EdgeLettersLayerProps {
  frames: StageFrames;
  model: BlockModel;
  ionScale: number;
}

const letters = ['a', 'b', 'c'] as const;

/** The letters a, b, c on edges of the block, clear of ions. */
export function EdgeLettersLayer({ frames, model, ionScale }: EdgeLettersLayerProps): JSX.Element {
  const layer = useRef<HTMLDivElement>(null);
  useOnFrame(frames, (projection) => {
    const placed = placeEdgeLetters(model.block, ionScale, model.edges, projection);
    for (const element of layer.current?.children ?? []) {
      const spot = placed.find(({ letter }) => letter === element.textContent);
      if (element instanceof HTMLElement) {
        element.style.visibility = spot === undefined ? 'hidden' : 'visible';
        element.style.transform = `translate(${spot?.x ?? 0}px, ${spot?.y ?? 0}px) translate(-50%, -54%)`;
      }
    }
  });
  return (
    <div ref={layer} aria-hidden className="pointer-events-none absolute inset-0 overflow-hidden">
      {letters.map((letter) => (
        <span
          key={letter}
          style={{ visibility: 'hidden' }}
          className="absolute top-0 left-0 rounded-full bg-paper px-1 leading-none font-medium text-ink italic"
        >
          {letter}
        </span>
      ))}
    </div>
  );
}
