import { useEffect, useRef, type RefObject } from 'react';

import { turned, zoomed, type SceneView } from '../model/scene-view.ts';
import type { ViewStore } from './view-store.ts';

interface StagePointerOptions {
  store: ViewStore;
  /** A click that was no drag, in pixels of the stage. */
  onPick: (x: number, y: number, isAdding: boolean) => void;
  /** The pointer rests over a point, or has left (null). */
  onHover: (at: { x: number; y: number } | null) => void;
}

const degreesPerPixel = 0.42;
/** Movements up to this many pixels are a click with a shaky hand. */
const clickSlackPx = 5;

interface Finger {
  x: number;
  y: number;
}

interface Gesture {
  readonly fingers: Map<number, Finger>;
  travelledPx: number;
  isPan: boolean;
}

function panned(view: SceneView, dx: number, dy: number, size: DOMRect): SceneView {
  // One radius of the block spans about half the shorter side at zoom 1.
  const unit = Math.min(size.width, size.height) / 2;
  return { ...view, panX: view.panX + dx / unit, panY: view.panY - dy / unit };
}

function spread(fingers: Map<number, Finger>): { x: number; y: number; distance: number } {
  const [one, other] = [...fingers.values()];
  if (one === undefined || other === undefined) {
    return { x: 0, y: 0, distance: 1 };
  }
  return {
    x: (one.x + other.x) / 2,
    y: (one.y + other.y) / 2,
    distance: Math.max(1, Math.hypot(one.x - other.x, one.y - other.y)),
  };
}

/** Moves a gesture on and returns the view that follows from it. */
function follow(gesture: Gesture, event: PointerEvent, view: SceneView, size: DOMRect): SceneView {
  const finger = gesture.fingers.get(event.pointerId)!;
  const before = spread(gesture.fingers);
  const dx = event.clientX - finger.x;
  const dy = event.clientY - finger.y;
  finger.x = event.clientX;
  finger.y = event.clientY;
  gesture.travelledPx += Math.abs(dx) + Math.abs(dy);
  if (gesture.fingers.size > 1) {
    const after = spread(gesture.fingers);
    const closer = zoomed(view, after.distance / before.distance);
    return panned(closer, after.x - before.x, after.y - before.y, size);
  }
  if (gesture.isPan) {
    return panned(view, dx, dy, size);
  }
  return turned(view, -dx * degreesPerPixel, dy * degreesPerPixel);
}

/**
 * Turn by dragging, shift by the right button or two fingers, zoom by pinching or by the wheel.
 * The wheel zooms only while the stage has focus (or with Ctrl), and a finger that starts
 * vertically scrolls the page: the stage never traps a reader.
 */
export function useStagePointer(
  stage: RefObject<HTMLElement | null>,
  options: StagePointerOptions,
): void {
  const current = useRef(options);
  useEffect(() => {
    current.current = options;
  });
  useEffect(() => {
    const element = stage.current;
    return element === null ? undefined : listen(element, current);
  }, [stage]);
}

function listen(element: HTMLElement, current: { current: StagePointerOptions }): () => void {
  const gesture: Gesture = { fingers: new Map(), travelledPx: 0, isPan: false };
  const local = (event: PointerEvent): { x: number; y: number } => {
    const box = element.getBoundingClientRect();
    return { x: event.clientX - box.left, y: event.clientY - box.top };
  };
  const isOverlay = (event: Event): boolean =>
    event.target instanceof Element && event.target.closest('[data-overlay]') !== null;

  const down = (event: PointerEvent): void => {
    if (isOverlay(event)) {
      return;
    }
    if (gesture.fingers.size === 0) {
      gesture.travelledPx = 0;
      gesture.isPan = event.button === 1 || event.button === 2;
    }
    gesture.fingers.set(event.pointerId, { x: event.clientX, y: event.clientY });
    element.setPointerCapture?.(event.pointerId);
    current.current.onHover(null);
  };
  const move = (event: PointerEvent): void => {
    const { store, onHover } = current.current;
    if (gesture.fingers.has(event.pointerId)) {
      store.set(follow(gesture, event, store.view, element.getBoundingClientRect()));
    } else if (event.pointerType === 'mouse') {
      onHover(isOverlay(event) ? null : local(event));
    }
  };
  const up = (event: PointerEvent): void => {
    const wasDown = gesture.fingers.delete(event.pointerId);
    const isClick = gesture.travelledPx <= clickSlackPx && !gesture.isPan;
    if (wasDown && gesture.fingers.size === 0 && isClick) {
      const { x, y } = local(event);
      current.current.onPick(x, y, event.shiftKey);
    }
  };
  const cancel = (event: PointerEvent): void => {
    gesture.fingers.delete(event.pointerId);
  };
  const leave = (): void => current.current.onHover(null);
  const wheel = (event: WheelEvent): void => {
    if (event.ctrlKey || event.metaKey || document.activeElement === element) {
      event.preventDefault();
      const { store } = current.current;
      const lines = event.deltaMode === WheelEvent.DOM_DELTA_LINE ? 16 : 1;
      store.set(zoomed(store.view, Math.exp(-event.deltaY * lines * 0.0016)));
    }
  };
  const menu = (event: Event): void => event.preventDefault();

  element.addEventListener('pointerdown', down);
  element.addEventListener('pointermove', move);
  element.addEventListener('pointerup', up);
  element.addEventListener('pointercancel', cancel);
  element.addEventListener('pointerleave', leave);
  element.addEventListener('wheel', wheel, { passive: false });
  element.addEventListener('contextmenu', menu);
  return () => {
    element.removeEventListener('pointerdown', down);
    element.removeEventListener('pointermove', move);
    element.removeEventListener('pointerup', up);
    element.removeEventListener('pointercancel', cancel);
    element.removeEventListener('pointerleave', leave);
    element.removeEventListener('wheel', wheel);
    element.removeEventListener('contextmenu', menu);
  };
}
