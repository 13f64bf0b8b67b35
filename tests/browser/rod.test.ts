import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { box, launch, mark, openPage, ready, settle, type } from '../support/browser';

const rod = (page: Page) => page.locator('[data-rod]');
const said = async (page: Page) => (await rod(page).getAttribute('aria-valuetext')) ?? '';
const now = async (page: Page) => Number(await rod(page).getAttribute('aria-valuenow'));
const running = (page: Page) => page.locator('[role="option"][aria-selected="true"]').textContent();
const bitX = async (page: Page) => Number(await page.locator('[data-bit] circle').first().getAttribute('cx'));

describe('the storey rod', () => {
  let browser: Browser;
  const url = `${inject('baseUrl')}/`;
  beforeAll(async () => { browser = await launch(); });
  afterAll(() => browser.close());

  test('dragged along a lane it moves the bit on the plan and the line of the program', async () => {
    const { page, context, complaints } = await openPage(browser, url);
    const area = await rod(page).boundingBox();
    if (!area) expect.fail('the rod is not drawn');
    const y = area.y + area.height / 2 + 16; // the second of two lanes, its lower side: going out
    await page.mouse.move(area.x + area.width * 0.4, y);
    await page.mouse.down();
    const first = { x: await bitX(page), at: await now(page) };
    expect(await said(page)).toMatch(/^pass 2 of 2, line \d+, \d:\d\d of \d:\d\d$/);
    await page.mouse.move(area.x + area.width * 0.7, y, { steps: 12 });
    expect(await bitX(page)).toBeGreaterThan(first.x);
    expect(await now(page)).toBeGreaterThan(first.at);
    // Above its lane a drag stays in its lane.
    await page.mouse.move(area.x + area.width * 0.7, y - 200);
    expect(await said(page)).toContain('pass 2 of 2');
    await page.mouse.up();
    const line = Number(/line (\d+)/.exec(await said(page))?.[1]);
    await page.locator('.lines').scrollIntoViewIfNeeded();
    expect(await running(page)).toMatch(new RegExp(`^${line}\\D`));
    const still = await now(page);
    await page.mouse.move(area.x + area.width * 0.3, y);
    expect(await now(page)).toBe(still);
    expect(complaints).toEqual([]);
    await context.close();
  });

  test('by keys: a step, a pass, the ends, and Space plays', async () => {
    const { page, context } = await openPage(browser, url);
    await rod(page).focus();
    await page.keyboard.press('PageDown');
    expect(await said(page)).toMatch(/^pass 1 of 2/);
    await page.keyboard.press('PageDown');
    expect(await said(page)).toMatch(/^pass 2 of 2/);
    const before = await said(page);
    await page.keyboard.press('ArrowRight');
    expect(await said(page)).not.toBe(before);
    await page.keyboard.press('ArrowLeft');
    expect(await said(page)).toBe(before);
    await page.keyboard.press('PageUp');
    expect(await said(page)).toMatch(/^pass 1 of 2/);
    await page.keyboard.press('End');
    expect(await now(page)).toBe(Number(await rod(page).getAttribute('aria-valuemax')));
    await page.keyboard.press('Home');
    expect(await now(page)).toBe(0);
    await page.keyboard.press(' ');
    await page.waitForTimeout(700);
    await page.keyboard.press(' ');
    expect(await now(page)).toBeGreaterThan(0);
    await context.close();
  });

  test('on a phone it is dragged by touch and scrolls inside itself', async () => {
    const { page, context } = await openPage(browser, url, { viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });
    expect(await page.evaluate(() => document.documentElement.scrollWidth <= window.innerWidth)).toBe(true);
    await rod(page).scrollIntoViewIfNeeded();
    const area = await page.locator('.rod .frame').boundingBox();
    const lanes = await rod(page).boundingBox();
    if (!area || !lanes) expect.fail('the rod is not drawn');
    expect(lanes.height).toBeGreaterThanOrEqual(44);
    expect(lanes.width).toBeGreaterThan(area.width);
    await page.touchscreen.tap(area.x + 250, lanes.y + lanes.height / 2 + 10);
    expect(await now(page)).toBeGreaterThan(0);
    await context.close();
  });

  test('on a tablet it stays in sight, and what has the focus is never under it or under the download', async () => {
    const { page, context } = await openPage(browser, url, { viewport: { width: 1024, height: 768 } });
    await page.evaluate(() => window.scrollTo(0, document.body.scrollHeight));
    const [top, bar] = [await page.locator('.rod-place').boundingBox(), await page.locator('[data-download]').boundingBox()];
    if (!top || !bar) expect.fail('the rod or the download is not drawn');
    expect(top.y).toBe(0);
    expect(bar.y + bar.height).toBeLessThanOrEqual(768);
    const rows = page.locator('#readback button.where');
    for (let i = (await rows.count()) - 1; i >= 0; i--) {
      await rows.nth(i).focus();
      const box = await rows.nth(i).boundingBox();
      expect(box?.y, `row ${i}`).toBeGreaterThanOrEqual(top.height);
      expect((box?.y ?? 0) + (box?.height ?? 0), `row ${i}`).toBeLessThan(bar.y);
    }
    await context.close();
  });

  test('rod and drawing keep their place and width from the first paint on', async () => {
    for (const viewport of [{ width: 1440, height: 1000 }, { width: 820, height: 1180 }, { width: 390, height: 844 }]) {
      const plain = await browser.newContext({ viewport, javaScriptEnabled: false });
      const [before, { page, context }] = [await plain.newPage(), await openPage(browser, url, { viewport })];
      await before.goto(url);
      await page.waitForTimeout(1000); // both have their fonts, which move lines by themselves
      for (const part of ['.rod .inner svg', '.plan', '.section', '[data-size="railLength"]', '[data-size="railThickness"]']) {
        const [first, then] = [await before.locator(part).first().boundingBox(), await page.locator(part).first().boundingBox()];
        if (!first || !then) expect.fail(`${part} is not drawn`);
        // A box is as wide as its face; the parts themselves stand where they stood.
        for (const side of ['x', 'y', 'width', 'height'] as const) expect(Math.abs(first[side] - then[side]), `${part} ${side} at ${viewport.width}`).toBeLessThan(8);
      }
      await context.close();
      await plain.close();
    }
  });

  test('without a program there is nothing to scrub', async () => {
    const { page, context } = await openPage(browser, url);
    await type(page, 'bitDiameter', '1/2');
    await settle(page);
    await page.waitForFunction(() => document.querySelector('[data-rod]')?.getAttribute('aria-disabled') === 'true');
    expect(await said(page)).toBe('No program to play yet.');
    await context.close();
  });
});

describe('pointing at a reading', () => {
  let browser: Browser;
  const url = `${inject('baseUrl')}/`;
  beforeAll(async () => { browser = await launch(); });
  afterAll(() => browser.close());

  test('shows where it was measured, goes to its line, and Escape lets go', async () => {
    const { page, context } = await openPage(browser, url);
    const row = page.locator('#readback tr[data-rule="depth"]');
    await row.hover();
    expect(await page.locator('[data-pointed]').count()).toBe(1);
    expect(await page.locator('[data-rod-pointed]').count()).toBe(1);
    await page.mouse.move(5, 5);
    expect(await page.locator('[data-pointed]').count()).toBe(0);
    await row.locator('button').focus();
    expect(await page.locator('[data-pointed]').count()).toBe(1);
    await page.keyboard.press('Enter');
    const line = Number(/line (\d+)/.exec(await said(page))?.[1]);
    expect(line).toBeGreaterThan(1);
    expect(await row.locator('button').getAttribute('title')).toBe(`Show where: line ${line}`);
    expect(await running(page)).toMatch(new RegExp(`^${line}\\D`));
    // It stays shown when focus moves on.
    await rod(page).focus();
    expect(await page.locator('[data-pointed]').count()).toBe(1);
    await row.locator('button').focus();
    await page.keyboard.press('Escape');
    expect(await page.locator('[data-pointed]').count()).toBe(0);
    await context.close();
  });

  test('by touch a tap goes there', async () => {
    const { page, context } = await openPage(browser, url, { viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });
    await page.locator('#readback tr[data-rule="depth"] button').tap();
    expect(await said(page)).toMatch(/line \d+/);
    expect(await now(page)).toBeGreaterThan(0);
    expect(await page.locator('[data-pointed]').count()).toBe(1);
    await context.close();
  });

  test('a refused size offers what would do; one press sets it and one step back takes it away', async () => {
    const { page, context } = await openPage(browser, url);
    await type(page, 'bitDiameter', '1/2');
    await settle(page);
    const offer = page.locator('[data-offer]').filter({ hasText: 'Set the bit diameter to' }).first();
    await offer.click();
    await settle(page);
    expect(await box(page, 'bitDiameter').inputValue()).toBe('3/8');
    await page.locator('[data-mark]').waitFor();
    await page.keyboard.press('Control+z');
    expect(await box(page, 'bitDiameter').inputValue()).toBe('1/2');
    await context.close();
  });
});

describe('the coin in the section', () => {
  let browser: Browser;
  const url = `${inject('baseUrl')}/`;
  beforeAll(async () => { browser = await launch(); });
  afterAll(() => browser.close());

  test('changes its lean and never the program; the link keeps it', async () => {
    const { page, context } = await openPage(browser, url);
    const before = await mark(page);
    const words = page.locator('[data-coin-words]');
    expect(await words.textContent()).toContain('23.5° on the board');
    const drawn = await page.locator('[data-coin]').getAttribute('points');
    await type(page, 'coinThickness', '0.35');
    await settle(page);
    expect(await words.textContent()).not.toContain('23.5°');
    expect(await page.locator('[data-coin]').getAttribute('points')).not.toBe(drawn);
    await type(page, 'coinDiameter', '2');
    await settle(page);
    expect(await mark(page)).toBe(before);
    await type(page, 'coinThickness', '0.4');
    expect(await words.textContent()).toContain('Too thick for this groove');
    await type(page, 'coinThickness', 'thin');
    await settle(page);
    expect(await mark(page)).toBe(before);
    await type(page, 'coinThickness', '0.157');
    await page.waitForTimeout(600); // the address follows once typing rests
    const there = await openPage(browser, page.url());
    await ready(there.page);
    expect(await box(there.page, 'coinDiameter').inputValue()).toBe('2');
    expect(await box(there.page, 'coinThickness').inputValue()).toBe('0.157');
    expect(await mark(there.page)).toBe(before);
    await there.page.getByLabel('board behind').uncheck();
    expect(await there.page.locator('[data-board]').count()).toBe(0);
    expect(await there.page.locator('[data-coin-words]').textContent()).toContain('stand a board behind it');
    await settle(there.page);
    expect(await mark(there.page)).toBe(before);
    for (const one of [context, there.context]) await one.close();
  });
});
