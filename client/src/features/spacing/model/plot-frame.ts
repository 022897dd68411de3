import type { SpacingPoint } from '#common/physics/energetics/spacing-curve';

/** Where the plot's numbers land on its drawing, in pixels. */
export interface PlotFrame {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
  readonly fromA: number;
  readonly toA: number;
  readonly lowEv: number;
  readonly highEv: number;
}

const margins = { left: 58, right: 12, top: 20, bottom: 34 } as const;

/**
 * A frame that shows the well in full: as far down as the attraction goes a little inside the
 * minimum, and as far up as the well is deep by half.
 */
export function plotFrame(
  width: number,
  height: number,
  curves: readonly (readonly SpacingPoint[])[],
): PlotFrame {
  const points = curves.flat();
  const depthEv = -Math.min(...points.map(({ netEv }) => netEv));
  return {
    width,
    height,
    ...margins,
    fromA: points[0]!.spacingA,
    toA: points.at(-1)!.spacingA,
    lowEv: -1.45 * depthEv,
    highEv: 0.6 * depthEv,
  };
}

export const xOf = (frame: PlotFrame, spacingA: number): number =>
  frame.left +
  ((spacingA - frame.fromA) / (frame.toA - frame.fromA)) * (frame.width - frame.left - frame.right);

export const yOf = (frame: PlotFrame, energyEv: number): number =>
  frame.top +
  ((frame.highEv - energyEv) / (frame.highEv - frame.lowEv)) *
    (frame.height - frame.top - frame.bottom);

/** The spacing under a place of the drawing. */
export function spacingAt(frame: PlotFrame, x: number): number {
  const share = (x - frame.left) / (frame.width - frame.left - frame.right);
  return frame.fromA + Math.max(0, Math.min(1, share)) * (frame.toA - frame.fromA);
}

/** A path through points; what lies far outside is drawn just outside, and clipped. */
export function pathOf(
  frame: PlotFrame,
  points: readonly SpacingPoint[],
  energyOf: (point: SpacingPoint) => number,
): string {
  const reach = frame.highEv - frame.lowEv;
  return points
    .map((point, k) => {
      const energy = Math.max(frame.lowEv - reach, Math.min(frame.highEv + reach, energyOf(point)));
      return `${k === 0 ? 'M' : 'L'}${xOf(frame, point.spacingA).toFixed(1)} ${yOf(frame, energy).toFixed(1)}`;
    })
    .join('');
}

/** Round numbers that cut a stretch into about `count` parts. */
export function ticks(low: number, high: number, count: number): number[] {
  const rough = (high - low) / count;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = power * ([1, 2, 5, 10].find((one) => one * power >= rough) ?? 10);
  const first = Math.ceil(low / step);
  const last = Math.floor(high / step);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, k) => (first + k) * step);
}
