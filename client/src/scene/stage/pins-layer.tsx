import { useMemo, useRef, type JSX } from 'react';

import { drawnRadiusA } from '../model/block.ts';
import { pinAnchor, type PinSubject } from '../model/pins.ts';
import type { BlockModel } from '../model/scene-model.ts';
import { useOnFrame, type StageFrames } from './frames.ts';

export interface ScenePin extends PinSubject {
  readonly id: string;
  readonly number: number;
  readonly isResolved: boolean;
  readonly summary: string;
}

interface PinsLayerProps {
  frames: StageFrames;
  model: BlockModel;
  ionScale: number;
  pins: readonly ScenePin[];
  onPinClick: ((id: string) => void) | undefined;
}

const pinLimit = 60;
/** Tags on one subject stand beside each other, this far apart. */
const stepPx = 26;

/** Numbered tags of remarks, at the upper right rim of their ion. */
export function PinsLayer(props: PinsLayerProps): JSX.Element {
  const { frames, model, ionScale, pins, onPinClick } = props;
  const layer = useRef<HTMLDivElement>(null);
  const shown = useMemo(() => {
    const taken = new Map<string, number>();
    return pins.slice(0, pinLimit).map((pin) => {
      const anchor = pinAnchor(model.cell, model.block, pin);
      const key = anchor.at.join();
      const order = taken.get(key) ?? 0;
      taken.set(key, order + 1);
      return { pin, anchor, order };
    });
  }, [model, pins]);
  useOnFrame(frames, (projection) => {
    shown.forEach(({ anchor, order }, at) => {
      const element = layer.current?.children[at];
      if (!(element instanceof HTMLElement)) {
        return;
      }
      const { x, y, depthA } = projection.toStage(anchor.at);
      const radiusA = anchor.ion === null ? 0 : drawnRadiusA(model.block, anchor.ion, ionScale);
      const rim = projection.toPixels(radiusA, depthA) * 0.62;
      const left = x + rim + order * stepPx;
      element.style.transform = `translate(${left}px, ${y - rim}px) translate(-3px, -100%)`;
    });
  });
  return (
    <div ref={layer} className="pointer-events-none absolute inset-0 overflow-hidden">
      {shown.map(({ pin }) => (
        <button
          key={pin.id}
          type="button"
          data-overlay
          title={pin.summary}
          aria-label={`Remark ${pin.number}${pin.isResolved ? ', resolved' : ''}: ${pin.summary}`}
          onClick={() => onPinClick?.(pin.id)}
          className={
            'pointer-events-auto absolute top-0 left-0 grid h-6 min-w-6 place-items-center rounded-[12px_12px_12px_3px] border px-1 text-[12px] leading-none font-bold ' +
            (pin.isResolved ? 'border-soft bg-paper text-soft' : 'border-paper bg-ink text-paper')
          }
        >
          {pin.number}
        </button>
      ))}
    </div>
  );
}
