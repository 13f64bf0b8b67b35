import { gzipSync } from 'node:zlib';
import type { Browser, BrowserContextOptions } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { launch, settle, type } from '../support/browser';

/** Compressed script on first load, before the 3D view is asked for. */
const MOST = 120_000; // bytes
/** Long after everything that a page fetches on its own once it is idle. */
const IDLE = 2500; // ms

interface Script {
  readonly url: string;
  readonly text: string;
  readonly bytes: number;
}

describe('what a page weighs', () => {
  let browser: Browser;
  const url = `${inject('baseUrl')}/`;
  beforeAll(async () => { browser = await launch(); });
  afterAll(() => browser.close());

  async function open(options: BrowserContextOptions) {
    const context = await browser.newContext({ reducedMotion: 'reduce', ...options });
    const page = await context.newPage();
    const fetched: Promise<Script>[] = [];
    page.on('response', (response) => {
      if (!/javascript/.test(response.headers()['content-type'] ?? '')) return;
      fetched.push(response.body().then((body) => ({ url: response.url(), text: body.toString(), bytes: gzipSync(body, { level: 9 }).length })));
    });
    await page.goto(url, { waitUntil: 'networkidle' });
    await page.waitForTimeout(IDLE);
    return { page, context, scripts: () => Promise.all(fetched) };
  }
  const has3d = (scripts: readonly Script[]) => scripts.some(({ text }) => text.includes('WebGLRenderer'));

  test.each([['a desk', { width: 1440, height: 900 }], ['a phone', { width: 390, height: 844 }]])('on %s the first load stays under 120 kB of script, without three.js and without the core', async (_, viewport) => {
    const { context, scripts } = await open({ viewport });
    const all = await scripts();
    expect(all.length).toBeGreaterThan(1);
    const table = all.map(({ url: at, bytes }) => `${bytes} ${new URL(at).pathname}`).join('\n');
    expect(all.reduce((sum, { bytes }) => sum + bytes, 0), table).toBeLessThanOrEqual(MOST);
    expect(has3d(all)).toBe(false);
    expect(all.some(({ text }) => text.includes('NISTIR') || text.includes('ZodError'))).toBe(false);
    await context.close();
  });

  test('three.js comes once the view is in sight, the core once something is typed', async () => {
    const { page, context, scripts } = await open({ viewport: { width: 1440, height: 900 } });
    await type(page, 'depth', '1/8');
    await settle(page);
    const typed = await scripts();
    expect(has3d(typed)).toBe(false);
    expect(typed.some(({ text }) => text.includes('ZodError'))).toBe(true);
    await page.locator('.lines').scrollIntoViewIfNeeded();
    await page.locator('canvas').waitFor();
    expect(has3d(await scripts())).toBe(true);
    await context.close();
  });

  test('what has a hash in its name is kept for a year, and goes out compressed', async () => {
    const html = await (await fetch(url)).text();
    const path = /src="(\/_nuxt\/[^"]+\.js)"/.exec(html)?.[1] ?? '';
    const { headers } = await fetch(new URL(path, url), { headers: { 'accept-encoding': 'gzip' } });
    expect(headers.get('cache-control')).toMatch(/max-age=31536000.*immutable/);
    expect(headers.get('content-encoding')).toBe('gzip');
    expect((await fetch(url, { headers: { 'accept-encoding': 'gzip' } })).headers.get('content-encoding')).toBe('gzip');
    expect((await fetch(url, { headers: { 'accept-encoding': 'identity' } })).headers.get('content-encoding')).toBeNull();
  });
});
