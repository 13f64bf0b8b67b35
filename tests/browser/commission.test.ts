import { readFileSync } from 'node:fs';
import AxeBuilder from '@axe-core/playwright';
import type { Browser, BrowserContext, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Role } from '#shared/types/people';
import { launch } from '../support/browser';
import { demoSignIns } from '../support/people';
import { type RunningServer, startServer } from '../support/server';

let server: RunningServer;
let browser: Browser;
beforeAll(async () => {
  server = await startServer({ TALLYRAIL_DEMO: '1' });
  browser = await launch({ webgl: false });
}, 60_000);
afterAll(async () => {
  await browser.close();
  await server.stop();
});

interface Seat {
  readonly page: Page;
  readonly context: BrowserContext;
  readonly complaints: readonly string[];
  readonly get: (path: string) => Promise<any>; // eslint-disable-line @typescript-eslint/no-explicit-any -- tests look into whatever comes
}
async function as(role: Role, options: Parameters<Browser['newContext']>[0] = {}): Promise<Seat> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 }, reducedMotion: 'reduce', acceptDownloads: true, ...options });
  const person = demoSignIns(server.folder).find((one) => one.role === role);
  expect((await context.request.post(`${server.url}/api/account/sign-in`, { data: { email: person?.email, password: person?.password } })).status()).toBe(200);
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on('pageerror', (error) => complaints.push(error.message));
  page.on('dialog', (dialog) => void dialog.accept());
  return { page, context, complaints, get: async (path) => (await context.request.get(server.url + path)).json() };
}
/** Until the page answers to keys and its piece is worked out. */
async function alive(page: Page): Promise<void> {
  await page.waitForFunction(() => (document.querySelector('#__nuxt') as (Element & { __vue_app__?: unknown }) | null)?.__vue_app__ !== undefined);
  await page.waitForLoadState('networkidle');
}
async function openDayRoom({ page, get }: Seat): Promise<string> {
  const { rows: [row] } = await get('/api/commissions?q=42 coins');
  await page.goto(`${server.url}/commissions/${row.id}`);
  await alive(page);
  await page.locator('[data-piece] [data-coin]').first().waitFor();
  return row.id;
}
const coins = (page: Page) => page.locator('[data-piece] [data-coin]');
const CSV = 'Count;Coin;Dia (in);Thick (in)\n2;Founders;2;0.157\n8;Squad;1 3/4;0.125\n21;Mutual-aid;1 1/2;0.118\n11;Cadet;1 1/4;0.118\n';

describe('the owner', () => {
  it('takes a commission in, brings 42 coins from a file, and comes to rails with a cut list, an assembly sheet and a finish plan', async () => {
    const seat = await as('owner');
    const { page } = seat;
    await page.goto(`${server.url}/commissions`);
    await alive(page);
    await page.getByRole('link', { name: 'Take one in' }).click();
    await page.getByLabel('Name').waitFor();
    await page.getByRole('button', { name: 'Take it in' }).click();
    expect(await page.locator('[aria-invalid="true"]').count()).toBe(1);
    await page.getByLabel('Name').fill('Coins for the lobby');
    await page.getByLabel('Due').fill(new Date(Date.now() + 30 * 86_400_000).toISOString().slice(0, 10));
    await page.getByRole('button', { name: 'Take it in' }).click();
    await page.getByRole('heading', { level: 1, name: 'Coins for the lobby' }).waitFor();
    await alive(page);
    await page.getByText('From a file or the catalogue').click();
    await page.getByLabel('CSV file of coins').setInputFiles({ name: 'coins.csv', mimeType: 'text/csv', buffer: Buffer.from(CSV) });
    await coins(page).first().waitFor();
    expect(await page.locator('[data-total]').innerText()).toBe('42');
    await page.getByLabel('Kind of piece').selectOption('striped-flag');
    await page.getByLabel('Board height').fill('16 1/4');
    for (const lane of [3, 6, 9]) await page.getByRole('button', { name: `Rail on stripe ${lane}`, exact: true }).click();
    for (const lane of [8, 10, 12]) await page.getByRole('button', { name: `Rail on stripe ${lane}`, exact: true }).click();
    await expect.poll(() => page.locator('[data-unplaced]').innerText()).toMatch(/^One Cadet coin has no place/);
    await page.locator('[data-way]').filter({ hasText: 'Set the gap to' }).click();
    await page.locator('[data-unplaced]').waitFor({ state: 'detached' });
    expect(await coins(page).count()).toBe(42);
    await page.locator('[data-save]').click();
    await page.getByText('Saved, revision 1').waitFor();
    await page.locator('[data-make-rails]').click();
    await page.getByRole('link', { name: 'Rail C' }).waitFor();
    for (const place of ['[data-cut-list] tbody tr', '[data-brad]', '[data-schedule] tbody tr', '[data-steps] li']) expect(await page.locator(place).count(), place).toBeGreaterThan(0);
    const { rows: [row] } = await seat.get('/api/commissions?q=Coins for the lobby');
    const { rails, work } = await seat.get(`/api/commissions/${row.id}`);
    expect(rails).toHaveLength(3);
    expect(work.piece.gap).toBe('3/16');
    expect((await seat.get(`/api/rails/${rails[0].id}`)).request).toMatchObject({ length: 24.5, width: 0.375, depth: 0.1875 });
    await page.getByRole('link', { name: 'Rail A' }).click();
    await page.getByRole('heading', { level: 1, name: /rail A/ }).waitFor();
    expect(seat.complaints).toEqual([]);
    await seat.context.close();
  });

  it('is told which lines of a pasted table are wrong, and nothing of it is taken over', async () => {
    const seat = await as('owner');
    await openDayRoom(seat);
    const { page } = seat;
    await page.getByText('From a file or the catalogue').click();
    await page.getByLabel(/Paste a table/).fill('name,diameter,thickness,count\nGood,1.5,0.118,5\nThick,1 1/2,wide,2\nMany,1.5,0.118,a few\n');
    await page.getByRole('button', { name: 'Take the coins over' }).click();
    const said = page.locator('[data-csv-problems] li');
    expect(await said.allInnerTexts()).toEqual([expect.stringMatching(/Line 3.*thickness is "wide"/s), expect.stringMatching(/Line 4.*count is "a few"/s)]);
    expect(await page.locator('[data-total]').innerText()).toBe('42');
    expect(await page.getByLabel(/Paste a table/).inputValue()).toContain('Thick,1 1/2,wide,2');
    const [saved] = await Promise.all([page.waitForEvent('download'), page.getByRole('button', { name: 'Template' }).click()]);
    expect(readFileSync(await saved.path(), 'utf8')).toContain('Diameter (in)');
    await seat.context.close();
  });

  it('pins a coin by typing and by drawing it to another rail, and steps back from both', async () => {
    const seat = await as('owner');
    await openDayRoom(seat);
    const { page } = seat;
    const squad = (rail: string) => page.locator(`[data-coin][data-rail="${rail}"][data-kind="Squad"]`);
    const counts = async () => [await squad('A').count(), await squad('B').count(), await squad('C').count()];
    expect(await counts()).toEqual([2, 6, 0]);
    await page.getByLabel('Squad in rail C', { exact: true }).fill('3');
    await page.getByLabel('Squad in rail C', { exact: true }).press('Tab');
    await page.getByLabel('Squad in rail C, pinned').waitFor();
    await expect.poll(() => squad('C').count()).toBeGreaterThanOrEqual(3);
    await page.getByRole('button', { name: 'Undo' }).click();
    await expect.poll(counts).toEqual([2, 6, 0]);
    await squad('A').first().scrollIntoViewIfNeeded();
    const [from, to] = [await squad('A').first().boundingBox(), await page.locator('[data-coin][data-rail="C"]').first().boundingBox()];
    if (!from || !to) throw new Error('Both coins are in sight.');
    await page.mouse.move(from.x + from.width / 2, from.y + from.height / 2);
    await page.mouse.down();
    await page.mouse.move(from.x + from.width / 2, to.y + to.height / 2, { steps: 6 });
    await page.mouse.up();
    await page.getByLabel('Squad in rail C, pinned').waitFor();
    await expect.poll(() => squad('C').count()).toBeGreaterThan(0);
    await page.keyboard.press('Control+z');
    await expect.poll(counts).toEqual([2, 6, 0]);
    // A coin that does not stand under the rail above: said, and the drawing stays.
    await page.getByLabel('Founders\' in rail B', { exact: true }).fill('1');
    await page.getByLabel('Founders\' in rail B', { exact: true }).press('Tab');
    await page.locator('[data-pin-problem]').waitFor();
    expect(await page.locator('[data-pin-problem]').innerText()).toContain('Founders\' is pinned to rail B, where it does not stand.');
    expect(await coins(page).count()).toBeGreaterThanOrEqual(42);
    await seat.context.close();
  });

  it('sees what a changed count makes stale, and makes the rails again at a press', async () => {
    const seat = await as('owner');
    const id = await openDayRoom(seat);
    const { page } = seat;
    expect(await page.locator('[data-stale]').count()).toBe(0);
    await page.getByLabel('Cadet, count').fill('9');
    await page.locator('[data-save]').click();
    await page.getByText('Saved, revision 2').waitFor();
    await page.locator('[data-stale]').waitFor();
    expect(await page.locator('[data-stale] li').allInnerTexts()).toEqual([expect.stringContaining('The rails were made before the tally changed.'), expect.stringContaining('The programs were made before the tally changed.')]);
    await page.getByRole('button', { name: 'Make the rails again' }).first().click();
    await page.locator('[data-stale]').waitFor({ state: 'detached' });
    // The rails themselves are the same: their programs stand.
    expect((await seat.get(`/api/commissions/${id}`)).rails.map(({ revision }: { readonly revision: number }) => revision)).toEqual([1, 1, 1]);
    await seat.context.close();
  });

  it('is kept from saving over another\'s work, and chooses', async () => {
    const [seat, other] = [await as('owner'), await as('owner')];
    const id = await openDayRoom(seat);
    const { work, revision } = await other.get(`/api/commissions/${id}`);
    await other.context.request.post(`${server.url}/api/commissions/${id}/revisions`, { data: { work: { ...work, piece: { ...work.piece, gap: '1/8' } }, basedOn: revision } });
    const { page } = seat;
    await page.getByLabel('Squad, count').fill('7');
    await page.locator('[data-save]').click();
    await page.getByText(/Somebody saved this piece/).waitFor();
    await page.getByRole('button', { name: 'Go on with mine' }).click();
    await page.locator('[data-save]').click();
    await page.getByText(`Saved, revision ${revision + 2}`).waitFor();
    expect((await seat.get(`/api/commissions/${id}`)).work.tally.kinds[1].count).toBe(7);
    for (const each of [seat, other]) await each.context.close();
  });
});

it('the drawing goes out at true size, and the paper shows the work without contact or price', async () => {
  const seat = await as('owner');
  await openDayRoom(seat);
  const { page } = seat;
  const [saved] = await Promise.all([page.waitForEvent('download'), page.locator('[data-svg]').click()]);
  const svg = readFileSync(await saved.path(), 'utf8');
  expect([saved.suggestedFilename(), svg.match(/<svg [^>]*>/)?.[0]]).toEqual(['42-coins-for-the-day-room.svg', expect.stringContaining('width="28in" height="16.25in" viewBox="0 0 28 16.25"')]);
  // As many coins as stand on the page, whatever the tests before this one have done to the tally.
  const stand = Number(/(\d+) placed/.exec(await page.locator('tfoot').first().innerText())?.[1]);
  expect(stand).toBeGreaterThan(30);
  expect(svg.match(/<circle /g)).toHaveLength(stand);
  await page.emulateMedia({ media: 'print' });
  const paper = await page.locator('body').innerText();
  for (const there of ['short stripe', 'rail A top', '18 gauge', 'Oily rags']) expect(paper).toContain(there);
  for (const secret of ['Prewitt', 'halvard@', 'Cost of the wood', '41.67']) expect(paper).not.toContain(secret);
  await seat.context.close();
});

describe('the shop hand', () => {
  it('sees tally, piece, cut list and steps, ticks one off, and finds no contact and no price on the page', async () => {
    const seat = await as('hand');
    await openDayRoom(seat);
    const { page } = seat;
    await page.locator('[data-steps] input').first().check();
    await page.getByText(/Teo Varga/).last().waitFor();
    const text = await page.locator('body').innerText();
    for (const secret of ['Prewitt', 'halvard@', 'Cost of the wood', '12.50', 'Save as']) expect(text).not.toContain(secret);
    expect(await page.locator('[data-cut-list] tbody tr').count()).toBeGreaterThan(4);
    expect(await page.locator('[data-cost]').count()).toBe(0);
    await seat.context.close();
  });
});

describe.each([[1440, 900], [820, 1180], [390, 844]] as const)('at %i px', (width, height) => {
  it.each(['light', 'dark'] as const)('in %s axe finds nothing, and nothing scrolls sideways', async (colorScheme) => {
    const seat = await as('owner', { viewport: { width, height }, colorScheme });
    const { page } = seat;
    await openDayRoom(seat);
    expect(await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)).toBeLessThanOrEqual(0);
    const { violations } = await new AxeBuilder({ page }).withTags(['wcag2a', 'wcag2aa', 'wcag21aa', 'wcag22aa']).analyze();
    expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html.slice(0, 160)).slice(0, 3).join(' | ')}`)).toEqual([]);
    await seat.context.close();
  });
});
