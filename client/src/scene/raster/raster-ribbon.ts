import { blend, type RasterBuffer } from './raster-buffer.ts';

/** A line on the screen; widths and spacing in device pixels. */
export interface ScreenRibbon {
  x0: number;
  y0: number;
  depth0A: number;
  x1: number;
  y1: number;
  depth1A: number;
  fade0: number;
  fade1: number;
}

export interface RibbonStyle {
  readonly widthPx: number;
  readonly colour: number;
  readonly opacity: number;
  readonly hiddenOpacity: number;
  /** Distance of dots along the line; 0 for a full line. */
  readonly dotSpacingPx: number;
  readonly biasA: number;
}

/** Dots stand this many widths apart. */
export const dotSpacing = 2.3;

/** Part of a pixel a line or its nearest dot covers. */
function coverOf(style: RibbonStyle, along: number, across: number, length: number): number {
  const half = style.widthPx / 2;
  if (style.dotSpacingPx > 0) {
    const index = Math.round(along / style.dotSpacingPx);
    const fromDot = along - index * style.dotSpacingPx;
    return half + 0.5 - Math.sqrt(fromDot * fromDot + across * across);
  }
  return along < 0 || along > length ? 0 : half + 0.5 - Math.abs(across);
}

/** Draws a line with smooth rims; where something stands in front it is fainter or absent. */
export function drawRibbon(buffer: RasterBuffer, line: ScreenRibbon, style: RibbonStyle): void {
  const dx = line.x1 - line.x0;
  const dy = line.y1 - line.y0;
  const length = Math.sqrt(dx * dx + dy * dy);
  if (length < 0.5) {
    return;
  }
  const ex = dx / length;
  const ey = dy / length;
  const half = style.widthPx / 2 + 1;
  const isSteep = Math.abs(dy) > Math.abs(dx);
  // Walks along the longer side, so that each step crosses few pixels.
  const [start, end] = isSteep ? [line.y0, line.y1] : [line.x0, line.x1];
  const size = isSteep ? buffer.height : buffer.width;
  const span = half / Math.max(Math.abs(ex), Math.abs(ey));
  const first = Math.max(0, Math.floor(Math.min(start, end) - half));
  const last = Math.min(size - 1, Math.ceil(Math.max(start, end) + half));
  for (let step = first; step <= last; step += 1) {
    const share = (step + 0.5 - start) / (end - start);
    const middle = isSteep ? line.x0 + dx * share : line.y0 + dy * share;
    const limit = isSteep ? buffer.width : buffer.height;
    const low = Math.max(0, Math.floor(middle - span));
    const high = Math.min(limit - 1, Math.ceil(middle + span));
    for (let other = low; other <= high; other += 1) {
      const x = isSteep ? other : step;
      const y = isSteep ? step : other;
      paint(buffer, line, style, x, y, ex, ey, length);
    }
  }
}

function paint(
  buffer: RasterBuffer,
  line: ScreenRibbon,
  style: RibbonStyle,
  x: number,
  y: number,
  ex: number,
  ey: number,
  length: number,
): void {
  const px = x + 0.5 - line.x0;
  const py = y + 0.5 - line.y0;
  const along = px * ex + py * ey;
  const cover = coverOf(style, along, py * ex - px * ey, length);
  if (cover <= 0) {
    return;
  }
  const t = Math.max(0, Math.min(1, along / length));
  const depth = 1 / ((1 - t) / line.depth0A + t / line.depth1A) - style.biasA;
  const at = y * buffer.width + x;
  const shown = depth < buffer.depths[at]! ? style.opacity : style.hiddenOpacity;
  const fade = line.fade0 + (line.fade1 - line.fade0) * t;
  const share = Math.min(1, cover) * shown * (1 - fade);
  buffer.pixels[at] = blend(buffer.pixels[at]!, style.colour, (share * 256) | 0);
}
