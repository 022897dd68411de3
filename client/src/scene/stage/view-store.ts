import { defaultSceneView, type SceneView } from '../model/scene-view.ts';

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

  /** Fits a direction to the stage; set by the stage once it knows its size. */
  fit: (view: SceneView) => SceneView = (view) => view;
  /** Nobody has moved the camera since it was fitted: it may be fitted again. */
  isFitted: boolean;

  /** @param view where to start; null for the first view, fitted to the stage */
  constructor(view: SceneView | null) {
    this.view = view ?? defaultSceneView;
    this.isFitted = view === null;
  }

  view: SceneView;

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
    this.isFitted = false;
    this.apply(view);
    this.report();
  }

  /** Shows a view that came from outside; it is not reported back. */
  show(view: SceneView): void {
    cancelAnimationFrame(this.frame);
    this.isFitted = false;
    this.apply(view);
  }

  /** Fits the present direction again, after the stage or the block changed size. */
  refit(): void {
    if (this.isFitted) {
      this.apply(this.fit(this.view));
    }
  }

  /** Shows the whole block from a direction. */
  glideToFitted(direction: SceneView): void {
    this.glideTo(this.fit(direction));
    this.isFitted = true;
  }

  /** Moves to a view within 170 ms, or at once where less motion is asked for. */
  glideTo(target: SceneView): void {
    if (matchMedia('(prefers-reduced-motion: reduce)').matches) {
      this.set(target);
      return;
    }
    cancelAnimationFrame(this.frame);
    this.isFitted = false;
    const from = this.view;
    const start = performance.now();
    const step = (now: number): void => {
      const share = Math.max(0, Math.min(1, (now - start) / glideMs));
      this.apply(share === 1 ? target : between(from, target, share));
      if (share < 1) {
        this.frame = requestAnimationFrame(step);
      } else {
        this.report();
      }
    };
    this.frame = requestAnimationFrame(step);
  }

  private stop(): void {
    cancelAnimationFrame(this.frame);
    clearTimeout(this.timer);
  }

  private apply(view: SceneView): void {
    this.view = view;
    for (const listener of this.listeners) {
      listener(view);
    }
  }

  private report(): void {
    clearTimeout(this.timer);
    this.timer = setTimeout(() => {
      for (const listener of this.settled) {
        listener(this.view);
      }
    }, settleMs);
  }
}
