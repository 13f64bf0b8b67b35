import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { launch, mark, openPage, settle, type } from '../support/browser';
import { checkBars, pagesOf } from '../support/pdf';

/** Millimetres that a bar on paper may be off by. */
const CLOSE = 0.2;
const NAME = 'Rail A, thirteen-stripe board, day room, Station 9 Rescue Sq';
const FORMATS = ['Letter', 'A4'] as const;
/** Width and height upright, in millimetres. */
const PAPER = { Letter: [215.9, 279.4], A4: [210, 297] } as const;

describe('prints', () => {
  let browser: Browser;
  const url = `${inject('baseUrl')}/`;
  beforeAll(async () => { browser = await launch(); });
  afterAll(() => browser.close());

  /** The page with a printer that only notes that it was asked. */
  async function open(edits: Readonly<Record<string, string>> = {}) {
    const opened = await openPage(browser, url);
    await opened.page.evaluate(() => { window.print = () => { document.documentElement.dataset.printed = 'yes'; }; });
    for (const [field, text] of Object.entries(edits)) await type(opened.page, field, text);
    await settle(opened.page);
    return opened;
  }
  /** Asks for the template and waits until the printer would get it. */
  async function askForTemplate(page: Page): Promise<void> {
    await page.evaluate(() => { delete document.documentElement.dataset.printed; });
    await page.locator('[data-print-template]').click();
    await page.waitForFunction(() => document.documentElement.dataset.printed === 'yes');
  }
  /** Both bars, 4 in (five ticks) and 100 mm (eleven), once on every page and true. */
  function expectTrueBars(pages: ReturnType<typeof pagesOf>): void {
    for (const page of pages) {
      const [inches, millimetres] = [checkBars(page, 5), checkBars(page, 11)];
      expect([inches.length, millimetres.length]).toEqual([1, 1]);
      expect(Math.abs((inches[0] ?? 0) - 101.6)).toBeLessThanOrEqual(CLOSE);
      expect(Math.abs((millimetres[0] ?? 0) - 100)).toBeLessThanOrEqual(CLOSE);
    }
  }
  function expectPaper(pages: ReturnType<typeof pagesOf>, [width, height]: readonly [number, number]): void {
    for (const page of pages) {
      expect(Math.abs(page.width - width)).toBeLessThan(0.5);
      expect(Math.abs(page.height - height)).toBeLessThan(0.5);
    }
  }

  test.each(FORMATS)('the setup sheet is one page of %s, bars true, also with a long name, cautions and an assumed width', async (format) => {
    const CASES: readonly Record<string, string>[] = [{}, { railWidth: '', railThickness: '', feed: '30', depth: '1/2' }];
    for (const edits of CASES) {
      const { page, context } = await open(edits);
      if ('railWidth' in edits) await page.getByLabel('Name on the program and the sheet').fill(NAME);
      await settle(page);
      await page.mouse.move(20, 20); // a hand on the page: only then is the sheet's code fetched
      await page.locator('.setup .qr').waitFor({ state: 'attached' });
      expect(await page.locator('.setup .cautions li').count()).toBe('railWidth' in edits ? 2 : 0);
      const pages = pagesOf(await page.pdf({ format }));
      expect(pages.length).toBe(1);
      expectPaper(pages, PAPER[format]);
      expectTrueBars(pages);
      await context.close();
    }
  });

  test('the setup sheet says units in words, every caution, the mark, and has boxes, blanks and a code', async () => {
    const { page, context } = await open({ railWidth: '' });
    await page.emulateMedia({ media: 'print' });
    const sheet = page.locator('.setup');
    await sheet.locator('.qr').waitFor();
    const words = (await sheet.textContent()) ?? '';
    for (const said of [
      await mark(page), 'All sizes in inches', 'Rail width assumed', 'Eye and ear protection on.', 'Dust extraction running, a respirator on.', 'No gloves or loose sleeves near the cutter.',
      'Clamps clear of the path.', 'First run in air', 'Hand on the stop for the first pass.', "The machine's manual, the bit maker's limits and your local rules come first.", 'Cut by', 'Good / spoiled',
    ]) expect(words).toContain(said);
    expect(await sheet.locator('.ticks .box').count()).toBe(7);
    expect(await page.locator('.poster').isVisible()).toBe(false);
    const colours = await sheet.locator('*').evaluateAll((all) => [...new Set(all.map((one) => getComputedStyle(one).color))]);
    expect(colours).toEqual(['rgb(0, 0, 0)']);
    await context.close();
  });

  test.each(FORMATS)('the template of a long rail goes over three papers of %s, laid sideways, bars true on each', async (format) => {
    const { page, context } = await open();
    await askForTemplate(page);
    expect(await page.locator('.template header').allTextContents()).toEqual([1, 2, 3].map((n) => expect.stringContaining(`${n} of 3`)));
    expect(await page.locator('.template svg text', { hasText: /^join 1$/ }).count()).toBe(4);
    const pages = pagesOf(await page.pdf({ format, preferCSSPageSize: true }));
    expect(pages.length).toBe(3);
    expectPaper(pages, [PAPER[format][1], PAPER[format][0]]);
    expectTrueBars(pages);
    await context.close();
  });

  test.each([
    ['in', { railLength: '8', stopMargin: '7/8', width: '3/8' }, 6.25 * 25.4, 0.375 * 25.4],
    ['mm', { railLength: '203 mm', stopMargin: '21.5 mm', width: '9 mm' }, 160, 9],
  ] as const)('a short rail, %s: its slot measured on the paper is the slot that was asked for', async (_, edits, length, width) => {
    const { page, context } = await open(edits);
    await askForTemplate(page);
    for (const format of FORMATS) {
      if (format !== FORMATS[0]) await askForTemplate(page);
      const pages = pagesOf(await page.pdf({ format, preferCSSPageSize: true }));
      expect(pages.length).toBe(1);
      const slots = (pages[0]?.paths ?? []).filter((path) => path.painted === 'stroke' && Math.abs(path.width - length) < 5 && Math.abs(path.height - width) < 2);
      expect(slots.length).toBe(1);
      expect(Math.abs((slots[0]?.width ?? 0) - length)).toBeLessThanOrEqual(CLOSE);
      expect(Math.abs((slots[0]?.height ?? 0) - width)).toBeLessThanOrEqual(CLOSE);
    }
    await context.close();
  });

  test('after the template the printer gets the setup sheet again', async () => {
    const { page, context } = await open();
    await askForTemplate(page);
    expect(await page.locator('html').getAttribute('class')).toContain('print-template');
    await page.evaluate(() => { window.dispatchEvent(new Event('afterprint')); });
    await page.locator('.template').waitFor({ state: 'detached' });
    expect((await page.locator('html').getAttribute('class')) ?? '').not.toContain('print-template');
    const [only, ...others] = pagesOf(await page.pdf({ format: 'Letter' }));
    expect(others).toEqual([]);
    expect(only?.height).toBeGreaterThan(only?.width ?? Infinity);
    await context.close();
  });

  test('while a size is at fault nothing is printed, and the button says so', async () => {
    const { page, context } = await open({ depth: '3/4' });
    const button = page.locator('[data-print-template]');
    expect(await button.getAttribute('aria-disabled')).toBe('true');
    await button.click({ force: true });
    expect(await page.locator('.template').count()).toBe(0);
    expect(await page.locator('html').getAttribute('data-printed')).toBeNull();
    await context.close();
  });
});
