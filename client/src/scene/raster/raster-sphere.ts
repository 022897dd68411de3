import { blend, darken, type RasterBuffer } from './raster-buffer.ts';
import { fullCover, stampFor } from './raster-stamps.ts';
import { ballTableFor, type BallTable } from './raster-tones.ts';

/** A ball on the screen: pixels, and Å for the depth. */
export interface ScreenBall {
  x: number;
  y: number;
  radiusPx: number;
  depthA: number;
  radiusA: number;
}

/** Clips a span of pixels to 0 … size − 1. */
function clip(value: number, size: number): number {
  return value < 0 ? 0 : value > size - 1 ? size - 1 : value;
}

/** Balls up to this many pixels radius are drawn from stamps. */
const stampLimitPx = 26;

/** Lays a ball's colour over a pixel on its rim, by how much of the pixel the ball covers. */
function paintRim(
  { pixels, depths }: RasterBuffer,
  at: number,
  colour: number,
  cover: number,
  depth: number,
): void {
  pixels[at] = blend(pixels[at]!, colour, cover);
  if (cover > 128) {
    depths[at] = depth;
  }
}

/** A small ball: tones, heights and cover of its pixels are known, only the depth is compared. */
function drawStamp(buffer: RasterBuffer, ball: ScreenBall, palette: Uint32Array): void {
  const { pixels, depths, width, height } = buffer;
  const { depthA, radiusA } = ball;
  const stamp = stampFor(ball.radiusPx, ball.x, ball.y);
  const { size, tones, heights, covers, firsts, lasts } = stamp;
  const left = Math.floor(ball.x) - stamp.middle;
  const top = Math.floor(ball.y) - stamp.middle;
  const soft = radiusA / ball.radiusPx;
  const softness = 256 / soft;
  const lastRow = Math.min(size - 1, height - 1 - top);
  for (let row = Math.max(0, -top); row <= lastRow; row += 1) {
    const first = Math.max(firsts[row]!, -left);
    const last = Math.min(lasts[row]!, width - 1 - left);
    let at = (top + row) * width + left + first;
    for (let entry = row * size + first; entry <= row * size + last; entry += 1, at += 1) {
      const depth = depthA - heights[entry]! * radiusA;
      const ahead = depths[at]! - depth;
      if (ahead <= 0) {
        continue;
      }
      const colour = palette[tones[entry]!]!;
      const cover = covers[entry]!;
      if (cover === fullCover) {
        // Where surfaces meet within a pixel they share it.
        pixels[at] = ahead < soft ? blend(pixels[at]!, colour, (ahead * softness) | 0) : colour;
        depths[at] = depth;
      } else {
        paintRim(buffer, at, colour, cover, depth);
      }
    }
  }
}

/** Pixels of one row from `first` to `last` that may lie on the rim of a large ball. */
function drawRimSpan(
  buffer: RasterBuffer,
  { x: cx, radiusPx: r, depthA, radiusA }: ScreenBall,
  { size, tones, heights }: BallTable,
  palette: Uint32Array,
  y: number,
  dy: number,
  first: number,
  last: number,
): void {
  const scale = size / 2 / r;
  const row = clip(Math.floor(size / 2 + dy * scale), size) * size;
  for (let x = first; x <= last; x += 1) {
    const dx = x + 0.5 - cx;
    const at = y * buffer.width + x;
    const entry = row + clip((size / 2 + dx * scale) | 0, size);
    const depth = depthA - heights[entry]! * radiusA;
    const cover = r + 0.5 - Math.sqrt(dx * dx + dy * dy);
    if (cover > 0 && buffer.depths[at]! > depth) {
      paintRim(buffer, at, palette[tones[entry]!]!, cover >= 1 ? 256 : (cover * 256) | 0, depth);
    }
  }
}

/** One row of a large ball: well inside it takes the table's tones as they are. */
function drawRow(
  buffer: RasterBuffer,
  ball: ScreenBall,
  table: BallTable,
  palette: Uint32Array,
  y: number,
): void {
  const { pixels, depths, width } = buffer;
  const { x: cx, radiusPx: r, depthA, radiusA } = ball;
  const { size, tones, heights } = table;
  const dy = y + 0.5 - ball.y;
  const reach = Math.sqrt(Math.max(0, (r + 0.5) * (r + 0.5) - dy * dy));
  const first = clip(Math.floor(cx - reach), width);
  const last = clip(Math.ceil(cx + reach) - 1, width);
  const inside = (r - 0.7) * (r - 0.7) - dy * dy;
  if (inside <= 0) {
    drawRimSpan(buffer, ball, table, palette, y, dy, first, last);
    return;
  }
  const half = Math.sqrt(inside);
  const innerFirst = clip(Math.ceil(cx - half - 0.5), width);
  const innerLast = clip(Math.floor(cx + half - 0.5), width);
  drawRimSpan(buffer, ball, table, palette, y, dy, first, innerFirst - 1);
  drawRimSpan(buffer, ball, table, palette, y, dy, innerLast + 1, last);
  const scale = size / 2 / r;
  const soft = radiusA / r;
  const softness = 256 / soft;
  const row = clip(Math.floor(size / 2 + dy * scale), size) * size;
  let at = y * width + innerFirst;
  let column = size / 2 + (innerFirst + 0.5 - cx) * scale;
  for (let x = innerFirst; x <= innerLast; x += 1, at += 1, column += scale) {
    const entry = row + (column | 0);
    const depth = depthA - heights[entry]! * radiusA;
    const ahead = depths[at]! - depth;
    if (ahead > 0) {
      const colour = palette[tones[entry]!]!;
      pixels[at] = ahead < soft ? blend(pixels[at]!, colour, (ahead * softness) | 0) : colour;
      depths[at] = depth;
    }
  }
}

export function drawBall(buffer: RasterBuffer, ball: ScreenBall, palette: Uint32Array): void {
  const { radiusPx: r, y: cy, x: cx } = ball;
  if (r < 0.3 || cx + r < 0 || cx - r > buffer.width) {
    return;
  }
  if (r < stampLimitPx) {
    drawStamp(buffer, ball, palette);
    return;
  }
  const table = ballTableFor(r);
  const first = Math.max(0, Math.floor(cy - r - 0.5));
  const last = Math.min(buffer.height - 1, Math.ceil(cy + r + 0.5) - 1);
  for (let y = first; y <= last; y += 1) {
    drawRow(buffer, ball, table, palette, y);
  }
}

/** How far contact shading reaches beyond a ball, in its radii, and how deep it is. */
const haloReach = 0.42;
const haloDepth = 0.3;
/** Things farther behind than this many radii are not touched. */
const haloFarRadii = 5;

/** Contact shading: darkens what stands close behind a ball, around its outline. */
export function drawHalo(buffer: RasterBuffer, ball: ScreenBall): void {
  const { x: cx, y: cy, radiusPx: r } = ball;
  const { width, height } = buffer;
  const outer = r * (1 + haloReach);
  const inner = r - 1;
  const firstRow = Math.max(0, Math.floor(cy - outer));
  const lastRow = Math.min(height - 1, Math.ceil(cy + outer));
  for (let y = firstRow; y <= lastRow; y += 1) {
    const dy = y + 0.5 - cy;
    const reach = Math.sqrt(Math.max(0, outer * outer - dy * dy));
    // The ball itself will cover the middle.
    const skip = Math.sqrt(Math.max(0, inner * inner - dy * dy));
    const first = Math.max(0, Math.floor(cx - reach));
    const last = Math.min(width - 1, Math.ceil(cx + reach));
    darkenSpan(buffer, ball, y, first, Math.min(last, Math.ceil(cx - skip)));
    darkenSpan(
      buffer,
      ball,
      y,
      Math.max(first, Math.ceil(cx - skip) + 1, Math.floor(cx + skip) - 1),
      last,
    );
  }
}

function darkenSpan(
  { pixels, depths, width }: RasterBuffer,
  { x: cx, y: cy, radiusPx: r, depthA, radiusA }: ScreenBall,
  y: number,
  first: number,
  last: number,
): void {
  const far = radiusA * haloFarRadii;
  const dy = y + 0.5 - cy;
  for (let x = first; x <= last; x += 1) {
    const at = y * width + x;
    const behind = depths[at]! - depthA;
    if (behind <= 0 || behind >= far) {
      continue;
    }
    const dx = x + 0.5 - cx;
    const away = (Math.sqrt(dx * dx + dy * dy) - r) / (r * haloReach);
    if (away < 1) {
      const edge = 1 - (away < 0 ? 0 : away);
      // What crosses the ball's middle plane is hardly behind it yet.
      const apart = Math.min(1, behind / (0.8 * radiusA));
      const strength = haloDepth * edge * edge * apart * (1 - behind / far);
      pixels[at] = darken(pixels[at]!, (256 * (1 - strength)) | 0);
    }
  }
}

/** Half length and half thickness of a mark's arms, in radii of its ball. */
const armLength = 0.3;
const armThickness = 0.075;

/** Cover of a pixel by a bar of the given half sizes around the ball's middle, 0 … 1. */
function barCover(dx: number, dy: number, halfX: number, halfY: number): number {
  const inX = Math.max(0, Math.min(1, halfX - Math.abs(dx) + 0.5));
  const inY = Math.max(0, Math.min(1, halfY - Math.abs(dy) + 0.5));
  return inX * inY;
}

function markCover(dx: number, dy: number, r: number, sign: number): number {
  const long = r * armLength;
  const thick = Math.max(0.7, r * armThickness);
  const level = barCover(dx, dy, long, thick);
  return sign > 0 ? Math.max(level, barCover(dx, dy, thick, long)) : level;
}

/** A raised + or − on the side toward the viewer: lit bars over a short shadow. */
export function drawMark(
  buffer: RasterBuffer,
  ball: ScreenBall,
  sign: number,
  light: number,
  fade: number,
): void {
  const { x: cx, y: cy, radiusPx: r, depthA, radiusA } = ball;
  if (r < 4) {
    return;
  }
  const front = depthA - radiusA * 1.001;
  const shift = Math.max(0.8, r * 0.035);
  const reach = r * armLength + shift + 1;
  const shown = 1 - fade;
  for (
    let y = Math.max(0, Math.floor(cy - reach));
    y <= Math.min(buffer.height - 1, cy + reach);
    y += 1
  ) {
    for (
      let x = Math.max(0, Math.floor(cx - reach));
      x <= Math.min(buffer.width - 1, cx + reach);
      x += 1
    ) {
      const at = y * buffer.width + x;
      if (buffer.depths[at]! < front) {
        continue;
      }
      const dx = x + 0.5 - cx;
      const dy = y + 0.5 - cy;
      const shadow = markCover(dx - shift, dy - shift, r, sign) * 0.45 * shown;
      const body = markCover(dx, dy, r, sign) * 0.96 * shown;
      const below = darken(buffer.pixels[at]!, (256 * (1 - shadow)) | 0);
      buffer.pixels[at] = blend(below, light, (256 * body) | 0);
    }
  }
}
