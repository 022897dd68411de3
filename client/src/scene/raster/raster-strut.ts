import type { Rgb } from '../model/colours.ts';
import { strutTaper } from '../model/drawing.ts';
import { glossDirection, keyLight, light } from '../model/light.ts';
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

/** Brightness across a strut, from one side to the other. */
const acrossSteps = 32;
const bodies = new Float32Array(acrossSteps + 1);
const glosses = new Float32Array(acrossSteps + 1);
const fronts = new Float32Array(acrossSteps + 1);

/** Fills the tables for one strut: the normal turns from side over front to the other side. */
function lightAcross(strut: ScreenStrut, sideX: number, sideY: number): number {
  const flat = Math.sqrt(Math.max(1e-9, 1 - strut.az * strut.az));
  const frontX = (-strut.az * strut.ax) / flat;
  const frontY = (-strut.az * strut.ay) / flat;
  const frontZ = flat;
  for (let step = 0; step <= acrossSteps; step += 1) {
    const u = (step / acrossSteps) * 2 - 1;
    const w = Math.sqrt(Math.max(0, 1 - u * u));
    const nx = u * sideX + w * frontX;
    const ny = u * sideY + w * frontY;
    const nz = w * frontZ;
    const key = Math.max(
      0,
      (nx * keyLight[0] + ny * keyLight[1] + nz * keyLight[2] + light.wrap) / (1 + light.wrap),
    );
    const half = Math.max(
      0,
      nx * glossDirection[0] + ny * glossDirection[1] + nz * glossDirection[2],
    );
    const rim = (1 - nz) ** 3;
    bodies[step] = light.ambient + light.key * key + light.sky * ny - light.rim * rim;
    glosses[step] = 255 * light.sheen * half ** light.sheenPower * key;
    fronts[step] = w;
  }
  return frontZ;
}

/** Radius along a strut: full at its ends, slimmer halfway. */
export function strutProfile(t: number): number {
  const fromMiddle = 2 * t - 1;
  return 1 - strutTaper * (1 - fromMiddle * fromMiddle);
}

/** The first end's colour gives way to the other's around the middle. */
function otherShare(t: number): number {
  const step = t < 0.34 ? 0 : t > 0.66 ? 1 : (t - 0.34) / 0.32;
  return step * step * (3 - 2 * step);
}

/** Struts are darker where they enter a ball. */
export function contactShade(t: number): number {
  const fromEnd = t < 0.5 ? t : 1 - t;
  return fromEnd < 0.2 ? 0.68 + 1.6 * fromEnd : 1;
}

/** Draws a strut as a round, tapered bar; `one` and `other` are the colours of its ends. */
export function drawStrut(
  buffer: RasterBuffer,
  strut: ScreenStrut,
  one: Rgb,
  other: Rgb,
  paper: Rgb,
): void {
  const { x0, y0, x1, y1 } = strut;
  const dx = x1 - x0;
  const dy = y1 - y0;
  const length = Math.sqrt(dx * dx + dy * dy);
  const near = Math.min(strut.depth0A, strut.depth1A);
  const widest = (strut.focalPx * strut.radiusA) / near + 1;
  if (length < 0.5) {
    return;
  }
  const ex = dx / length;
  const ey = dy / length;
  // Screen y points down, the viewer's y up.
  const frontZ = lightAcross(strut, -ey, -ex);
  const firstRow = Math.max(0, Math.floor(Math.min(y0, y1) - widest));
  const lastRow = Math.min(buffer.height - 1, Math.ceil(Math.max(y0, y1) + widest));
  for (let y = firstRow; y <= lastRow; y += 1) {
    const py = y + 0.5 - y0;
    // Along: 0 ≤ px·ex + py·ey ≤ length. Across: |py·ex − px·ey| ≤ widest.
    let low = Math.min(x0, x1) - widest;
    let high = Math.max(x0, x1) + widest;
    if (Math.abs(ex) > 1e-3) {
      const p = x0 - (py * ey) / ex;
      const q = x0 + (length - py * ey) / ex;
      low = Math.max(low, Math.min(p, q));
      high = Math.min(high, Math.max(p, q));
    }
    if (Math.abs(ey) > 1e-3) {
      const p = x0 + (py * ex - widest) / ey;
      const q = x0 + (py * ex + widest) / ey;
      low = Math.max(low, Math.min(p, q));
      high = Math.min(high, Math.max(p, q));
    }
    const first = Math.max(0, Math.floor(low - 0.5));
    const last = Math.min(buffer.width - 1, Math.ceil(high - 0.5));
    for (let x = first; x <= last; x += 1) {
      const px = x + 0.5 - x0;
      const t = (px * ex + py * ey) / length;
      if (t < 0 || t > 1) {
        continue;
      }
      const depth = 1 / ((1 - t) / strut.depth0A + t / strut.depth1A);
      const radiusA = strut.radiusA * strutProfile(t);
      const radiusPx = (strut.focalPx * radiusA) / depth;
      const across = py * ex - px * ey;
      const cover = radiusPx + 0.5 - Math.abs(across);
      if (cover <= 0) {
        continue;
      }
      const u = Math.max(-1, Math.min(1, across / radiusPx));
      const step = ((u + 1) * 0.5 * acrossSteps + 0.5) | 0;
      const at = y * buffer.width + x;
      const surface = depth - fronts[step]! * radiusA * frontZ;
      if (surface >= buffer.depths[at]!) {
        continue;
      }
      const share = otherShare(t);
      const body = bodies[step]! * contactShade(t);
      const gloss = glosses[step]!;
      const fade = strut.fade0 + (strut.fade1 - strut.fade0) * t;
      const red = Math.min(255, (one[0] + (other[0] - one[0]) * share) * body + gloss);
      const green = Math.min(255, (one[1] + (other[1] - one[1]) * share) * body + gloss);
      const blue = Math.min(255, (one[2] + (other[2] - one[2]) * share) * body + gloss);
      const colour = pack(
        red + (paper[0] - red) * fade,
        green + (paper[1] - green) * fade,
        blue + (paper[2] - blue) * fade,
      );
      if (cover >= 1) {
        buffer.pixels[at] = colour;
        buffer.depths[at] = surface;
      } else {
        buffer.pixels[at] = blend(buffer.pixels[at]!, colour, (cover * 256) | 0);
        if (cover > 0.5) {
          buffer.depths[at] = surface;
        }
      }
    }
  }
}
