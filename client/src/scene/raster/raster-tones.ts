import { shade } from '../model/light.ts';
import type { Rgb } from '../model/colours.ts';
import { pack } from './raster-buffer.ts';

/** A tone is a step of brightness and a step of gloss in one number. */
const bodySteps = 128;
const glossSteps = 64;
const bodyRange = 1.25;
const glossRange = 0.45;
const toneCount = bodySteps * glossSteps;

function toneOf(nx: number, ny: number, nz: number): number {
  const { body, gloss } = shade(nx, ny, nz);
  const bodyStep = Math.min(bodySteps - 1, Math.max(0, Math.round((body / bodyRange) * bodySteps)));
  const glossStep = Math.min(glossSteps - 1, Math.round((gloss / glossRange) * glossSteps));
  return bodyStep * glossSteps + glossStep;
}

/** Tone and height of a unit ball over a square of `size` × `size` points. */
export interface BallTable {
  readonly size: number;
  readonly tones: Uint16Array;
  /** z of the surface, 0 … 1. */
  readonly heights: Float32Array;
}

function buildTable(size: number): BallTable {
  const tones = new Uint16Array(size * size);
  const heights = new Float32Array(size * size);
  for (let row = 0; row < size; row += 1) {
    for (let column = 0; column < size; column += 1) {
      let nx = ((column + 0.5) / size) * 2 - 1;
      let ny = 1 - ((row + 0.5) / size) * 2;
      const squared = nx * nx + ny * ny;
      const nz = Math.sqrt(Math.max(0, 1 - squared));
      if (squared > 1) {
        // Pixels on the rim reach a little beyond: they take the rim's tone.
        nx /= Math.sqrt(squared);
        ny /= Math.sqrt(squared);
      }
      tones[row * size + column] = toneOf(nx, ny, nz);
      heights[row * size + column] = nz;
    }
  }
  return { size, tones, heights };
}

const tables = new Map<number, BallTable>();

/** The smallest table that is fine enough for a ball of that many pixels radius. */
export function ballTableFor(radiusPx: number): BallTable {
  const size = radiusPx < 20 ? 64 : radiusPx < 90 ? 256 : 640;
  let table = tables.get(size);
  if (table === undefined) {
    table = buildTable(size);
    tables.set(size, table);
  }
  return table;
}

export const fadeSteps = 64;

/** Packed colour of every tone of one body colour, faded toward the paper. */
export function buildPalette(colour: Rgb, paper: Rgb, fade: number): Uint32Array {
  const palette = new Uint32Array(toneCount);
  for (let tone = 0; tone < toneCount; tone += 1) {
    const body = (Math.floor(tone / glossSteps) / bodySteps) * bodyRange;
    const gloss = ((tone % glossSteps) / glossSteps) * glossRange * 255;
    const at = (i: 0 | 1 | 2): number => {
      const lit = Math.min(255, colour[i] * body + gloss);
      return lit + (paper[i] - lit) * fade;
    };
    palette[tone] = pack(at(0), at(1), at(2));
  }
  return palette;
}
