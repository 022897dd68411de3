import { useRef, type JSX } from 'react';

import { drawnRadiusA, positionAt } from '../model/block.ts';
import type { BlockModel } from '../model/scene-model.ts';
import { useOnFrame, type StageFrames } from './frames.ts';

interface RingsLayerProps {
  frames: StageFrames;
  model: BlockModel;
  ionScale: number;
  /** Indices of the picked ions, the latest last. */
  picked: readonly number[];
}

const gapPx = 4;

/** Rings around the picked ions, and a line between two of them. */
export function RingsLayer({ frames, model, ionScale, picked }: RingsLayerProps): JSX.Element {
  const layer = useRef<SVGSVGElement>(null);
  useOnFrame(frames, (projection) => {
    const rings = [...(layer.current?.querySelectorAll('g') ?? [])];
    rings.forEach((ring, at) => {
      const index = picked[at];
      if (index === undefined) {
        return;
      }
      const { x, y, depthA } = projection.toStage(positionAt(model.block, index));
      const radiusPx =
        projection.toPixels(drawnRadiusA(model.block, index, ionScale), depthA) + gapPx;
      for (const circle of ring.children) {
        circle.setAttribute('cx', x.toFixed(1));
        circle.setAttribute('cy', y.toFixed(1));
        circle.setAttribute('r', radiusPx.toFixed(1));
      }
    });
  });
  return (
    <svg
      ref={layer}
      aria-hidden
      className="pointer-events-none absolute inset-0 size-full fill-none"
    >
      {picked.map((index, at) => (
        <g key={index}>
          <circle className="stroke-paper" strokeWidth={5} strokeOpacity={0.85} />
          <circle
            className="stroke-ink"
            strokeWidth={2.25}
            strokeDasharray={at === picked.length - 1 ? undefined : '7 4'}
          />
        </g>
      ))}
    </svg>
  );
}
