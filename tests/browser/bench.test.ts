import AxeBuilder from '@axe-core/playwright';
import { readFileSync } from 'node:fs';
import type { Browser, BrowserContext, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { ROUTER_CAUTIONS } from '#shared/shop/cautions';
import { launch } from '../support/browser';
import { type Caller, demoSignIns, signInAs } from '../support/people';
import { pagesOf } from '../support/pdf';
import { type RunningServer, startServer } from '../support/server';

/** From sign-in to a logged cut, ms of steps: what the issue allows a person. */
const A_MINUTE = 60_000;

let server: RunningServer;
let browser: Browser;
let owner: Caller;
beforeAll(async () => {
  server = await startServer({ TALLYRAIL_DEMO: '1', TALLYRAIL_TRIES: '10000' });
  [browser, owner] = [await launch({ webgl: false }), await signInAs(server, 'owner')];
}, 60_000);
afterAll(async () => {
  await browser.close();
  await server.stop();
});

interface AtBench {
  readonly page: Page;
  readonly context: BrowserContext;
  readonly complaints: readonly string[];
}
async function signIn(page: Page, role: 'hand' | 'owner', url = server.url): Promise<void> {
  const person = demoSignIns(server.folder).find((one) => one.role === role);
  await page.goto(`${url}/sign-in?to=/bench`, { waitUntil: 'networkidle' });
  await page.getByLabel('E-mail').fill(person?.email ?? '');
  await page.getByLabel('Password').fill(person?.password ?? '');
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.waitForURL('**/bench');
}
async function atBench(options: Parameters<Browser['newContext']>[0] = {}): Promise<AtBench> {
  const context = await browser.newContext({ viewport: { width: 1180, height: 820 }, reducedMotion: 'reduce', acceptDownloads: true, ...options });
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on('console', (message) => { if (message.type() === 'error') complaints.push(message.text()); });
  page.on('pageerror', (error) => complaints.push(error.message));
  await signIn(page, 'hand');
  await page.locator('.rail').first().waitFor();
  return { page, context, complaints };
}
/** Ticks every caution there is. */
async function tickCautions(page: Page): Promise<void> {
  for (const box of await page.locator('.take input[type=checkbox]').all()) await box.check();
}
async function openRail(page: Page, name: string): Promise<void> {
  await page.locator('.rail', { hasText: name }).click();
  await page.locator('[data-mark]').waitFor();
}
const cutsOf = async (rail: string) => (await owner.get('/api/cuts')).rows.filter((cut: { readonly rail: string }) => cut.rail === rail);
/** The worker has every file once it is the page's own. */
const kept = (page: Page) => expect.poll(() => page.evaluate(async () => (await navigator.serviceWorker.getRegistration('/bench'))?.active?.state), { timeout: 20_000 }).toBe('activated');
/** What the tablet's store holds, as text. */
const stored = (page: Page) => page.evaluate(() => new Promise<string>((resolve, reject) => {
  const opening = indexedDB.open('tallyrail-bench', 1);
  opening.onerror = () => reject(opening.error ?? new Error('not opened'));
  opening.onsuccess = () => {
    const database = opening.result;
    const all = [...database.objectStoreNames].map((name) => new Promise<unknown>((read) => {
      const request = database.transaction(name).objectStore(name).getAll();
      request.onsuccess = () => read(request.result);
    }));
    void Promise.all(all).then((rows) => resolve(JSON.stringify(rows))).finally(() => database.close());
  };
}));

describe('the bench, as the shop hand', () => {
  test('from sign-in to a logged cut in under a minute of steps; nothing is taken before every caution is ticked', async () => {
    const began = Date.now();
    const { page, context, complaints } = await atBench();
    expect(await page.locator('.rail.now').textContent()).toContain('now');
    await openRail(page, 'rail A');
    const mark = (await page.locator('[data-mark]').textContent()) ?? '';
    for (const caution of ROUTER_CAUTIONS) expect(await page.getByLabel(caution).count(), caution).toBe(1);

    let saved = 0;
    page.on('download', () => saved++);
    await page.locator('[data-download]').click({ force: true });
    const boxes = await page.locator('.take input[type=checkbox]').all();
    for (const box of boxes.slice(1)) await box.check();
    await page.locator('[data-download]').click({ force: true });
    expect(saved).toBe(0);
    expect(await page.locator('.take .state').textContent()).toBe('One line is still to tick.');
    await boxes[0]?.check();
    const [file] = await Promise.all([page.waitForEvent('download'), page.locator('[data-download]').click()]);
    const bytes = readFileSync(await file.path());
    const programId = new URL(page.url()).pathname.split('/').at(-1);
    const answered = await owner.call('GET', `/api/shop/programs/${programId}/file`);
    expect(bytes.equals(Buffer.from(await answered.arrayBuffer()))).toBe(true);
    expect(file.suggestedFilename()).toContain(mark);

    await page.getByRole('button', { name: 'Start the watch' }).click();
    await page.waitForTimeout(1200);
    expect(await page.locator('.watch .now').textContent()).toContain('spindle comes up to speed');
    await page.getByRole('button', { name: 'Stop the watch' }).click();
    for (const [size, value] of [['width', '0.376'], ['depth', '0.188']] as const) {
      for (const place of ['left end', 'middle', 'right end']) await page.getByLabel(`Groove ${size}, ${place}`).fill(value);
    }
    expect(await page.getByText('Within 0.005. Carry on.').count()).toBe(2);
    await page.getByRole('button', { name: 'Cut went well' }).click();
    await page.waitForURL('**/bench');
    expect(Date.now() - began).toBeLessThan(A_MINUTE);
    await page.locator('.cut', { hasText: 'rail A' }).getByText('cut ').waitFor();
    expect(await page.locator('.rail', { hasText: 'rail A' }).count()).toBe(0);
    const [cut, ...more] = await cutsOf('Day room, rail A');
    expect(more).toEqual([]);
    expect(cut).toMatchObject({ outcome: 'well', by: 'Teo Varga', widths: [0.376, 0.376, 0.376], depths: [0.188, 0.188, 0.188], mark });
    expect(cut.seconds).toBeGreaterThan(1);
    expect(complaints).toEqual([]);
    await context.close();
  });

  test('a spoiled cut asks once, with a reason; a first-off that says stop is asked about', async () => {
    const { page, context } = await atBench();
    await openRail(page, 'Club medals');
    expect(await page.getByText('Program in INCHES: the display must read').count()).toBe(1);
    await page.getByRole('button', { name: 'Spoiled, cut again' }).click({ force: true });
    expect(await page.locator('.why').count()).toBe(0); // nothing was taken: there is nothing to log
    await tickCautions(page);
    await page.getByRole('button', { name: 'It is on the machine already' }).click();
    for (const place of ['left end', 'middle', 'right end']) await page.getByLabel(`Groove width, ${place}`).fill('8,4');
    await page.getByText('Stop. 0.4 mm too wide for these coins.').waitFor();
    await page.getByRole('button', { name: 'Cut went well' }).click();
    await page.getByRole('alertdialog').getByRole('button', { name: 'Leave it' }).click();
    await page.getByRole('button', { name: 'Spoiled, cut again' }).click();
    await page.getByRole('button', { name: 'Log it as spoiled' }).click();
    await page.getByText('Say why it was spoiled').waitFor();
    await page.getByRole('button', { name: 'The rail moved' }).click();
    await page.getByRole('button', { name: 'Log it as spoiled' }).click();
    await page.waitForURL('**/bench');
    await page.locator('.cut', { hasText: 'The rail moved' }).waitFor();
    expect(await page.locator('.rail', { hasText: 'Club medals' }).textContent()).toContain('1 spoiled');
    const [cut] = await cutsOf('Club medals shelf');
    expect(cut).toMatchObject({ outcome: 'spoiled', reason: 'The rail moved', widths: [8.4, 8.4, 8.4], depths: [] });
    await openRail(page, 'Club medals'); // the next one begins with every caution open
    expect(await page.locator('.take input:checked').count()).toBe(0);
    await context.close();
  });

  test('with the network cut: the bench opens, a cut is kept, and goes out once when the network is back; sign-out forgets the day', async () => {
    const { page, context } = await atBench();
    await kept(page);
    await page.reload(); // now through the worker
    await page.locator('.rail').first().waitFor();
    await context.setOffline(true);
    await page.reload();
    await page.locator('.rail', { hasText: 'rail B' }).waitFor();
    expect(await page.locator('.news').textContent()).toMatch(/No network\..*as of \d+:\d\d/);
    await openRail(page, 'rail B');
    await page.reload(); // a rail's own page opens too
    await page.locator('[data-mark]').waitFor();
    await tickCautions(page);
    const [file] = await Promise.all([page.waitForEvent('download'), page.locator('[data-download]').click()]);
    const programId = new URL(page.url()).pathname.split('/').at(-1);
    const answered = await owner.call('GET', `/api/shop/programs/${programId}/file`);
    expect(readFileSync(await file.path()).equals(Buffer.from(await answered.arrayBuffer()))).toBe(true);
    await page.getByRole('button', { name: 'Cut went well' }).click();
    await page.waitForURL('**/bench');
    await page.getByText('One cut is kept on this tablet, will send when there is a signal.').waitFor();
    await page.locator('.cut', { hasText: 'rail B' }).waitFor();
    expect(await cutsOf('Day room, rail B')).toEqual([]);
    await page.reload(); // and a closed page loses nothing
    await page.getByText('One cut is kept').waitFor();

    const held = await stored(page);
    expect(held).toContain('rail B');
    for (const word of ['price', 'email', 'example.com', 'Prewitt', 'phone', 'quote']) expect(held.toLowerCase()).not.toContain(word.toLowerCase());

    let posted = 0;
    page.on('request', (request) => { if (request.method() === 'POST' && request.url().endsWith('/api/cuts')) posted++; });
    await context.setOffline(false);
    await page.getByText('One cut is kept').waitFor({ state: 'detached' });
    await page.waitForTimeout(500);
    expect(posted).toBe(1);
    expect(await cutsOf('Day room, rail B')).toHaveLength(1);

    await page.getByRole('button', { name: /Sign out/ }).click();
    await page.waitForURL('**/sign-in');
    expect(await stored(page)).toBe('[[],[]]');
    await context.setOffline(true);
    await page.goto(`${server.url}/bench`);
    await page.getByText('Nobody is signed in').waitFor();
    expect(await page.locator('body').textContent()).not.toContain('medals');
    await context.close();
  });

  test('a cut kept offline waits for its own person: somebody else neither sees nor sends it', async () => {
    const { page, context } = await atBench();
    await kept(page);
    await context.setOffline(true);
    await openRail(page, 'Club medals');
    await tickCautions(page);
    await page.getByRole('button', { name: 'It is on the machine already' }).click();
    const before = (await cutsOf('Club medals shelf')).length;
    await page.getByRole('button', { name: 'Cut went well' }).click();
    await page.getByText('One cut is kept').waitFor();
    await page.getByRole('button', { name: /Sign out/ }).click();
    await page.getByText('Nobody is signed in').waitFor();
    await context.setOffline(false);
    await signIn(page, 'owner');
    await page.locator('.rail').first().waitFor();
    await page.waitForTimeout(500);
    expect(await page.getByText('One cut is kept').count()).toBe(0);
    expect(await cutsOf('Club medals shelf')).toHaveLength(before);
    expect(await stored(page)).not.toContain('Teo');
    await page.getByRole('button', { name: /Sign out/ }).click();
    await page.waitForURL('**/sign-in');
    await signIn(page, 'hand');
    await expect.poll(async () => (await cutsOf('Club medals shelf')).length, { timeout: 10_000 }).toBe(before + 1);
    expect((await cutsOf('Club medals shelf'))[0].by).toBe('Teo Varga');
    await context.close();
  });

  test("a sheet's square opens its rail, or says that the sheet is of another program", async () => {
    const { page, context } = await atBench();
    const { rails } = await owner.get('/api/bench/today');
    const [rail] = rails;
    await page.goto(`${server.url}/bench?rail=${rail.id}&mark=${rail.program.mark}`);
    await page.waitForURL(`**/bench/${rail.program.id}`);
    await page.goto(`${server.url}/bench?rail=${rail.id}&mark=ACD-EFG`);
    await page.getByText('That sheet is of the program ACD-EFG.').waitFor();
    await page.goto(`${server.url}/bench?rail=gone`);
    await page.getByText('That rail is not to be cut today').waitFor();
    await context.close();
  });

  test('the worker is the bench\'s alone, and over plain HTTP on the shop\'s network the bench says why there is none', async () => {
    const context = await browser.newContext();
    const page = await context.newPage();
    await page.goto(server.url, { waitUntil: 'networkidle' });
    expect(await page.evaluate(async () => (await navigator.serviceWorker.getRegistrations()).length)).toBe(0);
    await context.close();

    const elsewhere = await launch({ webgl: false, hosts: 'MAP tallyrail.test 127.0.0.1' });
    const there = await elsewhere.newPage();
    await signIn(there, 'hand', server.url.replace('127.0.0.1', 'tallyrail.test'));
    await there.locator('.rail').first().waitFor();
    expect(await there.evaluate(() => window.isSecureContext)).toBe(false);
    expect(await there.locator('.news').textContent()).toContain('Without a network this page does not open here: the address begins with http');
    await elsewhere.close();
  });

  test('the setup sheet comes as a PDF', async () => {
    const { rails } = await owner.get('/api/bench/today');
    for (const paper of ['letter', 'a4']) {
      const answer = await owner.call('GET', `/api/rails/${rails[0].id}/sheet.pdf?paper=${paper}`);
      expect(answer.headers.get('content-type')).toBe('application/pdf');
      expect(pagesOf(Buffer.from(await answer.arrayBuffer()))).toHaveLength(1);
    }
    expect((await owner.call('GET', `/api/rails/${rails[0].id}/sheet.pdf?paper=a5`)).status).toBe(422);
  });

  test.each([[1180, 820, 'light'], [820, 1180, 'dark'], [390, 844, 'light']] as const)('%i × %i %s: axe finds nothing, nothing scrolls sideways, targets are 64 px', async (width, height, colorScheme) => {
    const { page, context } = await atBench({ viewport: { width, height }, colorScheme });
    for (const open of [async () => undefined, () => openRail(page, 'Club medals')]) {
      await open();
      await page.waitForTimeout(300);
      const { violations } = await new AxeBuilder({ page }).analyze();
      expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => target.join(' ')).join(', ')}`)).toEqual([]);
      expect(await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)).toBeLessThanOrEqual(0);
      const small = await page.locator('main button:visible, main label.tick:visible, main a:visible, main input:not([type=checkbox]):visible, header button:visible, header a:visible').evaluateAll((all) =>
        all.map((one) => ({ words: one.textContent?.trim().slice(0, 30), box: one.getBoundingClientRect() })).filter(({ box }) => box.width < 63.5 || box.height < 63.5).map(({ words, box }) => `${words} ${box.width} × ${box.height}`));
      expect(small).toEqual([]);
    }
    expect(await page.locator('html').getAttribute('data-theme')).toBe(colorScheme === 'dark' ? 'night' : 'day');
    await context.close();
  });
});
