import { useEffect, useLayoutEffect, useRef } from 'react';

import type { Projection } from '../model/projection.ts';

type Listener = (projection: Projection) => void;

/** Tells the overlay where things stand, once per drawn frame and without rendering React. */
export class StageFrames {
  latest: Projection | null = null;
  private readonly listeners = new Set<Listener>();

  subscribe(listener: Listener): () => void {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  }

  publish(projection: Projection): void {
    this.latest = projection;
    for (const listener of this.listeners) {
      listener(projection);
    }
  }
}

/** Places overlay elements with every frame, and at once when they change. */
export function useOnFrame(frames: StageFrames, place: Listener): void {
  const current = useRef(place);
  useLayoutEffect(() => {
    current.current = place;
    if (frames.latest !== null) {
      place(frames.latest);
    }
  });
  useEffect(() => frames.subscribe((projection) => current.current(projection)), [frames]);
}
