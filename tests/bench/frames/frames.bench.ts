/** Frame times of the stage while it turns. Numbers for reading; nothing is asserted here. */
import { mkdtemp, rm } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

import { chromium } from 'playwright-core';
import { build, preview } from 'vite';

export interface FrameFigures {
  readonly renderer: 'cpu' | 'webgl';
  readonly ions: number;
  readonly medianMs: number;
  readonly p95Ms: number;
  readonly frames: number;
  readonly canvas: string;
}

interface Measured {
  times: number[];
  renderer: string;
  width: number;
  height: number;
}

type Counts = readonly [number, number, number];

const blocks: Readonly<Record<number, Counts>> = {
  64: [4, 4, 4],
  512: [8, 8, 8],
  2000: [10, 10, 20],
  8000: [20, 20, 20],
};
const runs = [
  { renderer: 'cpu', ions: [64, 512, 2000, 8000], frames: 120 },
  { renderer: 'webgl', ions: [64, 512], frames: 30 },
] as const;

/** No frame limit, so that an interval is the work; without a software GL for the processor path. */
const flags = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
  '--disable-frame-rate-limit',
  '--disable-gpu-vsync',
];

function quantile(sorted: readonly number[], share: number): number {
  const at = Math.min(sorted.length - 1, Math.floor(sorted.length * share));
  return Math.round((sorted[at] ?? 0) * 10) / 10;
}

async function measureRun(
  address: string,
  { renderer, ions: sizes, frames }: (typeof runs)[number],
): Promise<FrameFigures[]> {
  const browser = await chromium.launch({
    executablePath: '/usr/bin/chromium',
    headless: true,
    args: renderer === 'cpu' ? [...flags, '--disable-software-rasterizer'] : flags,
  });
  const figures: FrameFigures[] = [];
  try {
    for (const ions of sizes) {
      const page = await browser.newPage({ viewport: { width: 1000, height: 800 } });
      await page.goto(`${address}?renderer=${renderer}`);
      await page.waitForFunction(() => 'measureFrames' in window);
      const argument = { counts: blocks[ions]!, frames };
      const measured = await page.evaluate(async ({ counts, frames: count }) => {
        const measure = Reflect.get(window, 'measureFrames') as (
          counts: Counts,
          count: number,
        ) => Promise<Measured>;
        return measure(counts, count);
      }, argument);
      if (measured.renderer !== renderer) {
        throw new Error(`Asked for ${renderer}, drawn by ${measured.renderer}.`);
      }
      const sorted = measured.times.toSorted((one, other) => one - other);
      figures.push({
        renderer,
        ions,
        medianMs: quantile(sorted, 0.5),
        p95Ms: quantile(sorted, 0.95),
        frames: sorted.length,
        canvas: `${measured.width}×${measured.height}`,
      });
      await page.close();
    }
  } finally {
    await browser.close();
  }
  return figures;
}

/** Builds the page, turns blocks of several sizes in Chromium and returns the frame times. */
export async function runFrameBench(): Promise<FrameFigures[]> {
  const configFile = fileURLToPath(new URL('vite.config.js', import.meta.url));
  const outDir = await mkdtemp(path.join(os.tmpdir(), 'holdfast-frames-'));
  try {
    await build({ configFile, build: { outDir } });
    const server = await preview({
      configFile,
      build: { outDir },
      preview: { host: '127.0.0.1', port: 0 },
    });
    try {
      const address = server.resolvedUrls?.local[0];
      if (address === undefined) {
        throw new Error('The page that measures frames is not served.');
      }
      const figures: FrameFigures[] = [];
      for (const run of runs) {
        figures.push(...(await measureRun(address, run)));
      }
      return figures;
    } finally {
      await server.close();
    }
  } finally {
    await rm(outDir, { recursive: true, force: true });
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const figures = await runFrameBench();
  console.log(JSON.stringify({ bench: 'frames', figures }, null, 2));
  console.table(figures);
}
