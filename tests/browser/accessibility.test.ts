import { AxeBuilder } from '@axe-core/playwright';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { openBrowser, type Browser } from './chromium.js';
import { startProduct, type Product } from './product.js';

let product: Product;

beforeAll(async () => {
  product = await startProduct();
});

afterAll(async () => {
  await product.stop();
});

const pages = [
  '/w/kiln-lane',
  '/w/kiln-lane/new',
  '/w/kiln-lane/members',
  '/w/kiln-lane/settings',
  '/w/kiln-lane/audit',
  '/me',
];
const sections = ['energy', 'cell', 'sites', 'remarks', 'history'];

/** What axe finds on the page as it stands, in words. */
async function findings(browser: Browser): Promise<string[]> {
  const page = browser.context.pages()[0]!;
  const { violations } = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
    .analyze();
  return violations.map(
    ({ id, nodes }) => `${new URL(page.url()).pathname}: ${id} at ${String(nodes[0]?.target)}`,
  );
}

describe.each(['light', 'dark'] as const)('every page in %s', (colorScheme) => {
  it('gives axe nothing to find', { timeout: 420_000 }, async () => {
    const browser = await openBrowser('none', { colorScheme });
    try {
      const page = browser.context.pages()[0] ?? (await browser.context.newPage());
      await page.goto(`${product.origin}/sign-in`);
      await page.getByRole('button', { name: /Runa Halvard/ }).waitFor();
      const found = await findings(browser);
      await page.getByRole('button', { name: /Runa Halvard/ }).click();
      await page.getByRole('link', { name: 'Periclase, trial 3' }).first().waitFor();
      const lattice = await page
        .getByRole('link', { name: 'Periclase, trial 3' })
        .first()
        .getAttribute('href');
      for (const path of [...pages, ...sections.map((name) => `${lattice}?section=${name}`)]) {
        await page.goto(`${product.origin}${path}`);
        await page.getByRole('heading', { level: 1 }).first().waitFor();
        await page.waitForLoadState('networkidle');
        found.push(...(await findings(browser)));
      }
      expect(found).toEqual([]);
    } finally {
      await browser.close();
    }
  });
});
