import type { Browser, BrowserContextOptions, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { type Draft, COUNT_KEYS, FIRST_DRAFT, RATE_KEYS, SIZE_KEYS, type TextKey, WORD_KEYS } from '../../app/utils/draft';
import { draftFrom, linkOf } from '../../app/utils/link';
import { box, launch, mark, openPage, settle, type } from '../support/browser';

const SIZES = ['railLength', 'stopMargin', 'length', 'width', 'depth', 'railThickness', 'railWidth', 'bitDiameter', 'flutes', 'spindleSpeed', 'feed', 'plungeFeed', 'stepdown'];
/** A value that works in each box, other than the first drawing's. */
const NEXT: Readonly<Record<string, string>> = {
  railLength: '24', stopMargin: '1', length: '22', width: '7/16', depth: '1/4', railThickness: '7/8', railWidth: '1 1/2',
  bitDiameter: '3/16', flutes: '1', spindleSpeed: '14000', feed: '90', plungeFeed: '20', stepdown: '1/16',
};

describe('for small windows, large letters, any hand', () => {
  let browser: Browser;
  const url = `${inject('baseUrl')}/`;
  beforeAll(async () => { browser = await launch(); });
  afterAll(() => browser.close());

  /** Whether anything that is typed in or pressed lies beside the window. */
  const lost = (page: Page) => page.locator('main button:visible, [data-size]:visible, input[type="radio"] + span:visible, summary:visible').evaluateAll((all) =>
    all.map((one) => ({ words: (one.getAttribute('data-size') ?? one.textContent ?? '').trim(), box: one.getBoundingClientRect() }))
      .filter(({ box: { left, right } }) => left < -0.5 || right > window.innerWidth + 0.5).map(({ words }) => words));

  test.each<[string, BrowserContextOptions]>([
    ['320 px wide', { viewport: { width: 320, height: 640 } }],
    ['200 % zoom of 1440 px', { viewport: { width: 720, height: 450 }, deviceScaleFactor: 2 }],
    ['400 % zoom of 1280 px', { viewport: { width: 320, height: 256 }, deviceScaleFactor: 4 }],
  ])('%s: no sideways scrolling and no control lost', async (_, options) => {
    const { page, context } = await openPage(browser, url, options);
    await page.locator('summary').click();
    for (const field of SIZES) expect(await box(page, field).locator('..').isVisible(), field).toBe(true);
    for (const name of ['Copy', 'Print setup sheet', 'Print true size', 'Copy link', 'Night']) expect(await page.getByRole('button', { name, exact: true }).isVisible(), name).toBe(true);
    expect(await page.locator('[data-download]').isVisible()).toBe(true);
    expect(await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)).toBeLessThanOrEqual(0);
    expect(await lost(page)).toEqual([]);
    await context.close();
  });

  test('with reduced motion nothing plays by itself and nothing eases', async () => {
    const { page, context } = await openPage(browser, url);
    await page.locator('.lines').scrollIntoViewIfNeeded();
    const slider = page.getByRole('slider', { name: 'Time in the program' });
    await slider.waitFor();
    const before = await slider.inputValue();
    await page.waitForTimeout(600); // playback at rest stays there
    expect(await slider.inputValue()).toBe(before);
    const easing = await page.locator('*').evaluateAll((all) => all.filter((one) => {
      const style = getComputedStyle(one);
      return style.transitionDuration.split(',').some((time) => Number.parseFloat(time) > 0) && style.transitionProperty !== 'none' && style.transitionProperty !== 'all';
    }).length);
    expect(easing).toBe(0);
    expect(await page.evaluate(() => document.getAnimations().filter(({ playState }) => playState === 'running').length)).toBe(0);
    await context.close();
  });

  /** Chooses a box in the way of one hand and replaces what it holds. */
  const HANDS: readonly (readonly [string, BrowserContextOptions, (page: Page, field: string, text: string) => Promise<void>])[] = [
    ['mouse', {}, async (page, field, text) => {
      await box(page, field).locator('..').click();
      await page.keyboard.type(text);
    }],
    ['keyboard', {}, async (page, field, text) => {
      const focused = () => page.evaluate(() => document.activeElement?.closest('[data-size]')?.getAttribute('data-size') ?? null);
      for (let i = 0; i < 60 && (await focused()) !== field; i++) await page.keyboard.press('Tab');
      expect(await focused()).toBe(field);
      await page.keyboard.type(text);
    }],
    ['touch', { viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true }, async (page, field, text) => {
      await box(page, field).locator('..').tap();
      await page.keyboard.type(text);
    }],
  ];
  test.each(HANDS)('every size by %s', async (_, options, put) => {
    const { page, context, complaints } = await openPage(browser, url, options);
    for (const field of SIZES) {
      const text = NEXT[field] ?? '';
      await put(page, field, text);
      expect(await box(page, field).inputValue(), field).toBe(text);
    }
    await settle(page);
    await page.locator('[data-mark]').waitFor();
    // Slot length was typed after the stop margin: the rail length follows them.
    expect(await box(page, 'railLength').inputValue()).toBe('24');
    expect(complaints).toEqual([]);
    await context.close();
  });

  test('a hundred changes of units among all three leave every figure and the mark as they were', async () => {
    const { page, context } = await openPage(browser, url);
    await type(page, 'depth', '4.7 mm');
    await type(page, 'width', '.40625');
    await page.locator('summary').click();
    await settle(page);
    const read = () => page.locator('[data-size] input').evaluateAll((inputs) => inputs.map((input) => (input as HTMLInputElement).value));
    const before = { figures: await read(), mark: await mark(page) };
    for (let i = 1; i <= 99; i++) await page.locator(`.segment label:has(input[value="${['fractions', 'decimals', 'mm'][i % 3] ?? ''}"])`).click();
    await settle(page);
    expect({ figures: await read(), mark: await mark(page) }).toEqual(before);
    await context.close();
  });

  /** Every optional setting set, in words the page itself would put in its address. */
  const FULL: Readonly<Partial<Record<TextKey, string>>> = {
    'finishAllowance': '0.01', 'cuttingLength': '1', 'colletDiameter': '3/4', 'stickout': '1 1/4', 'clampHeight': '1/2', 'clampReach': '5/8', 'safeHeight': '0.8',
    'machine.topFeed': '300', 'machine.acceleration': '12', 'machine.travel.x': '48', 'machine.travel.y': '48', 'machine.travel.z': '5', 'chipLoadRange.0': '0.002', 'chipLoadRange.1': '0.006',
    'options.chordTolerance': '0.0004', 'rampAngle': '2.5', 'stepover': '0.4', 'machine.spindleRange.0': '8000', 'machine.spindleRange.1': '24000', 'name': 'rail Ä, day room', 'options.fileEnding': 'tap',
  };
  const unusual: Draft = {
    ...FIRST_DRAFT,
    texts: { ...FIRST_DRAFT.texts, ...Object.fromEntries(Object.entries(FULL).map(([key, text]) => [key, { text, units: 'in' }])) },
    picks: {
      'ends': 'round', 'wood': 'walnut', 'direction': 'conventional', 'bitKind': 'upcut', 'centreCutting': 'true', 'workZero': 'centre', 'spindle': 'hand', 'machine.heavy': 'true',
      'options.lineNumbers': 'true', 'options.lineEndings': 'crlf', 'options.percent': 'false', 'options.comments': 'true', 'options.speedWord': 'true', 'options.spindleWait': 'seconds', 'options.end': 'M2', 'options.programUnits': 'mm', 'coinBoard': 'none',
    },
  };

  test('a link with every setting set opens with every one of them, and writes itself again', async () => {
    expect([...SIZE_KEYS, ...RATE_KEYS, ...COUNT_KEYS, ...WORD_KEYS].filter((key) => unusual.texts[key].text === '')).toEqual(['length']);
    const { page, context, complaints } = await openPage(browser, `${url}${linkOf(unusual)}`);
    expect(await page.getByRole('alert').count()).toBe(0);
    await page.locator('summary').click();
    for (const [field, text] of Object.entries(FULL)) {
      if (field === 'name' || field === 'options.fileEnding') continue;
      expect(await box(page, field).inputValue(), field).toBe(text);
    }
    // What is typed anew is put into the address with all the rest.
    await type(page, 'depth', '5/32');
    await page.waitForFunction((old) => window.location.hash !== old, linkOf(unusual));
    expect(draftFrom(new URL(page.url()).hash)).toEqual({ ...unusual, texts: { ...unusual.texts, depth: { text: '5/32', units: 'in' } } });
    expect(complaints).toEqual([]);
    await context.close();
  });

  const good = linkOf(FIRST_DRAFT);
  test.each([
    ['truncated', good.slice(0, -7)], ['of another version', good.replace('#1.', '#2.')], ['of no version', good.replace('#1.', '#.')],
    ['chance letters', '#1.q83vEjRWeJCrze8SNFZ4kA'], ['empty', '#1.'], ['not base64', '#1.%%%%'], ['huge', `#1.${'A'.repeat(60_000)}`],
    ['a list of lists', `#1.${Buffer.from(JSON.stringify([0, [0, 1], [[[]]], []])).toString('base64url')}`],
    ['unknown field', `#1.${Buffer.from(JSON.stringify([0, [0, 1], [['zz', '1']], []])).toString('base64url')}`],
    ['the same size held twice', `#1.${Buffer.from(JSON.stringify([0, [1, 1], [], []])).toString('base64url')}`],
  ])('a damaged link (%s) opens the first drawing, says so, and the page works', async (_, hash) => {
    const { page, context, complaints } = await openPage(browser, `${url}${hash}`);
    expect(await page.getByRole('alert').textContent()).toContain('This link is damaged');
    expect(await box(page, 'railLength').inputValue()).toBe('26 1/4');
    const before = await mark(page);
    await type(page, 'depth', '1/4');
    await settle(page);
    expect(await mark(page)).not.toBe(before);
    expect(complaints).toEqual([]);
    await context.close();
  });
});
