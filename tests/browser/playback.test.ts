import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { launch, openPage } from '../support/browser';

describe('playback', () => {
  let browser: Browser;
  const url = `${inject('baseUrl')}/`;
  beforeAll(async () => { browser = await launch(); });
  afterAll(() => browser.close());

  test('plays, is scrubbed, steps to the next pass, and the program follows', async () => {
    const { page, context, complaints } = await openPage(browser, url);
    await page.locator('.lines').scrollIntoViewIfNeeded();
    const slider = page.getByRole('slider', { name: 'Time in the program' });
    await slider.waitFor();
    await page.locator('canvas').waitFor();
    const now = () => slider.inputValue().then(Number);
    await page.getByRole('button', { name: 'Play', exact: true }).click();
    await page.waitForTimeout(1500);
    await page.getByRole('button', { name: 'Pause', exact: true }).click();
    const played = await now();
    expect(played).toBeGreaterThan(0);

    await page.getByRole('button', { name: 'Next pass' }).click();
    expect(await now()).not.toBe(played);
    await slider.fill('30');
    expect(await now()).toBe(30);
    const current = page.locator('[role="option"][aria-selected="true"]');
    const line = await current.textContent();
    expect(line).toMatch(/^\d+G1|^\d+[XYZ]/);
    await slider.press('ArrowRight');
    expect(await current.textContent()).not.toBe(line);
    // The bit stands on the plan too.
    expect(await page.locator('[data-bit]').count()).toBe(1);
    expect(complaints).toEqual([]);
    await context.close();
  });

  test('a block of the program takes playback to its motion, by mouse and by keys', async () => {
    const { page, context } = await openPage(browser, url);
    await page.locator('.lines').scrollIntoViewIfNeeded();
    const slider = page.getByRole('slider', { name: 'Time in the program' });
    await slider.waitFor();
    await page.getByRole('option', { name: /G0 X/ }).click();
    const before = Number(await slider.inputValue());
    await page.locator('.lines').focus();
    for (let i = 0; i < 3; i++) await page.keyboard.press('ArrowDown');
    expect(Number(await slider.inputValue())).toBeGreaterThan(before);
    await context.close();
  });

  test('a block that takes no time can be chosen too, and Up from the last block goes on up', async () => {
    const { page, context } = await openPage(browser, url);
    await page.locator('.lines').scrollIntoViewIfNeeded();
    await page.getByRole('slider', { name: 'Time in the program' }).waitFor();
    const current = page.locator('[role="option"][aria-selected="true"]');
    await page.locator('.lines').focus();
    await page.keyboard.press('End');
    expect(await current.textContent()).toMatch(/^\d+M30/);
    await page.keyboard.press('ArrowUp');
    expect(await current.textContent()).toMatch(/^\d+M5/);
    await page.keyboard.press('ArrowUp');
    expect(await current.textContent()).toMatch(/^\d+G0 Z/);
    await page.keyboard.press('Home');
    const first = await current.textContent();
    await page.keyboard.press('ArrowDown');
    expect(await current.textContent()).not.toBe(first);
    await context.close();
  });

  test('on a tablet and a phone the text has its place beside the cut', async () => {
    for (const viewport of [{ width: 1024, height: 768 }, { width: 390, height: 844 }]) {
      const { page, context } = await openPage(browser, url, { viewport });
      const text = await page.locator('.lines').boundingBox();
      expect(text?.height).toBeGreaterThan(250);
      await context.close();
    }
  });

  test('without WebGL the cut plays from above', async () => {
    const plain = await launch({ webgl: false });
    const { page } = await openPage(plain, url);
    await page.locator('.lines').scrollIntoViewIfNeeded();
    await page.getByText('This browser draws nothing in 3D.').waitFor();
    await page.getByRole('button', { name: 'Play', exact: true }).click();
    await page.waitForTimeout(800);
    expect(Number(await page.getByRole('slider', { name: 'Time in the program' }).inputValue())).toBeGreaterThan(0);
    await plain.close();
  });
});
