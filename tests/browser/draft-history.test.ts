import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { expectAccessible, openBrowser, openPage, signInAs } from './browser';

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

/** Waits until the history has this version, looking at it afresh as often as it takes. */
async function untilKept(page: Page, version: number): Promise<void> {
  const dialog = page.getByRole('dialog', { name: 'History of the draft' });
  for (let tries = 0; tries < 40; tries++) {
    await page.getByRole('button', { name: 'History of the draft' }).click();
    await dialog.getByRole('button', { name: /^1 / }).waitFor();
    const found = await dialog.getByRole('button', { name: new RegExp(`^${version} `) }).count();
    await dialog.getByRole('button', { name: 'Close' }).click();
    if (found > 0) return;
    await page.waitForTimeout(250);
  }
  throw new Error(`version ${version} was not kept`);
}

describe('the history of a draft', () => {
  it('shows what was written differently, and brings it back by keyboard', async () => {
    const { page, errors } = await openPage(browser);
    await signInAs(page, 'mira.oduya');
    await page.getByRole('link', { name: /Corn Row Library/ }).click();
    await page.getByRole('link', { name: 'New sheet' }).click();
    await page.getByLabel('Title').fill('Stair beam');
    await page.getByRole('button', { name: 'Make the sheet' }).click();
    await page.waitForURL(/\/sheets\/[0-9a-f-]{36}$/);
    const span = page.locator('[data-cell="0:0"]');
    await span.fill('5 m');
    await untilKept(page, 2);
    await span.fill('6.5 m');
    await untilKept(page, 3);
    await page.getByRole('button', { name: 'History of the draft' }).focus();
    await page.keyboard.press('Enter');
    const dialog = page.getByRole('dialog', { name: 'History of the draft' });
    await dialog.getByRole('button', { name: /^2 / }).focus();
    await page.keyboard.press('Enter');
    await dialog.getByText('then 5 m, now 6.5 m').waitFor();
    await expectAccessible(page);
    await dialog.getByRole('button', { name: 'Return to version 2' }).focus();
    await page.keyboard.press('Enter');
    await dialog.waitFor({ state: 'hidden' });
    expect(await span.inputValue()).toBe('5 m');
    await untilKept(page, 4);
    await page.reload();
    expect(await span.inputValue()).toBe('5 m');
    expect(errors).toEqual([]);
  });
});
