import type { Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';

import { listenForComplaints, openBrowser, type Browser, type Graphics } from './chromium.js';
import { startProduct, type Product } from './product.js';

let product: Product;

beforeAll(async () => {
  product = await startProduct();
});

afterAll(async () => {
  await product.stop();
});

async function signInAs(page: Page, name: string): Promise<void> {
  await page.goto(`${product.origin}/sign-in`);
  await page.getByRole('button', { name: new RegExp(name) }).click();
  await page.getByRole('heading', { name: 'Lattices' }).waitFor();
}

async function signOut(page: Page): Promise<void> {
  await page.context().clearCookies();
}

/** From rock salt with magnesium and oxygen at the measured edge. */
async function defineMagnesia(page: Page): Promise<void> {
  await page.getByRole('link', { name: 'New lattice' }).first().click();
  await page.getByRole('radio', { name: /^Rock salt/ }).click();
  for (const [replaced, element] of [
    ['Na', 'Mg'],
    ['Cl', 'O'],
  ] as const) {
    await page.getByLabel(`Element in place of ${replaced}`).fill(element);
    await page.keyboard.press('Enter');
  }
  await page.getByText(/A guess from ionic radii: a = 2/).waitFor();
  await page.getByRole('button', { name: 'Create the lattice' }).click();
  await page.waitForURL(/section=cell/);
  await page.getByRole('textbox', { name: /^a, ångström/ }).fill('4.212');
  await page.getByText(/Saved as draft/).waitFor();
}

async function openSection(page: Page, name: string): Promise<void> {
  await page
    .getByRole('navigation')
    .getByRole('link', { name: new RegExp(`^${name}`) })
    .first()
    .click();
}

describe.each<Graphics>(['none', 'webgl'])('the main job with graphics: %s', (graphics) => {
  let browser: Browser;
  let page: Page;

  beforeEach(async () => {
    browser = await openBrowser(graphics);
    page = browser.context.pages()[0] ?? (await browser.context.newPage());
  });

  afterEach(async () => {
    await browser.close();
  });

  it('goes from rock salt to a returned, shared revision', async () => {
    const complaints = listenForComplaints(page);
    await signInAs(page, 'Teodor Brandl');
    await defineMagnesia(page);

    await openSection(page, 'Energy');
    // −M k_e 4/d₀ with M = 1.747 564 594 633 (OEIS A085469), k_e of CODATA 2022, d₀ = 2.106 Å:
    // −47.795 461 72; k_e leaves seven decimals certain.
    await page.getByText('−47.795 461 7').first().waitFor();
    if (graphics === 'webgl') {
      await page.goto(`${page.url()}${page.url().includes('?') ? '&' : '?'}renderer=webgl`);
    }
    const stage = page.locator('[data-renderer]');
    await stage.waitFor();
    expect(await stage.getAttribute('data-renderer')).toBe(graphics === 'none' ? 'cpu' : 'webgl');
    await expect
      .poll(async () => Number(await stage.getAttribute('data-frame')), { timeout: 20_000 })
      .toBeGreaterThan(0);

    await page.getByRole('row', { name: /3\.648/ }).click();
    await expect.poll(() => page.url()).toMatch(/row=/);
    // The address changes before the page has been drawn anew.
    await page.getByRole('row', { name: /3\.648/, selected: true }).waitFor();

    await page.getByRole('button', { name: 'Save revision' }).click();
    await page.getByRole('dialog').getByRole('textbox').fill('Measured edge');
    await page.getByRole('dialog').getByRole('button', { name: /Save/ }).click();
    await page.getByRole('button', { name: 'Submit for review' }).click();
    await page.getByRole('dialog').getByRole('button', { name: 'Submit' }).click();
    await page.getByText('In review').first().waitFor();
    const address = new URL(page.url());

    await signOut(page);
    await signInAs(page, 'Sabela Carrow');
    await page.goto(`${address.origin}${address.pathname}?section=remarks`);
    await page.getByRole('textbox').last().fill('Is 4.212 Å at room temperature?');
    await page.getByRole('button', { name: 'Pin remark' }).click();
    await page.getByText('Is 4.212 Å at room temperature?').first().waitFor();
    await page.getByRole('button', { name: 'Return or accept' }).click();
    const decision = page.getByRole('dialog');
    await decision.getByRole('textbox').fill('State the temperature.');
    await decision.getByRole('button', { name: 'Return', exact: true }).click();
    await page.getByText('Returned').first().waitFor();

    await signOut(page);
    await signInAs(page, 'Teodor Brandl');
    await page.goto(`${address.origin}${address.pathname}`);
    await page.getByRole('button', { name: 'Share' }).click();
    await page.getByRole('dialog').getByRole('button', { name: 'Create a link' }).click();
    const link = page.getByRole('dialog').locator('input[readonly], code').first();
    await link.waitFor();
    const shared = (await link.inputValue().catch(() => null)) ?? (await link.textContent()) ?? '';
    expect(shared).toMatch(/\/s\/[A-Za-z0-9_-]{43}$/);

    await signOut(page);
    await page.goto(`${product.origin}${new URL(shared, product.origin).pathname}`);
    await page.getByText('−47.795 461 7').first().waitFor();
    await page.locator('[data-renderer]').waitFor();
    expect(await page.getByRole('button', { name: /Save|Submit|Share/ }).count()).toBe(0);
    expect(complaints.list).toEqual([]);
  });
});
