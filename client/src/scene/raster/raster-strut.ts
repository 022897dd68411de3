import { blend, type RasterBuffer } from './raster-buffer.ts';
import {
  acrossSteps,
  slimAcross,
  slimAlong,
  strutColour,
  strutProfile,
  type AcrossTable,
  type StrutTables,
  type StrutEnds,
} from './raster-strut-tables.ts';

/** A strut on the screen: both ends in pixels, depths and radius in Å, and its direction. */
export interface ScreenStrut {
  x0: number;
  y0: number;
  depth0A: number;
  x1: number;
  y1: number;
  depth1A: number;
  radiusA: number;
  /** Direction in the viewer's frame, unit length. */
  ax: number;
  ay: number;
  az: number;
  focalPx: number;
}

/** Struts slimmer than this take their colours from tables, pixels. */
const slimPx = 4;

/** What stays the same over one strut, worked out once. */
interface Bar {
  strut: ScreenStrut;
  across: AcrossTable;
  ends: StrutEnds;
  /** Direction and length on the screen. */
  ex: number;
  ey: number;
  lengthPx: number;
  /** Half width at its ends, and at its widest with the rim. */
  radius0Px: number;
  radius1Px: number;
  widestPx: number;
}

/** Draws a strut as a round, tapered bar. */
export function drawStrut(
  buffer: RasterBuffer,
  strut: ScreenStrut,
  ends: StrutEnds,
  tables: StrutTables,
): void {
  const dx = strut.x1 - strut.x0;
  const dy = strut.y1 - strut.y0;
  const lengthPx = Math.sqrt(dx * dx + dy * dy);
  if (lengthPx < 0.5) {
    return;
  }
  const radius0Px = (strut.focalPx * strut.radiusA) / strut.depth0A;
  const radius1Px = (strut.focalPx * strut.radiusA) / strut.depth1A;
  const widestPx = Math.max(radius0Px, radius1Px) + 1;
  const across = tables.across(strut);
  if (widestPx < slimPx) {
    drawSlim(buffer, strut, across, tables.slim(across, ends), radius0Px, radius1Px);
    return;
  }
  const bar: Bar = {
    strut,
    across,
    ends,
    ex: dx / lengthPx,
    ey: dy / lengthPx,
    lengthPx,
    radius0Px,
    radius1Px,
    widestPx,
  };
  const first = Math.max(0, Math.floor(Math.min(strut.y0, strut.y1) - widestPx));
  const last = Math.min(buffer.height - 1, Math.ceil(Math.max(strut.y0, strut.y1) + widestPx));
  for (let y = first; y <= last; y += 1) {
    drawRow(buffer, bar, y);
  }
}

/** Finds the pixels of one row that lie between the ends and the sides of a strut. */
function drawRow(buffer: RasterBuffer, bar: Bar, y: number): void {
  const { strut, ex, ey, lengthPx, widestPx } = bar;
  const { x0, x1 } = strut;
  const py = y + 0.5 - strut.y0;
  let low = Math.min(x0, x1) - widestPx;
  let high = Math.max(x0, x1) + widestPx;
  if (Math.abs(ex) > 1e-3) {
    const p = x0 + (-widestPx - py * ey) / ex;
    const q = x0 + (lengthPx + widestPx - py * ey) / ex;
    low = Math.max(low, Math.min(p, q));
    high = Math.min(high, Math.max(p, q));
  }
  if (Math.abs(ey) > 1e-3) {
    const p = x0 + (py * ex - widestPx) / ey;
    const q = x0 + (py * ex + widestPx) / ey;
    low = Math.max(low, Math.min(p, q));
    high = Math.min(high, Math.max(p, q));
  }
  const first = Math.max(0, Math.floor(low - 0.5));
  const last = Math.min(buffer.width - 1, Math.ceil(high - 0.5));
  if (first <= last) {
    paintSpan(buffer, bar, y, first, last);
  }
}

function paintSpan(buffer: RasterBuffer, bar: Bar, y: number, first: number, last: number): void {
  const { strut, across, ends, ex, ey, lengthPx } = bar;
  const { pixels, depths, width } = buffer;
  const py = y + 0.5 - strut.y0;
  const slope = strut.depth1A - strut.depth0A;
  const swell = bar.radius1Px - bar.radius0Px;
  const tilt = strut.az / lengthPx;
  for (let x = first; x <= last; x += 1) {
    const px = x + 0.5 - strut.x0;
    const axis = (px * ex + py * ey) / lengthPx;
    const onAxis = axis < 0 ? 0 : axis > 1 ? 1 : axis;
    const profile = strutProfile(onAxis);
    const radiusPx = (bar.radius0Px + swell * onAxis) * profile;
    const side = py * ex - px * ey;
    const cover = radiusPx + 0.5 - (side < 0 ? -side : side);
    if (cover <= 0) {
      continue;
    }
    const u = side / radiusPx;
    const step = u <= -1 ? 0 : u >= 1 ? acrossSteps : ((u + 1) * 0.5 * acrossSteps + 0.5) | 0;
    // The surface bulges toward the eye: what is seen here belongs to another place of the axis.
    const t = axis + tilt * across.bulges[step]! * radiusPx;
    if (t < 0 || t > 1) {
      continue;
    }
    // Along so short a bar the depth is as good as linear on the screen.
    const depthA = strut.depth0A + slope * t - across.fronts[step]! * strut.radiusA * profile;
    const at = y * width + x;
    if (depthA >= depths[at]!) {
      continue;
    }
    const colour = strutColour(across, ends, step, t);
    pixels[at] = cover >= 1 ? colour : blend(pixels[at]!, colour, (cover * 256) | 0);
    if (cover > 0.5) {
      depths[at] = depthA;
    }
  }
}

/** Draws a strut of a few pixels' width, pixel by pixel along its longer side. */
function drawSlim(
  buffer: RasterBuffer,
  strut: ScreenStrut,
  across: AcrossTable,
  colours: Uint32Array,
  radius0Px: number,
  radius1Px: number,
): void {
  const { pixels, depths, width, height } = buffer;
  const dx = strut.x1 - strut.x0;
  const dy = strut.y1 - strut.y0;
  const isSteep = Math.abs(dy) > Math.abs(dx);
  const start = isSteep ? strut.y0 : strut.x0;
  const span = isSteep ? dy : dx;
  const drift = (isSteep ? dx : dy) / span;
  const straight = span / Math.sqrt(dx * dx + dy * dy);
  // Which way "across" runs along the shorter side.
  const turn = isSteep ? -straight : straight;
  const along = isSteep ? height : width;
  const limit = (isSteep ? width : height) - 1;
  const [stepAlong, stepOther] = isSteep ? [width, 1] : [1, width];
  const first = Math.max(0, Math.ceil(Math.min(start, start + span) - 0.5));
  const last = Math.min(along - 1, Math.floor(Math.max(start, start + span) - 0.5));
  for (let place = first; place <= last; place += 1) {
    const t = (place + 0.5 - start) / span;
    const profile = strutProfile(t);
    const radiusPx = (radius0Px + (radius1Px - radius0Px) * t) * profile;
    const half = (radiusPx + 0.5) / Math.abs(straight);
    const middle = (isSteep ? strut.x0 : strut.y0) + drift * (place + 0.5 - start);
    const axisA = strut.depth0A + (strut.depth1A - strut.depth0A) * t;
    const bulgeA = strut.radiusA * profile;
    const row = ((t * slimAlong + 0.5) | 0) * (slimAcross + 1);
    const low = Math.max(0, Math.ceil(middle - half - 0.5));
    const high = Math.min(limit, Math.floor(middle + half - 0.5));
    for (let other = low; other <= high; other += 1) {
      const side = (other + 0.5 - middle) * turn;
      const u = side / radiusPx;
      const column = u <= -1 ? 0 : u >= 1 ? slimAcross : ((u + 1) * 0.5 * slimAcross + 0.5) | 0;
      const depthA = axisA - across.fronts[column * (acrossSteps / slimAcross)]! * bulgeA;
      const at = place * stepAlong + other * stepOther;
      if (depthA < depths[at]!) {
        const cover = radiusPx + 0.5 - (side < 0 ? -side : side);
        const colour = colours[row + column]!;
        pixels[at] = cover >= 1 ? colour : blend(pixels[at]!, colour, (cover * 256) | 0);
        if (cover > 0.5) {
          depths[at] = depthA;
        }
      }
    }
  }
}
