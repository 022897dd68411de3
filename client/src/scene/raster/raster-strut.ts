import type { Rgb } from '../model/colours.ts';
import { strutTaper } from '../model/drawing.ts';
import { shade } from '../model/light.ts';
import { blend, pack, type RasterBuffer } from './raster-buffer.ts';

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
  fade0: number;
  fade1: number;
  focalPx: number;
}

const acrossSteps = 32;

/** Brightness, gloss and bulge across a strut, from one side to the other. */
interface AcrossTable {
  readonly bodies: Float32Array;
  readonly glosses: Float32Array;
  /** Height of the surface over the axis toward the eye, in radii. */
  readonly fronts: Float32Array;
  /** The same across the axis, before it is tilted. */
  readonly bulges: Float32Array;
}

/** Struts of a crystal share few directions: one table each, kept for as long as they fit. */
const tables = new Map<number, AcrossTable>();
const tableLimit = 4096;
const directionSteps = 64;

/** The normal turns from one side over the front to the other side. */
function buildAcross(ax: number, ay: number, az: number): AcrossTable {
  const flat = Math.sqrt(Math.max(1e-6, 1 - az * az));
  // The screen's y points down: across runs to the right of the strut's direction.
  const [sideX, sideY] = [ay / flat, -ax / flat];
  const table = {
    bodies: new Float32Array(acrossSteps + 1),
    glosses: new Float32Array(acrossSteps + 1),
    fronts: new Float32Array(acrossSteps + 1),
    bulges: new Float32Array(acrossSteps + 1),
  };
  for (let step = 0; step <= acrossSteps; step += 1) {
    const u = (step / acrossSteps) * 2 - 1;
    const w = Math.sqrt(Math.max(0, 1 - u * u));
    const { body, gloss } = shade(
      u * sideX - (w * az * ax) / flat,
      u * sideY - (w * az * ay) / flat,
      w * flat,
    );
    table.bodies[step] = body;
    table.glosses[step] = 255 * gloss;
    table.fronts[step] = w * flat;
    table.bulges[step] = w;
  }
  return table;
}

function acrossTable({ ax, ay, az }: ScreenStrut): AcrossTable {
  const step = (part: number): number => Math.round((part + 1) * directionSteps);
  const key = (step(ax) * 256 + step(ay)) * 256 + step(az);
  let table = tables.get(key);
  if (table === undefined) {
    if (tables.size >= tableLimit) {
      tables.clear();
    }
    table = buildAcross(ax, ay, az);
    tables.set(key, table);
  }
  return table;
}

/** Radius along a strut: full at its ends, slimmer halfway. */
function strutProfile(t: number): number {
  const fromMiddle = 2 * t - 1;
  return 1 - strutTaper * (1 - fromMiddle * fromMiddle);
}

/** The first end's colour gives way to the other's around the middle. */
function otherShare(t: number): number {
  const step = t < 0.34 ? 0 : t > 0.66 ? 1 : (t - 0.34) / 0.32;
  return step * step * (3 - 2 * step);
}

/** Struts are darker where they enter a ball. */
function contactShade(t: number): number {
  const fromEnd = t < 0.5 ? t : 1 - t;
  return fromEnd < 0.2 ? 0.8 + fromEnd : 1;
}

/** What stays the same over one strut, worked out once. */
interface Bar {
  strut: ScreenStrut;
  across: AcrossTable;
  one: Rgb;
  other: Rgb;
  paper: Rgb;
  /** Direction and length on the screen. */
  ex: number;
  ey: number;
  lengthPx: number;
  /** Half width at its widest, with the rim. */
  widestPx: number;
}

/** Draws a strut as a round, tapered bar; `one` and `other` are the colours of its ends. */
export function drawStrut(
  buffer: RasterBuffer,
  strut: ScreenStrut,
  one: Rgb,
  other: Rgb,
  paper: Rgb,
): void {
  const dx = strut.x1 - strut.x0;
  const dy = strut.y1 - strut.y0;
  const lengthPx = Math.sqrt(dx * dx + dy * dy);
  const nearA = Math.min(strut.depth0A, strut.depth1A);
  const widestPx = (strut.focalPx * strut.radiusA) / nearA + 1;
  if (lengthPx < 0.5) {
    return;
  }
  const bar: Bar = {
    strut,
    across: acrossTable(strut),
    one,
    other,
    paper,
    ex: dx / lengthPx,
    ey: dy / lengthPx,
    lengthPx,
    widestPx,
  };
  const first = Math.max(0, Math.floor(Math.min(strut.y0, strut.y1) - widestPx));
  const last = Math.min(buffer.height - 1, Math.ceil(Math.max(strut.y0, strut.y1) + widestPx));
  for (let y = first; y <= last; y += 1) {
    drawRow(buffer, bar, y);
  }
}

/** Draws the pixels of one row that lie between the ends and the sides of a strut. */
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
  for (let x = first; x <= last; x += 1) {
    paint(buffer, bar, x, y);
  }
}

function paint(buffer: RasterBuffer, bar: Bar, x: number, y: number): void {
  const { strut, across, ex, ey, lengthPx } = bar;
  const px = x + 0.5 - strut.x0;
  const py = y + 0.5 - strut.y0;
  const axis = (px * ex + py * ey) / lengthPx;
  const onAxis = axis < 0 ? 0 : axis > 1 ? 1 : axis;
  const scale = strut.focalPx * ((1 - onAxis) / strut.depth0A + onAxis / strut.depth1A);
  const radiusA = strut.radiusA * strutProfile(onAxis);
  const radiusPx = scale * radiusA;
  const side = py * ex - px * ey;
  const cover = radiusPx + 0.5 - Math.abs(side);
  if (cover <= 0) {
    return;
  }
  const u = Math.max(-1, Math.min(1, side / radiusPx));
  const step = ((u + 1) * 0.5 * acrossSteps + 0.5) | 0;
  // The surface bulges toward the eye: what is seen here belongs to another place of the axis.
  const t = axis + (strut.az * across.bulges[step]! * radiusPx) / lengthPx;
  if (t < 0 || t > 1) {
    return;
  }
  const depthA = 1 / ((1 - t) / strut.depth0A + t / strut.depth1A) - across.fronts[step]! * radiusA;
  const at = y * buffer.width + x;
  if (depthA >= buffer.depths[at]!) {
    return;
  }
  const colour = colourAt(bar, step, t);
  buffer.pixels[at] = cover >= 1 ? colour : blend(buffer.pixels[at]!, colour, (cover * 256) | 0);
  if (cover > 0.5) {
    buffer.depths[at] = depthA;
  }
}

function colourAt({ strut, across, one, other, paper }: Bar, step: number, t: number): number {
  const share = otherShare(t);
  const body = across.bodies[step]! * contactShade(t);
  const gloss = across.glosses[step]!;
  const fade = strut.fade0 + (strut.fade1 - strut.fade0) * t;
  const red = Math.min(255, (one[0] + (other[0] - one[0]) * share) * body + gloss);
  const green = Math.min(255, (one[1] + (other[1] - one[1]) * share) * body + gloss);
  const blue = Math.min(255, (one[2] + (other[2] - one[2]) * share) * body + gloss);
  return pack(
    red + (paper[0] - red) * fade,
    green + (paper[1] - green) * fade,
    blue + (paper[2] - blue) * fade,
  );
}
