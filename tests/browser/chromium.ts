import { mkdtemp, rm } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';

import { chromium, type BrowserContext, type Page } from 'playwright-core';

const flags = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/** A person's browser: with software WebGL (the page is asked to use it), or with none at all. */
export type Graphics = 'webgl' | 'none';

/** Console errors and failed requests seen on a page, so that a test can ask for none. */
export interface Complaints {
  readonly list: string[];
}

export interface Browser {
  readonly context: BrowserContext;
  close(): Promise<void>;
}

/** Starts Debian's Chromium with a profile of its own. */
export async function openBrowser(
  graphics: Graphics,
  options: { width?: number; height?: number; colorScheme?: 'light' | 'dark' } = {},
): Promise<Browser> {
  const profile = await mkdtemp(path.join(os.tmpdir(), 'holdfast-browser-'));
  const context = await chromium.launchPersistentContext(profile, {
    executablePath: '/usr/bin/chromium',
    headless: true,
    args: graphics === 'none' ? [...flags, '--disable-software-rasterizer'] : flags,
    viewport: { width: options.width ?? 1440, height: options.height ?? 900 },
    colorScheme: options.colorScheme ?? 'light',
    reducedMotion: 'reduce',
  });
  context.setDefaultTimeout(20_000);
  return {
    context,
    close: async () => {
      await context.close();
      await rm(profile, { recursive: true, force: true });
    },
  };
}

// R3F still constructs three's deprecated clock; the message is three's, not ours.
const allowed = /THREE\.Clock|Download the React DevTools/;

/** Collects what a page complains about from now on. */
export function listenForComplaints(page: Page): Complaints {
  const list: string[] = [];
  page.on('console', (message) => {
    if (message.type() === 'error' && !allowed.test(message.text())) {
      list.push(message.text());
    }
  });
  page.on('pageerror', (error) => list.push(String(error)));
  return { list };
}
