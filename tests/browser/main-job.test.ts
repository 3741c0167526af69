import { execFileSync } from 'node:child_process';
import { mkdtempSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { expectAccessible, openBrowser, openPage, signInAs, site } from './browser';

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

/** The newest letter to an address since a moment, as the local mail server kept it; its names begin with the time. */
async function letterTo(address: string, part: string, since: Date): Promise<string> {
  const from = since.toISOString().replace(/[:.]/g, '-');
  const folder = join(process.env.DEMO_FOLDER as string, 'mail');
  for (let i = 0; i < 60; i++) {
    const letters = readdirSync(folder)
      .filter((name) => name >= from)
      .sort()
      .reverse()
      .map((name) => readFileSync(join(folder, name), 'utf8'));
    const found = letters.find((text) => text.includes(`To: ${address}`) && text.includes(part));
    if (found) return found.replace(/=\r\n/g, '').replace(/=3D/g, '=');
    await new Promise((resolve) => setTimeout(resolve, 500));
  }
  throw new Error(`no letter to ${address}`);
}

describe('the main job', () => {
  it('goes from sign-in to the reviewer’s decision', async () => {
    const title = 'Canopy beam, two spans';
    const engineer = await openPage(browser);
    const { page } = engineer;
    await signInAs(page, 'mira.oduya');
    await expectAccessible(page);
    await page.getByRole('link', { name: /Mill Race Boathouse/ }).click();
    await page.getByRole('link', { name: 'New sheet' }).click();
    await page.getByLabel('Title').fill(title);
    await page.getByRole('button', { name: 'Make the sheet' }).click();
    await page.waitForURL(/\/sheets\/[0-9a-f-]{36}$/);

    // By keyboard: two spans, then a load on each.
    await page.locator('[data-cell="0:0"]').focus();
    await page.keyboard.type('18\'-6"');
    await page.keyboard.press('Enter');
    await page.keyboard.type('15 ft');
    await page.getByRole('button', { name: 'Loads' }).focus();
    await page.keyboard.press('Enter');
    await page.getByRole('button', { name: 'Add a load' }).focus();
    await page.keyboard.press('Enter');
    await page.getByLabel('value, row 1').fill('3*0.4 kip/ft');
    await page.getByLabel('value, row 1').press('Enter');
    await page.getByText('Solution', { exact: true }).first().waitFor();
    await page.locator('.leaf:not(.behind)').first().waitFor();
    await expectAccessible(page);
    await page.getByText(/^Kept \d/).waitFor();
    await page.getByRole('button', { name: 'Freeze as revision 0' }).click();
    await page.getByLabel('What it is issued for').fill('First issue, for permit.');
    await page.getByRole('button', { name: 'Freeze', exact: true }).click();
    await page.waitForURL(/\/revisions\//);
    await expectAccessible(page);
    await page.getByLabel('Checker', { exact: true }).selectOption({ label: 'Jonas Weir' });
    await page.getByLabel(/Every input is held/).uncheck();
    await page.getByRole('button', { name: 'Send to check' }).click();
    await page.waitForURL(/\/checks\//);
    const checkUrl = page.url();

    const checker = await openPage(browser);
    await signInAs(checker.page, 'jonas.weir');
    await checker.page.goto(checkUrl);
    await checker.page.locator('body').press('j');
    await checker.page.locator('body').press('a');
    // Whoever is hindered by single keys switches them off (WCAG 2.2, 2.1.4).
    await checker.page.getByLabel('Single keys mark and move').uncheck();
    await checker.page.locator('body').press('c');
    await checker.page.getByLabel('Single keys mark and move').check();
    await checker.page.getByRole('button', { name: 'Leave the mark' }).click();
    await checker.page.getByText(/is marked/).waitFor();
    await expectAccessible(checker.page);
    await checker.page.getByRole('button', { name: 'Agree the sheet' }).click();
    await checker.page.getByText(/agreed this sheet/).waitFor();

    const sealer = await openPage(browser);
    await signInAs(sealer.page, 'tomas.lindqvist');
    await sealer.page.getByRole('link', { name: /Mill Race Boathouse/ }).click();
    await sealer.page.getByRole('link', { name: 'New submittal' }).click();
    await sealer.page.getByLabel('Purpose').fill('for permit');
    await expectAccessible(sealer.page);
    await sealer.page.getByRole('button', { name: 'Print the package' }).click();
    await sealer.page.waitForURL(/\/submittals\/[0-9a-f-]{36}$/);
    const submittalUrl = sealer.page.url();
    await expectAccessible(sealer.page);
    await sealer.page.getByRole('link', { name: 'Go to the seal' }).click();
    await sealer.page
      .getByLabel('Key file')
      .setInputFiles(join(process.env.DEMO_FOLDER as string, 'tomas-lindqvist.p12'));
    await sealer.page.getByLabel('Password of the key').fill('wrong');
    await sealer.page.getByRole('button', { name: 'Open the key' }).click();
    await sealer.page.locator('.message.e').waitFor();
    await expectAccessible(sealer.page);
    await sealer.page.getByLabel('Password of the key').fill('plumb-line');
    await sealer.page.getByRole('button', { name: 'Open the key' }).click();
    await sealer.page.getByRole('button', { name: /^Seal \d+ pages$/ }).click();
    await sealer.page.waitForURL(submittalUrl);
    await sealer.page.getByText('The sealed package').waitFor();
    const sending = new Date();
    await sealer.page.getByRole('button', { name: 'Send the submittal' }).click();
    await sealer.page.getByText(/is on its way/).waitFor();

    const letter = await letterTo('dana.pell@orrin.example', 'Mill Race Boathouse', sending);
    const token = /\/review\/(\S+)/.exec(letter)?.[1] as string;
    const reviewer = await openPage(browser, 390);
    await reviewer.page.goto(`${site()}/review/${token}`);
    await expectAccessible(reviewer.page);
    await reviewer.page.getByLabel('What you ask for').fill('Name the drawing that the spans come from.');
    await reviewer.page.getByRole('button', { name: 'Pin the comment' }).click();
    await reviewer.page.getByText(/Comment 1 is pinned/).waitFor();
    await reviewer.page.getByLabel('Approved as Noted').check();
    await reviewer.page.getByRole('button', { name: 'Record the decision' }).click();
    await reviewer.page.getByText('It is recorded once and stands').waitFor();

    await sealer.page.goto(submittalUrl);
    await sealer.page.getByText('Approved as Noted').waitFor();

    const sent = await reviewer.context.request.get(`${site()}/review/${token}/file`);
    expect(sent.ok()).toBe(true);
    const folder = mkdtempSync(join(tmpdir(), 'fairhand-sent-'));
    const file = join(folder, 'sent.pdf');
    writeFileSync(file, await sent.body());
    const text = execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' });
    expect(text).toContain(title);
    expect(text).toContain('Mill Race Boathouse');
    const signature = execFileSync('pdfsig', ['-nocert', file], { encoding: 'utf8' });
    expect(signature).toContain('Signature is Valid');
    expect(signature).toContain('Tomas Lindqvist');
    expect(signature).toContain('Total document signed');
    execFileSync('qpdf', ['--check', file]);

    // Anybody may hold what was sent against itself.
    const stranger = await openPage(browser, 390);
    await stranger.page.goto(`${site()}/verify`);
    await stranger.page.getByLabel('PDF file').setInputFiles(file);
    await stranger.page.getByText('sent.pdf is sealed, and nothing was changed since.').waitFor();
    await stranger.page
      .getByText(/^All \d+ come out again\.$/)
      .first()
      .waitFor();
    await expectAccessible(stranger.page);

    for (const person of [engineer, checker, sealer, reviewer, stranger]) expect(person.errors).toEqual([]);
  });
});

describe('doors that stay shut', () => {
  it('answers calmly for a link that opens nothing', async () => {
    const { page } = await openPage(browser);
    await page.goto(`${site()}/review/not-a-token`);
    await page.getByRole('heading', { name: 'This link opens nothing' }).waitFor();
    await expectAccessible(page);
  });

  it('sends a stranger to the sign-in page from every page of an office', async () => {
    const { page } = await openPage(browser);
    for (const path of [
      '/jobs',
      '/office',
      '/jobs/x/sheets/y',
      '/jobs/x/revisions/y',
      '/jobs/x/checks/y',
      '/jobs/x/submittals/y/seal',
    ]) {
      await page.goto(site() + path);
      expect(page.url()).toBe(`${site()}/sign-in`);
    }
  });
});

describe('a sheet that cannot be solved', () => {
  it('says at the field what is wrong and keeps what was typed', async () => {
    const { page, errors } = await openPage(browser);
    await signInAs(page, 'mira.oduya');
    await page.getByRole('link', { name: /Mill Race Boathouse/ }).click();
    await page.getByRole('link', { name: 'New sheet' }).click();
    await page.getByLabel('Title').fill('Trial beam');
    await page.getByRole('button', { name: 'Make the sheet' }).click();
    await page.waitForURL(/\/sheets\/[0-9a-f-]{36}$/);
    await page.locator('[data-cell="0:0"]').fill('7 kip');
    await page.locator('[data-cell="0:0"]').press('ArrowDown');
    await page.locator('[data-cell="0:0"]').focus();
    await page.getByText('That is a force. A length is asked for').first().waitFor();
    expect(await page.locator('[data-cell="0:0"]').inputValue()).toBe('7 kip');
    await page.locator('[data-cell="0:0"]').fill('20 ft');
    await page.locator('[data-cell="1:0"]').fill('16 ft');
    await page.getByRole('button', { name: 'Supports' }).click();
    await page.getByLabel('Support, row 1').selectOption('roller');
    await page
      .getByText(/nothing stops sliding/)
      .first()
      .waitFor();
    expect(errors).toEqual([]);
  });
});
