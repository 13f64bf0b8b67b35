import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { box, launch, mark, openPage, settle, type } from '../support/browser';

describe('the drawing is the form', () => {
  let browser: Browser;
  const url = `${inject('baseUrl')}/`;
  beforeAll(async () => { browser = await launch(); });
  afterAll(() => browser.close());

  test('opens with a rail that has been read back, and complains of nothing', async () => {
    const { page, context, complaints } = await openPage(browser, url);
    expect(await mark(page)).toMatch(/^[A-Z0-9]{3}-[A-Z0-9]{3}$/);
    expect(await page.locator('[data-verdict]').textContent()).toMatch(/readings/);
    expect(await page.locator('[data-severity="disagrees"]').count()).toBe(0);
    expect(await page.title()).toBe('Cut one stopped groove · Tallyrail');
    expect(complaints).toEqual([]);
    await context.close();
  });

  test('every keystroke that can be read redraws, and the program follows', async () => {
    const { page, context } = await openPage(browser, url);
    await page.locator('tr[data-rule="depth"]').last().scrollIntoViewIfNeeded(); // the table follows once it is in sight
    const before = { mark: await mark(page), depth: await page.locator('tr[data-rule="depth"] .measured').last().textContent() };
    await type(page, 'depth', '1/4');
    await settle(page);
    expect(await mark(page)).not.toBe(before.mark);
    expect(before.depth).toBe('0.1875');
    await expect.poll(() => page.locator('tr[data-rule="depth"] .measured').last().textContent()).toBe('0.2500');
    await context.close();
  });

  test('of rail length, stop margin and slot length the third follows, and typing in it makes another follow', async () => {
    const { page, context } = await openPage(browser, url);
    expect(await box(page, 'length').inputValue()).toBe('24 1/2');
    await type(page, 'stopMargin', '1');
    expect(await box(page, 'length').inputValue()).toBe('24 1/4');
    await type(page, 'length', '20');
    await settle(page);
    // The rail length was typed longest ago, so it gives way: 20 + 2 × 1.
    expect(await box(page, 'railLength').inputValue()).toBe('22');
    expect(await page.locator('[data-size="railLength"]').getAttribute('class')).toContain('derived');
    expect(await page.locator('[aria-live="polite"]').first().textContent()).toContain('Rail length now follows.');
    await context.close();
  });

  test('a size that cannot be read keeps the text and the last good drawing, and says what would work', async () => {
    const { page, context } = await openPage(browser, url);
    const lines = () => page.locator('.plan svg clipPath path').first().getAttribute('d');
    await page.waitForTimeout(500); // the drawing takes the width it has been given
    const before = await lines();
    await type(page, 'railLength', '26 1/');
    await settle(page);
    expect(await box(page, 'railLength').inputValue()).toBe('26 1/');
    expect(await lines()).toBe(before);
    expect(await page.locator('[data-size="railLength"] .note').textContent()).toContain('That is not a size we can read.');
    expect(await box(page, 'railLength').getAttribute('aria-invalid')).toBe('true');
    expect(await page.locator('[data-download]').getAttribute('aria-disabled')).toBe('true');
    expect(await page.title()).toContain('1 to change');
    await context.close();
  });

  test('arrows step by a sixteenth and with Shift a sixty-fourth; Escape restores', async () => {
    const { page, context } = await openPage(browser, url);
    const depth = box(page, 'depth');
    await depth.focus();
    await page.keyboard.press('ArrowUp');
    expect(await depth.inputValue()).toBe('1/4');
    await page.keyboard.press('Shift+ArrowDown');
    expect(await depth.inputValue()).toBe('15/64');
    await page.keyboard.press('Escape');
    expect(await depth.inputValue()).toBe('3/16');
    await context.close();
  });

  test('undo and redo go over everything', async () => {
    const { page, context } = await openPage(browser, url);
    await type(page, 'width', '1/2');
    await type(page, 'depth', '1/4');
    await page.getByText('mm', { exact: true }).first().click();
    for (let i = 0; i < 3; i++) await page.keyboard.press('Control+z');
    expect(await box(page, 'width').inputValue()).toBe('3/8');
    expect(await box(page, 'depth').inputValue()).toBe('3/16');
    for (let i = 0; i < 2; i++) await page.keyboard.press('Control+Shift+z');
    expect(await box(page, 'width').inputValue()).toBe('1/2');
    expect(await box(page, 'depth').inputValue()).toBe('1/4');
    await context.close();
  });

  test('a hundred changes of units leave every figure as typed', async () => {
    const { page, context } = await openPage(browser, url);
    await type(page, 'depth', '9 mm');
    await type(page, 'width', '0.3937');
    await settle(page);
    const read = () => page.locator('[data-size] input').evaluateAll((inputs) => inputs.map((input) => (input as HTMLInputElement).value));
    const before = await read();
    const [mm, inches] = [page.locator('.segment label:has(input[value="mm"])'), page.locator('.segment label:has(input[value="fractions"])')];
    for (let i = 0; i < 50; i++) {
      await mm.click();
      await inches.click();
    }
    expect(await read()).toEqual(before);
    await context.close();
  });

  test('the address holds the drawing; a damaged one opens the first drawing and says so', async () => {
    const { page, context } = await openPage(browser, url);
    await type(page, 'railLength', '19');
    await type(page, 'stopMargin', '1 1/4');
    await page.waitForFunction(() => window.location.hash.startsWith('#1.'));
    await page.waitForTimeout(500); // the address follows once typing rests
    const link = page.url();
    const there = await openPage(browser, link);
    await settle(there.page);
    expect(await box(there.page, 'length').inputValue()).toBe('16 1/2');
    expect(await mark(there.page)).toBe(await mark(page));
    const damaged = await openPage(browser, link.slice(0, -9));
    expect(await damaged.page.getByRole('alert').textContent()).toContain('This link is damaged');
    expect(await box(damaged.page, 'railLength').inputValue()).toBe('26 1/4');
    for (const one of [context, there.context, damaged.context]) await one.close();
  });
});
