import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { expectAccessible, openBrowser, openPage, signInAs } from './browser';

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

/** A new beam of the demo's boathouse: two spans of 20 ft and 16 ft, a uniform load on each, in one case. */
async function makeBeam(page: Page, title: string): Promise<void> {
  await signInAs(page, 'mira.oduya');
  await page.getByRole('link', { name: /Mill Race Boathouse/ }).click();
  await page.getByRole('link', { name: 'New sheet' }).click();
  await page.getByLabel('Title').fill(title);
  await page.getByRole('button', { name: 'Make the sheet' }).click();
  await page.waitForURL(/\/sheets\/[0-9a-f-]{36}$/);
  // As fast as keys come: none of them goes astray when Enter leads to the next cell.
  await page.locator('[data-path="geometry.spans.0.length"]').focus();
  await page.keyboard.type('20 ft');
  await page.keyboard.press('Enter');
  await page.keyboard.type('16 ft');
  const lengths = [0, 1].map((i) => page.locator(`[data-path="geometry.spans.${i}.length"]`).inputValue());
  expect(await Promise.all(lengths)).toEqual(['20 ft', '16 ft']);
}

const leafTop = (page: Page) => page.locator('.leaf').evaluate((leaf) => leaf.scrollTop);
const focusedPath = (page: Page) =>
  page.evaluate(() =>
    document.activeElement instanceof HTMLElement ? document.activeElement.dataset.path : '',
  );

/** Clicks the middle of a member in the drawing; a level line has no height of its own to click by name. */
async function clickMember(page: Page, id: string): Promise<void> {
  const line = page.locator(`.live-draw line.hit[data-id="${id}"]`);
  await line.waitFor({ state: 'attached' });
  const at = await line.evaluate((el) => {
    const box = el.getBoundingClientRect();
    return { x: box.x + box.width / 2, y: box.y + box.height / 2 };
  });
  await page.mouse.click(at.x, at.y);
}

/** Presses Tab until the control with this name has the focus. */
async function tabTo(page: Page, name: string): Promise<void> {
  for (let i = 0; i < 80; i++) {
    await page.keyboard.press('Tab');
    const at = await page.evaluate(
      () => document.activeElement?.getAttribute('aria-label') ?? document.activeElement?.textContent,
    );
    if (at === name) return;
  }
  throw new Error(`Tab never reaches ${name}`);
}

describe('the drawing and the page beside the form', () => {
  it('leads from joints and members to supports and loads, by buttons and by a click', async () => {
    const { page, errors } = await openPage(browser);
    await makeBeam(page, 'Beam at the landing');
    await tabTo(page, 'Joints and members');
    await page.keyboard.press('Enter');
    await tabTo(page, 'Support at 2');
    expect(await page.locator('.live-draw .lit[data-of="support"][data-id="2"]').count()).toBeGreaterThan(0);
    await page.keyboard.press('Enter');
    await page.waitForFunction(
      () => (document.activeElement as HTMLElement | null)?.dataset.path === 'geometry.supports.1.kind',
    );
    await clickMember(page, '2-3');
    await page.getByRole('heading', { name: 'Loads', level: 1 }).waitFor();
    await expect.poll(() => focusedPath(page), { timeout: 30_000 }).toBe('cases.0.loads.0.first');
    expect(await page.locator('[data-path="cases.0.loads.0.on"]').inputValue()).toBe('2-3');
    await page.keyboard.type('0.8 kip/ft');
    await page.getByText('Solution', { exact: true }).first().waitFor();
    await expectAccessible(page);
    expect(errors).toEqual([]);
  });

  it('shows N, V, M and the deflected shape over the drawing, enlarges it and fits it again', async () => {
    const { page, errors } = await openPage(browser);
    await makeBeam(page, 'Beam at the slip');
    await clickMember(page, '1-2');
    await page.keyboard.type('1.2 kip/ft');
    await page.getByText('Solution', { exact: true }).first().waitFor();
    const drawing = page.locator('.live-draw svg');
    for (const [name, words] of [
      ['Axial force', /^Axial force/],
      ['Shear', /^Shear/],
      ['Moments', /^Bending moment/],
      ['Deflected shape', /deflected/i],
    ] as const) {
      await page.getByRole('button', { name }).press('Enter');
      await expect.poll(() => drawing.getAttribute('aria-label'), { timeout: 30_000 }).toMatch(words);
    }
    const width = () => drawing.evaluate((svg) => svg.getBoundingClientRect().width);
    const fitted = await width();
    await page.getByRole('button', { name: 'Larger' }).press('Enter');
    await expect.poll(width, { timeout: 30_000 }).toBeGreaterThan(1.4 * fitted);
    await page.getByRole('button', { name: 'Fit' }).press('Enter');
    await expect.poll(width, { timeout: 30_000 }).toBe(fitted);
    await expectAccessible(page);
    expect(errors).toEqual([]);
  });

  it('keeps the part of the page in view that the form writes, until it is told not to', async () => {
    const { page, errors } = await openPage(browser);
    await page.emulateMedia({ reducedMotion: 'reduce' });
    await makeBeam(page, 'Beam at the workshop');
    await clickMember(page, '1-2');
    await page.keyboard.type('1.2 kip/ft');
    await page.getByText('Solution', { exact: true }).first().waitFor();
    await page.getByRole('button', { name: /^Checks/ }).press('Enter');
    const heading = page.locator('.leaf .blk.heading', { hasText: 'Checks' });
    await expect
      .poll(() => heading.evaluate((h) => h.getBoundingClientRect().top), { timeout: 30_000 })
      .toBeLessThan(900);
    await page.getByLabel('Follow the form').press('Space');
    const left = await leafTop(page);
    await page.getByRole('button', { name: /^Basis/ }).press('Enter');
    await page.getByRole('heading', { name: 'Basis', level: 1 }).waitFor();
    expect(await leafTop(page)).toBe(left);
    await page.getByLabel('Follow the form').press('Space');
    await expect.poll(() => leafTop(page), { timeout: 30_000 }).toBeLessThan(left);
    expect(errors).toEqual([]);
  });
});
