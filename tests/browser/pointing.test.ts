import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { box, launch, openPage, settle, type } from '../support/browser';

const TAPE = [0x1b, 0x5f, 0xa8] as const; // --tape by day

/** The pixels of the picture that have the marker's colour: how many, and their middle as a share of its width and height. */
async function marker(page: Page): Promise<{ readonly count: number; readonly x: number; readonly y: number }> {
  await page.waitForTimeout(300); // a frame is drawn on demand
  const shot = await page.locator('canvas').screenshot();
  return page.evaluate(async ([data, tape]) => {
    const bitmap = await createImageBitmap(await (await fetch(`data:image/png;base64,${data}`)).blob());
    const context = new OffscreenCanvas(bitmap.width, bitmap.height).getContext('2d');
    if (!context) throw new Error('no 2D canvas');
    context.drawImage(bitmap, 0, 0);
    const { data: pixels } = context.getImageData(0, 0, bitmap.width, bitmap.height);
    let [count, x, y] = [0, 0, 0];
    for (let i = 0; i < pixels.length / 4; i++) {
      if (tape.some((part, k) => Math.abs((pixels[i * 4 + k] ?? 0) - part) > 12)) continue;
      count++;
      x += i % bitmap.width;
      y += Math.floor(i / bitmap.width);
    }
    return { count, x: x / count / bitmap.width, y: y / count / bitmap.height };
  }, [shot.toString('base64'), [...TAPE]] as const);
}

/** The page with the whole rail shown from above and nothing pointed at. */
async function fromAbove(browser: Browser, url: string) {
  const opened = await openPage(browser, url, { bypassCSP: true, viewport: { width: 1440, height: 1900 } });
  const { page } = opened;
  await page.locator('.lines').scrollIntoViewIfNeeded();
  await page.locator('canvas').waitFor();
  await page.getByRole('button', { name: 'Above', exact: true }).click();
  await page.mouse.move(2, 2);
  return opened;
}
const row = (page: Page, rule: string) => page.locator(`#readback tr[data-rule="${rule}"]`).first();

describe('pointing at a reading, in the picture of the cut', () => {
  let browser: Browser;
  const url = `${inject('baseUrl')}/`;
  beforeAll(async () => { browser = await launch(); });
  afterAll(() => browser.close());

  test('marks the place in 3D by mouse and by keys, and lets go', async () => {
    const { page, context, complaints } = await fromAbove(browser, url);
    expect((await marker(page)).count).toBe(0);
    await row(page, 'depth').hover();
    expect((await marker(page)).count).toBeGreaterThan(100);
    await page.mouse.move(2, 2);
    expect((await marker(page)).count).toBe(0);
    await row(page, 'depth').locator('button').focus();
    expect((await marker(page)).count).toBeGreaterThan(100);
    await page.keyboard.press('Enter');
    await page.keyboard.press('Escape');
    expect((await marker(page)).count).toBe(0);
    expect(complaints).toEqual([]);
    await context.close();
  });

  test('the mark stands at the same place whether the program counts from the corner or from the middle', async () => {
    const { page, context } = await fromAbove(browser, url);
    await row(page, 'depth').locator('button').focus();
    const corner = await marker(page);
    await page.locator('summary').first().click();
    await page.getByLabel('Work zero').selectOption('centre');
    await settle(page);
    await page.waitForTimeout(1500); // the picture of the new program is worked out
    await page.mouse.move(2, 2);
    await row(page, 'depth').locator('button').focus();
    const centre = await marker(page);
    expect(centre.count).toBeGreaterThan(100);
    // Of the picture's width: the rail's half length, were the work zero not heeded, would be far more.
    expect(Math.abs(centre.x - corner.x)).toBeLessThan(0.02);
    expect(Math.abs(centre.y - corner.y)).toBeLessThan(0.02);
    await context.close();
  });

  test('where nothing is drawn in 3D it is marked from above', async () => {
    const plain = await launch({ webgl: false });
    const { page } = await openPage(plain, url);
    await page.locator('.lines').scrollIntoViewIfNeeded();
    await page.getByText('This browser draws nothing in 3D.').waitFor();
    expect(await page.locator('[data-flat-pointed]').count()).toBe(0);
    await row(page, 'depth').locator('button').focus();
    expect(await page.locator('[data-flat-pointed]').count()).toBe(2);
    const where = await page.locator('[data-flat-pointed]').first().boundingBox();
    const wood = await page.locator('figure svg').first().boundingBox();
    if (!where || !wood) expect.fail('the rail is not drawn');
    expect(where.x).toBeGreaterThan(wood.x);
    expect(where.x + where.width).toBeLessThan(wood.x + wood.width);
    await plain.close();
  });
});

describe('what stands in the way of a program', () => {
  let browser: Browser;
  beforeAll(async () => { browser = await launch(); });
  afterAll(() => browser.close());

  test('is listed in the readback with the change that cures it, at a press', async () => {
    const { page, context } = await openPage(browser, `${inject('baseUrl')}/`);
    await type(page, 'bitDiameter', '1/2');
    await settle(page);
    const panel = page.locator('#readback');
    expect(await panel.textContent()).toContain('Nothing to read back yet.');
    const offer = panel.locator('[data-offer]').filter({ hasText: 'Set the bit diameter to' });
    await offer.focus();
    await page.keyboard.press('Enter');
    await settle(page);
    expect(await box(page, 'bitDiameter').inputValue()).toBe('3/8');
    expect(await panel.locator('[data-offer]').filter({ hasText: 'bit diameter' }).count()).toBe(0);
    expect(await panel.locator('[data-verdict]').count()).toBe(1);
    await context.close();
  });
});
