import { describe, expect, it } from 'vitest';

import type { RibbonBatch, SphereBatch, StrutBatch } from '../model/drawing.ts';
import { blend, createBuffer, darken, pack, type RasterBuffer } from './raster-buffer.ts';
import { Rasteriser, type RasterCamera, type RasterScene } from './raster-frame.ts';

const size = 200;
const distance = 20;
const focalPx = 400;

/** The eye at (0, 0, 20), looking along −z. */
const camera: RasterCamera = {
  view: [1, 0, 0, 0, 0, 1, 0, 0, 0, 0, 1, 0, 0, 0, -distance, 1],
  focalPx,
  nearA: 10,
  farA: 30,
  pixelRatio: 1,
};
const paper = pack(247, 245, 240);
const channels = (pixel: number): number[] => [
  pixel & 255,
  (pixel >> 8) & 255,
  (pixel >> 16) & 255,
];

function balls(
  ...rows: [x: number, y: number, z: number, radius: number, colour: number][]
): SphereBatch {
  return {
    count: rows.length,
    centresA: Float32Array.from(rows.flatMap(([x, y, z]) => [x, y, z])),
    radiiA: Float32Array.from(rows, (row) => row[3]),
    colours: Uint8Array.from(rows, (row) => row[4]),
    signs: new Int8Array(rows.length),
  };
}

function draw(parts: Partial<RasterScene>, eye = camera): RasterBuffer {
  const buffer = createBuffer(size, size);
  const scene: RasterScene = {
    spheres: [],
    struts: [],
    ribbons: [],
    palette: ['#B5532A', '#1F7A7D'],
    paper: '#F7F5F0',
    foot: '#F7F5F0',
    ...parts,
  };
  new Rasteriser().draw(buffer, scene, eye);
  return buffer;
}

const pixelAt = ({ pixels }: RasterBuffer, x: number, y: number): number => pixels[y * size + x]!;
const isWarm = (pixel: number): boolean => channels(pixel)[0]! > channels(pixel)[2]!;
const inked = ({ pixels }: RasterBuffer): number =>
  pixels.filter((pixel) => pixel !== paper).length;

describe('blending', () => {
  it('runs from the ground to the colour without steps back', () => {
    const [ground, colour] = [pack(10, 200, 90), pack(250, 20, 91)];
    expect(blend(ground, colour, 0)).toBe(ground);
    expect(blend(ground, colour, 256)).toBe(colour);
    let [lastRed, lastGreen] = [10, 200];
    for (let share = 0; share <= 256; share += 1) {
      const [red, green, blue] = channels(blend(ground, colour, share));
      expect(red).toBeGreaterThanOrEqual(lastRed);
      expect(green).toBeLessThanOrEqual(lastGreen);
      expect(Math.abs(blue! - 90)).toBeLessThanOrEqual(1);
      [lastRed, lastGreen] = [red!, green!];
    }
  });

  it('darkens every channel in the same proportion', () => {
    expect(channels(darken(pack(200, 100, 50), 128))).toEqual([100, 50, 25]);
  });
});

describe('balls', () => {
  it('cover the disc they project to: area and edge', () => {
    const buffer = draw({ spheres: [balls([0, 0, 0, 3, 1])] });
    // Outline of a ball in perspective: f r / √(d² − r²).
    const radius = (focalPx * 3) / Math.sqrt(distance * distance - 9);
    const solid = buffer.depths.filter(Number.isFinite).length;
    expect(Math.abs(solid / (Math.PI * radius * radius) - 1)).toBeLessThan(0.01);
    const rim = Math.round(size / 2 + radius);
    expect(pixelAt(buffer, rim + 2, size / 2)).toBe(paper);
    expect(pixelAt(buffer, rim - 2, size / 2)).not.toBe(paper);
  });

  it('hide what stands farther, whatever the order they come in', () => {
    const near: [number, number, number, number, number] = [0, 0, 4, 1, 0];
    const far: [number, number, number, number, number] = [0, 0, -4, 3, 1];
    for (const rows of [
      [near, far],
      [far, near],
    ]) {
      const buffer = draw({ spheres: [balls(...rows)] });
      expect(isWarm(pixelAt(buffer, size / 2, size / 2))).toBe(true);
      expect(isWarm(pixelAt(buffer, size / 2 + 45, size / 2))).toBe(false);
    }
  });

  it('are brighter toward the upper left, where the light is', () => {
    const buffer = draw({ spheres: [balls([0, 0, 0, 3, 1])] });
    const sum = (x: number, y: number): number =>
      channels(pixelAt(buffer, x, y)).reduce((total, part) => total + part, 0);
    expect(sum(80, 75)).toBeGreaterThan(sum(120, 125) + 60);
  });

  it('fade toward the paper with depth', () => {
    const away = (z: number): number => {
      const [, , blue] = channels(pixelAt(draw({ spheres: [balls([0, 0, z, 2, 0])] }), 110, 110));
      return 240 - blue!;
    };
    expect(away(8)).toBeGreaterThan(away(0) + 10);
    expect(away(0)).toBeGreaterThan(away(-8) + 10);
  });

  it('come out the same every time', () => {
    const spheres = [balls([0, 0, 0, 2, 0], [1, 1, 1, 1.5, 1], [-2, 0.5, -3, 1, 1])];
    expect(draw({ spheres }).pixels).toEqual(draw({ spheres }).pixels);
  });

  it('bear a light mark when asked: more of it for plus than for minus', () => {
    const marked = (sign: number): number => {
      const batch = { ...balls([0, 0, 0, 3, 1]), signs: Int8Array.of(sign) };
      return draw({ spheres: [batch] }).pixels.filter((pixel) => {
        const [red, green] = channels(pixel);
        return pixel !== paper && red! > 150 && green! > 150;
      }).length;
    };
    expect(marked(-1)).toBeGreaterThan(marked(0) + 50);
    expect(marked(1)).toBeGreaterThan(marked(-1) + 50);
  });

  it('outside the picture or behind the eye leave it empty', () => {
    expect(inked(draw({ spheres: [balls([50, 0, 0, 1, 0], [0, 0, 25, 1, 0])] }))).toBe(0);
  });
});

describe('struts', () => {
  const strut = (ends: number[], radiusA: number): StrutBatch => ({
    count: 1,
    endsA: Float32Array.from(ends),
    radiusA,
    colours: Uint8Array.of(0, 1),
  });

  it.each([0.4, 0.08])('of %d Å carry the colour of each end on its half', (radiusA) => {
    const buffer = draw({ struts: [strut([-4, 0, 0, 4, 0, 0], radiusA)] });
    expect(isWarm(pixelAt(buffer, 40, size / 2))).toBe(true);
    expect(isWarm(pixelAt(buffer, 160, size / 2))).toBe(false);
    expect(pixelAt(buffer, 10, size / 2)).toBe(paper);
    expect(pixelAt(buffer, 190, size / 2)).toBe(paper);
  });

  it('are as wide upright as level', () => {
    const level = inked(draw({ struts: [strut([-4, 0, 0, 4, 0, 0], 0.3)] }));
    const upright = inked(draw({ struts: [strut([0, -4, 0, 0, 4, 0], 0.3)] }));
    expect(Math.abs(level - upright) / level).toBeLessThan(0.02);
  });

  it('disappear behind a nearer ball', () => {
    const struts = [strut([-4, 0, -3, 4, 0, -3], 0.3)];
    const alone = draw({ spheres: [balls([0, 0, 3, 1.5, 1])] });
    const both = draw({ spheres: [balls([0, 0, 3, 1.5, 1])], struts });
    expect(pixelAt(both, size / 2, size / 2)).toBe(pixelAt(alone, size / 2, size / 2));
  });
});

describe('lines', () => {
  const line = (isDotted: boolean, hiddenOpacity: number): RibbonBatch => ({
    count: 1,
    endsA: Float32Array.of(-4, 0, 0, 4, 0, 0),
    widthPx: 3,
    colour: [0, 0, 0],
    opacity: 1,
    hiddenOpacity,
    isDotted,
    biasA: 0,
  });

  it('keep their width, and are partly open when dotted', () => {
    const full = inked(draw({ ribbons: [line(false, 0)] }));
    const dotted = inked(draw({ ribbons: [line(true, 0)] }));
    expect(full).toBeGreaterThan(160 * 3);
    expect(full).toBeLessThan(160 * 5.5);
    expect(dotted).toBeLessThan(full * 0.9);
  });

  it('show through a ball only as faintly as asked', () => {
    const spheres = [balls([0, 0, 2, 1.5, 1])];
    const plain = pixelAt(draw({ spheres }), size / 2, size / 2);
    const hidden = pixelAt(draw({ spheres, ribbons: [line(false, 0)] }), size / 2, size / 2);
    const faint = pixelAt(draw({ spheres, ribbons: [line(false, 0.4)] }), size / 2, size / 2);
    expect(hidden).toBe(plain);
    expect(channels(faint)[1]).toBeLessThan(channels(plain)[1]!);
    expect(channels(faint)[1]).toBeGreaterThan(channels(plain)[1]! * 0.4);
  });
});
