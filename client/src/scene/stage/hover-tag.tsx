import { useRef, type JSX } from 'react';

import { drawnRadiusA, positionAt } from '../model/block.ts';
import type { BlockModel } from '../model/scene-model.ts';
import { useOnFrame, type StageFrames } from './frames.ts';

interface HoverTagProps {
  frames: StageFrames;
  model: BlockModel;
  ionScale: number;
  ion: number;
  describeIon: (ionId: string) => { title: string; detail: string };
}

const gapPx = 12;

/** Names the ion under the pointer (or the one just picked), beside it and inside the stage. */
export function HoverTag({
  frames,
  model,
  ionScale,
  ion,
  describeIon,
}: HoverTagProps): JSX.Element {
  const tag = useRef<HTMLDivElement>(null);
  useOnFrame(frames, (projection) => {
    const element = tag.current;
    if (element === null) {
      return;
    }
    const { x, y, depthA } = projection.toStage(positionAt(model.block, ion));
    const away = projection.toPixels(drawnRadiusA(model.block, ion, ionScale), depthA) + gapPx;
    const width = element.offsetWidth;
    const isRight = x + away + width < projection.width - 4;
    const left = isRight ? x + away : Math.max(4, x - away - width);
    const top = Math.max(18, Math.min(projection.height - 18, y));
    element.style.transform = `translate(${left}px, ${top}px) translateY(-50%)`;
  });
  const { title, detail } = describeIon(model.block.ids[ion] ?? '');
  return (
    <div
      ref={tag}
      aria-hidden
      className="pointer-events-none absolute top-0 left-0 rounded-control border border-line bg-raised px-2.5 py-1 text-small whitespace-nowrap"
    >
      <span className="font-medium">{title}</span>
      {detail !== '' && <span className="ml-2 text-soft">{detail}</span>}
    </div>
  );
}
