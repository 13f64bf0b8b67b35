import AxeBuilder from '@axe-core/playwright';
import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { launch, openPage } from '../support/browser';

describe("the developers' page of parts", () => {
  let browser: Browser;
  const url = `${inject('baseUrl')}/parts`;
  beforeAll(async () => { browser = await launch(); });
  afterAll(() => browser.close());

  test.each(['light', 'dark'] as const)('every state is shown and axe finds nothing: %s', async (colorScheme) => {
    const { page, context, complaints } = await openPage(browser, url, { colorScheme });
    for (const [state, looks] of [['entered', 'entered'], ['derived', 'derived'], ['focused', 'focused'], ['warned', 'warned'], ['empty', 'needed'], ['assumed', 'derived'], ['locked', 'locked']] as const) {
      expect(await page.locator(`[data-state="${state}"] .size`).getAttribute('class'), state).toContain(looks);
    }
    // Contrast is worked out of what the browser holds: words stand out from the sheet, by day and by night.
    await page.locator('[data-token="ink"] td').nth(1).filter({ hasText: /\d/ }).waitFor();
    for (const token of ['ink', 'ink-2', 'ink-3', 'crayon-ink', 'tape', 'brass-ink']) {
      for (const at of [1, 2]) expect(Number(await page.locator(`[data-token="${token}"] td`).nth(at).textContent()), token).toBeGreaterThanOrEqual(4.5);
    }
    const { violations } = await new AxeBuilder({ page }).analyze();
    expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => target.join(' ')).join(', ')}`)).toEqual([]);
    expect(complaints).toEqual([]);
    await context.close();
  });

  test('is for no search engine, and the public page does not link to it', async () => {
    expect(await (await fetch(url)).text()).toMatch(/<meta name="robots" content="noindex"/);
    expect(await (await fetch(`${inject('baseUrl')}/`)).text()).not.toContain('/parts');
  });

  test('leaves the first drawing as it was', async () => {
    const { page, context } = await openPage(browser, url, { viewport: { width: 320, height: 640 } });
    expect(await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)).toBeLessThanOrEqual(0);
    await page.goto(`${inject('baseUrl')}/`);
    await page.locator('[data-mark]').waitFor();
    await context.close();
  });
});
