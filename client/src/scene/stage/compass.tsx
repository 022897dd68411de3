import { useRef, type JSX } from 'react';

import { compassNeedle, viewDown, viewFrame, type ViewAxis } from '../model/scene-view.ts';
import { useOnFrame, type StageFrames } from './frames.ts';
import type { ViewStore } from './view-store.ts';

interface CompassProps {
  frames: StageFrames;
  store: ViewStore;
  vectorsA: readonly number[];
  className: string;
}

const axes: readonly ViewAxis[] = ['a', 'b', 'c'];
const needlePx = 22;
const letterPx = 30;

/** A disc with the directions of a, b, c in ink; a letter looks down its axis. */
export function Compass({ frames, store, vectorsA, className }: CompassProps): JSX.Element {
  const disc = useRef<SVGSVGElement>(null);
  useOnFrame(frames, () => {
    const frame = viewFrame(store.view);
    axes.forEach((axis, at) => {
      const group = disc.current?.querySelectorAll('g')[at];
      const { x, y, toward } = compassNeedle(frame, vectorsA, axis);
      const [line, text, spot] = [...(group?.children ?? [])];
      line?.setAttribute('x2', (x * needlePx).toFixed(1));
      line?.setAttribute('y2', (y * needlePx).toFixed(1));
      text?.setAttribute('x', (x * letterPx).toFixed(1));
      text?.setAttribute('y', (y * letterPx).toFixed(1));
      spot?.setAttribute('cx', (x * letterPx).toFixed(1));
      spot?.setAttribute('cy', (y * letterPx).toFixed(1));
      group?.setAttribute('opacity', (0.72 + 0.28 * toward).toFixed(2));
    });
  });
  return (
    <svg
      ref={disc}
      data-overlay
      aria-hidden
      viewBox="-42 -42 84 84"
      className={`select-none ${className}`}
    >
      <circle r="40" className="fill-paper stroke-line" fillOpacity={0.8} />
      <circle r="2" className="fill-ink" />
      {axes.map((axis) => (
        <g
          key={axis}
          className="cursor-pointer"
          onClick={() => store.glideToFitted(viewDown(vectorsA, axis))}
        >
          <line className="stroke-ink" strokeWidth={1.5} strokeLinecap="round" />
          <text
            className="fill-ink text-[13px] font-medium italic"
            textAnchor="middle"
            dominantBaseline="central"
          >
            {axis}
          </text>
          <circle r="9" fill="transparent" />
        </g>
      ))}
    </svg>
  );
}
