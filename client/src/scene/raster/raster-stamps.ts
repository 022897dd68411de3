import { ballTableFor } from './raster-tones.ts';

/** A small ball pixel by pixel, for one radius and one place of its middle within a pixel. */
export interface BallStamp {
  /** Pixels a side. */
  readonly size: number;
  /** Row and column of the pixel that holds the ball's middle. */
  readonly middle: number;
  readonly tones: Uint16Array;
  /** z of the surface in radii. */
  readonly heights: Float32Array;
  /** Part of the pixel that the ball covers, of 256; `fullCover` well inside. */
  readonly covers: Uint16Array;
  /** First and last column of each row that the ball touches. */
  readonly firsts: Int16Array;
  readonly lasts: Int16Array;
}

/** Well inside, where surfaces that meet may share a pixel. */
export const fullCover = 257;

/** Steps of a pixel in which radius and place are told apart: an eighth off at most. */
const steps = 4;

/** Memory kept for stamps, in pixels; a rotation of a large block needs about a million. */
const pixelLimit = 4_000_000;

const stamps = new Map<number, BallStamp>();
let pixelCount = 0;

function buildStamp(radiusPx: number, offsetX: number, offsetY: number): BallStamp {
  const middle = Math.ceil(radiusPx + 0.5) + 1;
  const size = 2 * middle + 1;
  const stamp: BallStamp = {
    size,
    middle,
    tones: new Uint16Array(size * size),
    heights: new Float32Array(size * size),
    covers: new Uint16Array(size * size),
    firsts: new Int16Array(size).fill(size),
    lasts: new Int16Array(size).fill(-1),
  };
  const table = ballTableFor(radiusPx);
  for (let entry = 0; entry < size * size; entry += 1) {
    const row = Math.floor(entry / size);
    const column = entry % size;
    const dx = column - middle + 0.5 - offsetX;
    const dy = row - middle + 0.5 - offsetY;
    const away = Math.sqrt(dx * dx + dy * dy);
    const cover = radiusPx + 0.5 - away;
    if (cover > 0) {
      // Pixels on the rim reach a little beyond: they take the rim's tone.
      const scale = (0.499 * table.size) / Math.max(radiusPx, away);
      const atRow = Math.floor(table.size / 2 + dy * scale);
      stamp.tones[entry] =
        table.tones[atRow * table.size + Math.floor(table.size / 2 + dx * scale)]!;
      stamp.heights[entry] = Math.sqrt(Math.max(0, 1 - (away / radiusPx) ** 2));
      stamp.covers[entry] = away <= radiusPx - 0.7 ? fullCover : Math.min(256, cover * 256);
      stamp.firsts[row] = Math.min(stamp.firsts[row]!, column);
      stamp.lasts[row] = column;
    }
  }
  return stamp;
}

/** The stamp of a ball whose middle lies at (x, y), its radius and place rounded to a quarter. */
export function stampFor(radiusPx: number, x: number, y: number): BallStamp {
  const radius = Math.max(1, Math.round(radiusPx * steps));
  const offsetX = ((x - Math.floor(x)) * steps) | 0;
  const offsetY = ((y - Math.floor(y)) * steps) | 0;
  const key = (radius * steps + offsetX) * steps + offsetY;
  let stamp = stamps.get(key);
  if (stamp === undefined) {
    stamp = buildStamp(radius / steps, (offsetX + 0.5) / steps, (offsetY + 0.5) / steps);
    pixelCount += stamp.size * stamp.size;
    if (pixelCount > pixelLimit) {
      stamps.clear();
      pixelCount = stamp.size * stamp.size;
    }
    stamps.set(key, stamp);
  }
  return stamp;
}
