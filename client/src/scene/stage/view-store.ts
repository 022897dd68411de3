import { isSameView, type SceneView } from '../model/scene-view.ts';

type Listener = (view: SceneView) => void;

const glideMs = 170;
const settleMs = 160;

function between(from: SceneView, to: SceneView, share: number): SceneView {
  const eased = 1 - (1 - share) ** 3;
  const mixed = (a: number, b: number): number => a + (b - a) * eased;
  const turn = ((((to.azimuthDeg - from.azimuthDeg + 180) % 360) + 360) % 360) - 180;
  return {
    azimuthDeg: from.azimuthDeg + turn * eased,
    elevationDeg: mixed(from.elevationDeg, to.elevationDeg),
    zoom: mixed(from.zoom, to.zoom),
    panX: mixed(from.panX, to.panX),
    panY: mixed(from.panY, to.panY),
  };
}

/**
 * The camera as it is now. Kept outside React and outside the canvas, so that turning renders no
 * component and a canvas that is replaced finds it again.
 */
export class ViewStore {
  private readonly listeners = new Set<Listener>();
  private readonly settled = new Set<Listener>();
  private timer: ReturnType<typeof setTimeout> | undefined;
  private frame = 0;

  constructor(public view: SceneView) {}

  subscribe = (listener: Listener): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  /** Called once the view has come to rest, not while it moves. */
  onSettled(listener: Listener): () => void {
    this.settled.add(listener);
    return () => {
      this.settled.delete(listener);
      if (this.settled.size === 0) {
        this.stop();
      }
    };
  }

  set(view: SceneView): void {
    cancelAnimationFrame(this.frame);
    this.apply(view);
  }

  /** Moves to a view within 170 ms, or at once where less motion is asked for. */
  glideTo(target: SceneView): void {
    if (matchMedia('(prefers-reduced-motion: reduce)').matches) {
      this.set(target);
      return;
    }
    cancelAnimationFrame(this.frame);
    const from = this.view;
    const start = performance.now();
    const step = (now: number): void => {
      const share = Math.max(0, Math.min(1, (now - start) / glideMs));
      this.apply(share === 1 ? target : between(from, target, share));
      if (share < 1) {
        this.frame = requestAnimationFrame(step);
      }
    };
    this.frame = requestAnimationFrame(step);
  }

  private stop(): void {
    cancelAnimationFrame(this.frame);
    clearTimeout(this.timer);
  }

  private apply(view: SceneView): void {
    if (isSameView(view, this.view)) {
      this.view = view;
      return;
    }
    this.view = view;
    for (const listener of this.listeners) {
      listener(view);
    }
    clearTimeout(this.timer);
    this.timer = setTimeout(() => {
      for (const listener of this.settled) {
        listener(this.view);
      }
    }, settleMs);
  }
}
