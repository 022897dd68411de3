import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { z } from 'zod';

import { openBrowser } from './chromium.js';
import { startProduct, type Product } from './product.js';

let product: Product;
let empty: Product;

beforeAll(async () => {
  product = await startProduct();
  empty = await startProduct({ HOLDFAST_DEMO: 'off' });
});

afterAll(async () => {
  await product.stop();
  await empty.stop();
});

const workspacePages = ['', '/new', '/members', '/data', '/settings', '/audit'].map(
  (page) => `/w/kiln-lane${page}`,
);
const sections = [
  'energy',
  'spacing',
  'formation',
  'checks',
  'cell',
  'sites',
  'remarks',
  'history',
];

/** What axe finds on the page as it stands, in words. */
async function findings(page: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
    .analyze();
  return violations.map(
    ({ id, nodes }) => `${new URL(page.url()).pathname}: ${id} at ${String(nodes[0]?.target)}`,
  );
}

/** Opens an address, waits for its heading and its data, and asks axe. */
async function findingsAt(page: Page, address: string): Promise<string[]> {
  await page.goto(address);
  await page.getByRole('heading', { level: 1 }).first().waitFor();
  await page.waitForLoadState('networkidle');
  return await findings(page);
}

/** Makes something through the API as the signed-in person and gives the secret of its link. */
async function makeLink(page: Page, address: string, body: object): Promise<string> {
  const response = await page.request.post(address, {
    data: body,
    headers: { Origin: product.origin },
  });
  expect(response.status()).toBe(201);
  return z.object({ token: z.string() }).parse(await response.json()).token;
}

/** Addresses that people without an account open from a link. */
async function linkedPages(page: Page, lattice: string): Promise<string[]> {
  const api = `${product.origin}/api/workspaces/kiln-lane`;
  const latticeId = lattice.split('/').at(-1);
  const share = await makeLink(page, `${api}/lattices/${latticeId}/revisions/1/shares`, {});
  const email = `new-${Date.now()}@kiln-lane.example`;
  const invitation = await makeLink(page, `${api}/invitations`, { email, role: 'reviewer' });
  return [
    `/s/${share}`,
    `/s/${'A'.repeat(43)}`,
    `/accept-invite/${invitation}`,
    `/accept-invite/${'A'.repeat(43)}`,
  ];
}

describe.each(['light', 'dark'] as const)('every page in %s', (colorScheme) => {
  it('gives axe nothing to find', { timeout: 420_000 }, async () => {
    const browser = await openBrowser('none', { colorScheme });
    try {
      const page = browser.context.pages()[0] ?? (await browser.context.newPage());
      const found = await findingsAt(page, `${empty.origin}/setup`);
      found.push(...(await findingsAt(page, `${product.origin}/sign-in`)));
      await page.getByRole('button', { name: /Runa Halvard/ }).click();
      const periclase = page.getByRole('link', { name: 'Periclase, trial 3' }).first();
      await periclase.waitFor();
      const lattice = (await periclase.getAttribute('href')) ?? '';
      const addresses = [
        ...workspacePages,
        ...sections.map((name) => `${lattice}?section=${name}`),
        `${lattice}/report?rev=1`,
        '/methods',
        '/me',
        '/nothing/is/here',
        ...(await linkedPages(page, lattice)),
      ];
      for (const address of addresses) {
        found.push(...(await findingsAt(page, `${product.origin}${address}`)));
      }
      await page.context().clearCookies();
      for (const address of addresses.slice(-4)) {
        found.push(...(await findingsAt(page, `${product.origin}${address}`)));
      }
      expect(found).toEqual([]);
    } finally {
      await browser.close();
    }
  });
});
