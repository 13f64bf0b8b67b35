import AxeBuilder from '@axe-core/playwright';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { box, launch, mark, openPage, settle, type } from '../support/browser';

describe('for everyone, on every screen', () => {
  let browser: Browser;
  const url = `${inject('baseUrl')}/`;
  beforeAll(async () => { browser = await launch(); });
  afterAll(() => browser.close());

  const violations = async (page: Page) => {
    const { violations: found } = await new AxeBuilder({ page }).analyze();
    return found.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => target.join(' ')).join(', ')}`);
  };

  test.each(['light', 'dark'] as const)('axe finds nothing: %s', async (colorScheme) => {
    const { page, context } = await openPage(browser, url, { colorScheme });
    expect(await page.locator('html').getAttribute('data-theme')).toBe(colorScheme === 'dark' ? 'night' : 'day');
    await page.locator('summary').click();
    await page.locator('.lines').scrollIntoViewIfNeeded();
    await page.getByRole('slider', { name: 'Time in the program' }).waitFor(); // playback is part of what is judged
    expect(await violations(page)).toEqual([]);
    await type(page, 'bitDiameter', '1/2');
    await type(page, 'depth', 'abc');
    await settle(page);
    expect(await violations(page)).toEqual([]);
    await context.close();
  });

  test.each([1440, 820, 390, 320])('nothing scrolls sideways at %i px', async (width) => {
    const { page, context } = await openPage(browser, url, { viewport: { width, height: 844 } });
    const overflow = () => page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
    expect(await overflow()).toBeLessThanOrEqual(0);
    await page.locator('summary').click();
    await type(page, 'stopMargin', '1/8');
    await settle(page);
    expect(await overflow()).toBeLessThanOrEqual(0);
    await context.close();
  });

  test('from the first box to a saved program by keyboard alone', async () => {
    const { page, context } = await openPage(browser, url);
    const focused = () => page.evaluate(() => document.activeElement?.closest('[data-size]')?.getAttribute('data-size') ?? null);
    for (let i = 0; i < 30 && (await focused()) !== 'railLength'; i++) await page.keyboard.press('Tab');
    const order: (string | null)[] = [];
    for (let i = 0; i < 16; i++) {
      order.push(await focused());
      await page.keyboard.press('Tab');
    }
    expect(order).toEqual([
      'railLength', 'stopMargin', 'length', 'coinDiameter', 'coinThickness', null, 'width', 'depth', 'railThickness', 'railWidth',
      'bitDiameter', 'flutes', 'spindleSpeed', 'feed', 'plungeFeed', 'stepdown',
    ]);
    await box(page, 'railLength').focus();
    await page.keyboard.type('19');
    await page.keyboard.press('Enter');
    expect(await focused()).toBe('stopMargin');
    await page.keyboard.type('1 1/4');
    await settle(page);
    expect(await box(page, 'length').inputValue()).toBe('16 1/2');
    const saved = page.waitForEvent('download');
    for (let i = 0; i < 30 && !(await page.evaluate(() => document.activeElement?.hasAttribute('data-download'))); i++) await page.keyboard.press('Tab');
    await page.keyboard.press('Enter');
    expect((await saved).suggestedFilename().toUpperCase()).toContain(await mark(page));
    await context.close();
  });

  test('targets are at least 44 px', async () => {
    const { page, context } = await openPage(browser, url, { viewport: { width: 390, height: 844 } });
    const small = await page.locator('button:visible, [data-size] .box:visible, select:visible, summary').evaluateAll((all) =>
      all.map((one) => ({ words: one.textContent?.trim().slice(0, 30), box: one.getBoundingClientRect() })).filter(({ box: { width, height } }) => width < 43.5 || height < 43.5).map(({ words, box: { width, height } }) => `${words} ${width} × ${height}`));
    expect(small).toEqual([]);
    await context.close();
  });

  test('the night switch is remembered', async () => {
    const { page, context } = await openPage(browser, url, { colorScheme: 'light' });
    await page.getByRole('button', { name: 'Night' }).click();
    await page.reload();
    expect(await page.locator('html').getAttribute('data-theme')).toBe('night');
    await context.close();
  });
});
