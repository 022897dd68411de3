import { addScaled, cellVector, norm, normalise, type Vector } from './vector.ts';

/** Where the viewer stands; plain numbers, fit for an address. */
export interface SceneView {
  /** Around the axis normal to a and b, degrees; 0 looks from +a. */
  readonly azimuthDeg: number;
  /** Above the plane of a and b, −90 … 90 degrees. */
  readonly elevationDeg: number;
  /** 1 shows the whole block. */
  readonly zoom: number;
  /** Shift of the picture to the right and up, in radii of the block. */
  readonly panX: number;
  readonly panY: number;
}

export const defaultSceneView: SceneView = {
  azimuthDeg: 34,
  elevationDeg: 20,
  zoom: 1,
  panX: 0,
  panY: 0,
};

export const zoomLimits = { least: 0.35, most: 14 } as const;
/** Vertical opening of the eye, degrees. */
const openingDeg = 25;
/** Share of the shorter side that the block's sphere may fill at zoom 1. */
export const fill = 0.97;

/** Unit vectors of the viewer's frame. */
export interface ViewFrame {
  readonly right: Vector;
  readonly up: Vector;
  /** From the block toward the viewer. */
  readonly toward: Vector;
}

export function viewFrame({ azimuthDeg, elevationDeg }: SceneView): ViewFrame {
  const azimuth = (azimuthDeg * Math.PI) / 180;
  const elevation = (elevationDeg * Math.PI) / 180;
  const [ca, sa] = [Math.cos(azimuth), Math.sin(azimuth)];
  const [ce, se] = [Math.cos(elevation), Math.sin(elevation)];
  return { right: [-sa, ca, 0], up: [-se * ca, -se * sa, ce], toward: [ce * ca, ce * sa, se] };
}

export type ViewAxis = 'a' | 'b' | 'c';
const axisIndex: Record<ViewAxis, 0 | 1 | 2> = { a: 0, b: 1, c: 2 };

/** The view from the far end of a cell vector back along it. */
export function viewDown(vectorsA: readonly number[], axis: ViewAxis): SceneView {
  const [x, y, z] = normalise(cellVector(vectorsA, axisIndex[axis]));
  const elevationDeg = (Math.asin(Math.max(-1, Math.min(1, z))) * 180) / Math.PI;
  const isUpright = Math.hypot(x, y) < 1e-6;
  // Straight from above every azimuth shows the same: this one puts a to the right.
  const azimuthDeg = isUpright ? -90 : (Math.atan2(y, x) * 180) / Math.PI;
  return { ...defaultSceneView, azimuthDeg, elevationDeg };
}

/** Which cell vector the viewer looks along, if any. */
export function alignedAxis(vectorsA: readonly number[], view: SceneView): ViewAxis | 'free' {
  const { toward } = viewFrame(view);
  const found = (['a', 'b', 'c'] as const).find((axis) => {
    const along = viewFrame(viewDown(vectorsA, axis)).toward;
    return Math.hypot(...along.map((part, at) => part - toward[at]!)) < 2e-3;
  });
  return found ?? 'free';
}

/** The view after the pointer moved by so many degrees around and up; never over the poles. */
export function turned(view: SceneView, aroundDeg: number, upDeg: number): SceneView {
  const azimuthDeg = ((((view.azimuthDeg + aroundDeg + 180) % 360) + 360) % 360) - 180;
  const elevationDeg = Math.max(-90, Math.min(90, view.elevationDeg + upDeg));
  return { ...view, azimuthDeg, elevationDeg };
}

export function zoomed(view: SceneView, factor: number): SceneView {
  const zoom = Math.max(zoomLimits.least, Math.min(zoomLimits.most, view.zoom * factor));
  // The point under the middle of the stage stays there.
  const ratio = zoom / view.zoom;
  return { ...view, zoom, panX: view.panX * ratio, panY: view.panY * ratio };
}

/** Eye and frame of a view on a block, in Å. */
export interface ViewPose extends ViewFrame {
  readonly eye: Vector;
  readonly distanceA: number;
  /** Depths between which ions fade toward the paper. */
  readonly nearA: number;
  readonly farA: number;
  readonly openingDeg: number;
}

/**
 * Places the eye so that at zoom 1 the sphere around the block fits the shorter side, whatever
 * the direction: nothing is cut while turning. Zooming narrows the opening, so the perspective
 * stays the same and the eye never enters the block.
 */
export function viewPose(
  view: SceneView,
  bounds: { readonly centreA: Vector; readonly radiusA: number },
  aspect: number,
): ViewPose {
  const frame = viewFrame(view);
  const half = (openingDeg * Math.PI) / 360;
  const distanceA = bounds.radiusA / Math.sin(half);
  const short = Math.tan(half) / Math.min(1, aspect) / fill;
  const opening = 2 * Math.atan(short / view.zoom);
  const shift = (distanceA * Math.tan(half)) / view.zoom;
  const middle = addScaled(
    addScaled(bounds.centreA, frame.right, -view.panX * shift),
    frame.up,
    -view.panY * shift,
  );
  return {
    ...frame,
    eye: addScaled(middle, frame.toward, distanceA),
    distanceA,
    nearA: distanceA - bounds.radiusA,
    farA: distanceA + bounds.radiusA,
    openingDeg: (opening * 180) / Math.PI,
  };
}

/** Whether two views show the same to the eye. */
export function isSameView(one: SceneView, other: SceneView): boolean {
  const keys = ['azimuthDeg', 'elevationDeg', 'zoom', 'panX', 'panY'] as const;
  return keys.every((key) => Math.abs(one[key] - other[key]) < 1e-3);
}

/** A view as short text for an address: `34,20,1,0,0`. */
export function formatSceneView(view: SceneView): string {
  return [view.azimuthDeg, view.elevationDeg, view.zoom, view.panX, view.panY]
    .map((value) => Number(value.toFixed(3)))
    .join(',');
}

/** Reads {@link formatSceneView}; null where the text is none. */
export function parseSceneView(text: string): SceneView | null {
  const parts = text.split(',').map(Number);
  if (parts.length !== 5 || !parts.every(Number.isFinite)) {
    return null;
  }
  const [azimuthDeg = 0, elevationDeg = 0, zoom = 1, panX = 0, panY = 0] = parts;
  const clamp = (value: number, most: number): number => Math.max(-most, Math.min(most, value));
  return {
    azimuthDeg: clamp(azimuthDeg, 360),
    elevationDeg: clamp(elevationDeg, 90),
    zoom: Math.max(zoomLimits.least, Math.min(zoomLimits.most, zoom)),
    panX: clamp(panX, 20),
    panY: clamp(panY, 20),
  };
}

/** Length of a cell vector as seen: used to place the compass needles. */
export function compassNeedle(
  frame: ViewFrame,
  vectorsA: readonly number[],
  axis: ViewAxis,
): { x: number; y: number; toward: number } {
  const along = cellVector(vectorsA, axisIndex[axis]);
  const length = norm(along) || 1;
  const part = (basis: Vector): number =>
    (along[0] * basis[0] + along[1] * basis[1] + along[2] * basis[2]) / length;
  return { x: part(frame.right), y: -part(frame.up), toward: part(frame.toward) };
}
