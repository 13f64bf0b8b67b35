import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { box, download, launch, mark, openPage, settle, type } from '../support/browser';

/** The first drawing as anyone would post it. */
const FIRST = {
  units: 'in', length: 24.5, stopMargin: '7/8', width: '3/8', depth: '3/16', railWidth: '1 1/4', railThickness: '3/4', bitDiameter: '1/4',
  stepdown: '3/32', flutes: 2, spindleSpeed: 16000, feed: 100, plungeFeed: 25, wood: 'white-oak',
};

describe('taking a program away', () => {
  let browser: Browser;
  const base = inject('baseUrl');
  const url = `${base}/`;
  beforeAll(async () => { browser = await launch(); });
  afterAll(() => browser.close());

  test("the file's bytes are the API's, and so is its mark", async () => {
    const { page, context } = await openPage(browser, url);
    const file = await download(page);
    const response = await fetch(`${base}/api/programs`, {
      method: 'POST', headers: { 'content-type': 'application/json', 'accept': 'text/plain' }, body: JSON.stringify(FIRST),
    });
    const bytes = Buffer.from(await response.arrayBuffer());
    expect(response.status).toBe(200);
    expect(file.bytes.equals(bytes)).toBe(true);
    expect(response.headers.get('program-mark')).toBe(await mark(page));
    expect(file.name.toUpperCase()).toContain(await mark(page));
    await page.getByText(`Saved as ${file.name}`).first().waitFor();
    await context.close();
  });

  test('a caution is read before the file is written', async () => {
    const { page, context } = await openPage(browser, url);
    await type(page, 'railWidth', '');
    await settle(page);
    await page.getByRole('button', { name: 'Download with 1 caution' }).click();
    const dialog = page.getByRole('dialog');
    await dialog.waitFor();
    expect(await dialog.textContent()).toContain('Rail width assumed');
    const [saved] = await Promise.all([page.waitForEvent('download'), dialog.getByRole('button', { name: 'Download with 1 caution' }).click()]);
    expect(saved.suggestedFilename()).toMatch(/\.nc$/);
    await context.close();
  });

  test('two marks that differ are both shown, and nothing is saved unasked', async () => {
    const { page, context } = await openPage(browser, url);
    await page.route('**/api/programs', async (route) => {
      const response = await route.fetch();
      const answer: unknown = await response.json();
      await route.fulfill({ json: { ...(answer as object), mark: 'XXX-XXX' } });
    });
    await page.locator('[data-download]').click();
    await page.getByText('The two marks differ').waitFor();
    const corner = await page.locator('[data-release]').textContent();
    expect(corner).toContain('XXX-XXX');
    expect(corner).toContain(await mark(page));
    await context.close();
  });

  test.each([
    ['offline', 'The server cannot be reached.'],
    ['busy', 'Wait 7 s'],
  ] as const)('%s: it says so and nothing typed is lost', async (name, words) => {
    const { page, context } = await openPage(browser, url);
    await type(page, 'depth', '1/4');
    await settle(page);
    await page.route('**/api/programs', (route) => (name === 'offline' ? route.abort() : route.fulfill({ status: 429, headers: { 'retry-after': '7' }, json: { detail: 'Too many' } })));
    await page.locator('[data-download]').click();
    await page.locator('[data-release]').getByText(words).waitFor();
    expect(await box(page, 'depth').inputValue()).toBe('1/4');
    await context.close();
  });

  const UNREADABLE = ['-1', '1e3', 'abc', '1/0', 'NaN', 'Infinity', '26 1/', '1,5', '1000'];
  const UNCOUNTABLE = ['-1', 'abc', '0', '999999', '2,5', 'NaN', 'Infinity', '1 2'];
  /** Box, text, and the box that says so. */
  const BAD: readonly (readonly [string, string, string])[] = [
    ...['railLength', 'stopMargin', 'width', 'depth', 'bitDiameter', 'stepdown', 'railThickness', 'railWidth'].flatMap((field) =>
      UNREADABLE.filter((text) => !(field === 'railThickness' || field === 'railWidth') || text !== '1000').map((text) => [field, text, ''] as const)),
    ...['flutes', 'spindleSpeed', 'feed', 'plungeFeed'].flatMap((field) => UNCOUNTABLE.map((text) => [field, text, field] as const)),
    ['width', '3/16', 'bitDiameter'], ['depth', '3/4', 'depth'], ['depth', '11/16', 'depth'], ['stopMargin', '1/8', 'stopMargin'], ['stepdown', '1', 'stepdown'],
    ['flutes', '2.5', 'flutes'], ['railWidth', '3/8', 'railWidth'], ['bitDiameter', '1/2', 'bitDiameter'], ['railLength', '', 'railLength'], ['width', '', 'width'],
    ['railThickness', '1/8', 'depth'], ['railLength', '2', 'length'],
  ];

  test('a hundred bad inputs: each is refused beside its box with what would work, and nothing typed is cleared', async () => {
    const { page, context, complaints } = await openPage(browser, url);
    expect(BAD.length).toBeGreaterThan(100);
    const good = await mark(page);
    for (const [field, text, beside] of BAD) {
      const name = `${field} "${text}"`;
      await type(page, field, text);
      await page.locator('[data-download][aria-disabled="true"]').waitFor();
      const beneath = page.locator(beside ? `[data-size="${beside}"].warned .note` : '.size.warned .note');
      await beneath.filter({ hasText: /\S/ }).first().waitFor(); // what is refused comes from the core, a moment after the typing
      const notes = await beneath.allTextContents();
      expect(notes.join(' '), name).toMatch(/Use |Try |Give /);
      expect(await box(page, field).inputValue(), name).toBe(text);
      await page.keyboard.press('Control+z');
      await page.locator('[data-mark]').waitFor();
    }
    expect(await mark(page)).toBe(good);
    await page.locator('[data-download]').waitFor();
    expect(complaints).toEqual([]);
    await context.close();
  }, 600_000); // a hundred inputs, each typed, refused and taken back by the page
});
