import { normalise, type Vector } from './vector.ts';

/**
 * One light for both renderers, in the viewer's frame (x right, y up, z toward the eye): a soft
 * key light from the upper left, an open sky, a little less light at the rim, and a gloss.
 * The shaders of the parts and the tables of the processor renderer are built from these.
 */
export const keyLight: Vector = normalise([-0.46, 0.64, 0.62]);
/** Halfway between the key light and the eye: where the gloss stands. */
export const glossDirection: Vector = normalise([keyLight[0], keyLight[1], keyLight[2] + 1]);

export const light = {
  ambient: 0.4,
  key: 0.66,
  /** How far the key light reaches round the terminator. */
  wrap: 0.22,
  sky: 0.07,
  rim: 0.16,
  gloss: 0.32,
  glossPower: 52,
  sheen: 0.075,
  sheenPower: 9,
} as const;

/** The pool of the ground's colour under the block: shares of the stage's width and height. */
export const ground = { middle: 0.8, width: 0.47, height: 0.19 } as const;

/** Strength of the ground's colour at a place of the stage, given as shares of its size. */
export function groundAt(x: number, y: number): number {
  const across = (x - 0.5) / ground.width;
  const down = (y - ground.middle) / ground.height;
  return Math.max(0, 1 - across * across - down * down) ** 2;
}

/** Share of the paper's colour at the far end of the block. */
export const farFade = 0.66;

/** Brightness of the body colour and strength of the white gloss for a unit normal. */
export function shade(nx: number, ny: number, nz: number): { body: number; gloss: number } {
  const [lx, ly, lz] = keyLight;
  const [hx, hy, hz] = glossDirection;
  const lambert = (nx * lx + ny * ly + nz * lz + light.wrap) / (1 + light.wrap);
  const key = Math.max(0, lambert);
  const half = Math.max(0, nx * hx + ny * hy + nz * hz);
  const rim = (1 - Math.max(0, nz)) ** 3;
  return {
    body: light.ambient + light.key * key + light.sky * ny - light.rim * rim,
    gloss: light.gloss * half ** light.glossPower + light.sheen * half ** light.sheenPower * key,
  };
}

/** Share of the paper's colour at a depth between the near and the far end of the block. */
export function fadeAt(depthA: number, nearA: number, farA: number): number {
  const share = Math.max(0, Math.min(1, (depthA - nearA) / (farA - nearA || 1)));
  return farFade * share * (0.5 + 0.5 * share);
}
