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

  const BAD: readonly (readonly [string, string, string])[] = [
    ['width', '3/16', 'bitDiameter'], ['depth', '3/4', 'depth'], ['depth', '11/16', 'depth'], ['stopMargin', '1/8', 'stopMargin'], ['stepdown', '1', 'stepdown'],
    ['flutes', '9', 'flutes'], ['flutes', '2.5', 'flutes'], ['spindleSpeed', '-1', 'spindleSpeed'], ['feed', 'fast', 'feed'], ['plungeFeed', '0', 'plungeFeed'],
    ['railWidth', '3/8', 'railWidth'], ['bitDiameter', '1/2', 'bitDiameter'], ['railLength', 'NaN', 'railLength'], ['railLength', '1e3', 'railLength'],
    ['railLength', '', 'railLength'], ['width', '', 'width'], ['railLength', '300', 'length'], ['railThickness', '1/8', 'depth'], ['length', '1/4', 'length'], ['width', '-3/8', 'width'],
  ];
  test.each(BAD)('%s "%s" is refused beside %s, with what would work', async (field, text, beside) => {
    const { page, context } = await openPage(browser, url);
    await type(page, field, text);
    await settle(page);
    const note = (await page.locator(`[data-size="${beside}"] .note`).first().textContent()) ?? '';
    expect(note).toMatch(/Use |Try |Give /);
    expect(await page.locator('[data-download]').textContent()).toContain('No download yet');
    await page.locator('[data-download]').click();
    expect(await page.locator('[data-release]').textContent()).toContain('a change');
    await context.close();
  });
});
