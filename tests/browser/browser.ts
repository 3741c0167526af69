import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { type Browser, type BrowserContext, chromium, type Page } from 'playwright-core';
import { expect } from 'vitest';

const axe = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

/** Address of the site under test; verify sets it. */
export function site(): string {
  const address = process.env.SITE_URL;
  if (!address) throw new Error('SITE_URL names the site that the browser tests run against');
  return address;
}

export function openBrowser(): Promise<Browser> {
  return chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  });
}

/** A page of a person of their own; what its console reports as an error is gathered in `errors`. */
export async function openPage(
  browser: Browser,
  width = 1440,
): Promise<{ page: Page; context: BrowserContext; errors: string[] }> {
  const context = await browser.newContext({ viewport: { width, height: 900 }, acceptDownloads: true });
  const page = await context.newPage();
  const errors: string[] = [];
  page.on('console', (message) => {
    if (message.type() === 'error') errors.push(message.text());
  });
  page.on('pageerror', (error) => errors.push(error.message));
  return { page, context, errors };
}

export async function signInAs(page: Page, name: string): Promise<void> {
  await page.goto(`${site()}/sign-in`);
  await page.getByLabel('E-mail').fill(`${name}@lindqvist-arrow.example`);
  await page.getByLabel('Password').fill('plumb-line-and-level');
  await page.keyboard.press('Enter');
  await page.waitForURL(/\/jobs/);
}

/** Holds the page against the rules of WCAG 2.0 to 2.2, A and AA, that axe can test. */
export async function expectAccessible(page: Page): Promise<void> {
  await page.waitForFunction(() => document.title !== '');
  await page.evaluate(axe);
  const found = await page.evaluate(async () => {
    const tags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];
    const engine = (
      globalThis as unknown as {
        axe: {
          run: (
            root: Document,
            options: object,
          ) => Promise<{ violations: { id: string; nodes: { target: string[] }[] }[] }>;
        };
      }
    ).axe;
    const { violations } = await engine.run(document, { runOnly: { type: 'tag', values: tags } });
    return violations.map(
      (v) =>
        `${v.id}: ${v.nodes
          .slice(0, 3)
          .map((n) => n.target.join(' '))
          .join(' | ')}`,
    );
  });
  expect(found, page.url()).toEqual([]);
}
