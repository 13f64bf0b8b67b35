import { randomUUID } from 'node:crypto';
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
});
afterAll(async () => {
  await browser.close();
  await server.stop();
});

/** A browser signed in as one of the demo's people. */
async function as(role: Role, options: Parameters<Browser['newContext']>[0] = {}): Promise<{ readonly page: Page; readonly context: BrowserContext; readonly complaints: readonly string[] }> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 }, reducedMotion: 'reduce', acceptDownloads: true, ...options });
  const person = demoSignIns(server.folder).find((one) => one.role === role);
  const answer = await context.request.post(`${server.url}/api/account/sign-in`, { data: { email: person?.email, password: person?.password } });
  expect(answer.status()).toBe(200);
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on('pageerror', (error) => complaints.push(error.message));
  return { page, context, complaints };
}
/** Opens a page and waits until it answers to keys: the moments of a list turn into local time, a form has its button. */
async function open(page: Page, path: string): Promise<void> {
  await page.goto(server.url + path);
  await page.waitForFunction(() => {
    const root: (Element & { __vue_app__?: unknown }) | null = document.querySelector('#__nuxt');
    return root?.__vue_app__ !== undefined;
  });
  await page.waitForLoadState('networkidle');
}
const rows = (page: Page) => page.locator('tbody tr');
const described = async (page: Page, name: string) => (await page.getByLabel(name, { exact: true }).first().evaluate((box) => document.getElementById(box.getAttribute('aria-describedby') ?? '')?.textContent)) ?? '';

describe('the owner', () => {
  it('adds a machine in the trade\'s notation; a wrong figure is named beside its field and nothing is lost; changes it after', async () => {
    const { page, context, complaints } = await as('owner');
    await open(page, '/machines');
    await page.getByRole('link', { name: 'Add a machine' }).click();
    await page.getByRole('radio', { name: 'inches' }).waitFor();
    await page.getByLabel('Name').fill('Second router');
    const part = (name: string) => page.getByRole('group', { name });
    for (const [axis, size] of [['X', '30 1/2'], ['Y', '610 mm'], ['Z', '3-1/2"']] as const) await part('Work area').getByLabel(`Along ${axis}`).fill(size);
    for (const axis of ['X', 'Y']) await part('Highest feeds').getByLabel(`Along ${axis}`).fill('150');
    await part('Highest feeds').getByLabel('Along Z').fill('quick');
    await page.getByLabel('Lowest speed').fill('9000');
    await page.getByLabel('Highest speed').fill('24000');
    await page.getByRole('button', { name: 'Add a way of holding' }).click();
    await page.getByLabel('Kind').last().selectOption('side vise');
    await page.getByLabel('Widest rail').last().fill('4 1/2');
    await page.getByRole('button', { name: 'Add the machine' }).click();
    const z = part('Highest feeds').getByLabel('Along Z');
    expect(await z.getAttribute('aria-invalid')).toBe('true');
    expect(await page.locator('[aria-invalid="true"]').count()).toBe(1);
    expect(await page.evaluate(() => document.getElementById(document.activeElement?.getAttribute('aria-describedby') ?? '')?.textContent)).toContain('Highest feed along Z is "quick"');
    expect([await z.inputValue(), await part('Work area').getByLabel('Along X').inputValue(), await page.getByLabel('Widest rail').last().inputValue()]).toEqual(['quick', '30 1/2', '4 1/2']);
    await z.fill('60');
    await page.getByRole('button', { name: 'Add the machine' }).click();
    await page.getByRole('heading', { level: 1, name: 'Second router' }).waitFor();
    const kept = await (await context.request.get(`${server.url}/api/machines?q=Second`)).json();
    expect(kept.rows[0].spec).toMatchObject({ workArea: { x: 30.5, z: 3.5 }, holdings: [{ kind: 'fence and tape' }, { kind: 'side vise', widest: 4.5 }] });
    expect(kept.rows[0].spec.workArea.y).toBeCloseTo(610 / 25.4, 9);

    await page.getByRole('link', { name: 'Change it' }).click();
    expect(await part('Work area').getByLabel('Along Y').inputValue()).toBe('610 mm');
    await page.getByLabel('Name').fill('Second router, moved');
    await page.getByRole('button', { name: 'Save' }).click();
    await page.getByRole('heading', { level: 1, name: 'Second router, moved' }).waitFor();
    expect((await (await context.request.get(`${server.url}/api/machines?q=Second`)).json()).rows[0].spec.workArea).toEqual(kept.rows[0].spec.workArea);
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('adds a bit, and is told beside the field where its collet would grip the flutes', async () => {
    const { page, context } = await as('owner');
    await open(page, '/bits/new');
    for (const [name, text] of [['Name', '6 mm down-cut'], ['Diameter', '6 mm'], ['Cutting length', '1 in'], ['Collet nut diameter', '1 1/4'], ['Stickout', '3/4']] as const) await page.getByLabel(name, { exact: true }).fill(text);
    await page.getByLabel('Type').selectOption('downcut');
    await page.getByRole('button', { name: 'Add the bit' }).click();
    expect(await described(page, 'Stickout')).toContain('the collet grips the flutes');
    await page.getByLabel('Stickout', { exact: true }).fill('1 1/4');
    await page.getByRole('button', { name: 'Add the bit' }).click();
    await page.getByRole('heading', { level: 1, name: '6 mm down-cut' }).waitFor();
    expect(await page.locator('main').innerText()).toContain('A down-cut bit leaves a clean lip');
    await context.close();
  });

  it('finds a program by its mark as it is typed, goes back to all by the address, and saves the list as CSV', async () => {
    const { page, context } = await as('owner');
    const all = (await (await context.request.get(`${server.url}/api/shop/programs`)).json()).rows;
    await open(page, '/programs');
    expect(await rows(page).count()).toBe(all.length);
    await page.getByLabel('Mark begins with').fill(all[1].mark.toLowerCase().replace('-', ''));
    await page.waitForFunction(() => document.querySelectorAll('tbody tr').length === 1);
    expect(await rows(page).innerText()).toContain(all[1].mark);
    expect(new URL(page.url()).searchParams.get('q')).toBe(all[1].mark.toLowerCase().replace('-', ''));
    const [saved] = await Promise.all([page.waitForEvent('download'), page.getByRole('link', { name: 'Export CSV' }).click()]);
    const csv = readFileSync(await saved.path(), 'utf8').trim().split('\r\n');
    expect([saved.suggestedFilename(), csv.length]).toEqual(['programs.csv', 2]);
    expect(csv[1]).toContain(all[1].mark);
    await page.getByRole('link', { name: all[1].mark }).click();
    await page.getByRole('heading', { level: 2, name: 'Readback' }).waitFor();
    const text = (await (await context.request.get(`${server.url}/api/shop/programs/${all[1].id}`)).json()).text;
    expect(await page.getByRole('region', { name: /The program's text/ }).locator('pre').last().textContent()).toBe(text.replaceAll('\r\n', '\n').replace(/\n$/, ''));
    const [file] = await Promise.all([page.waitForEvent('download'), page.getByRole('link', { name: /^Download/ }).click()]);
    expect(readFileSync(await file.path(), 'utf8')).toBe(text);
    await context.close();
  });

  it('sorts by a column head, and pages through more than one page and back', async () => {
    const { page, context } = await as('owner');
    for (let i = 1; i <= 60; i++) {
      const answer = await context.request.post(`${server.url}/api/woods`, { data: { units: 'in', name: `Board ${String(i).padStart(2, '0')}`, kind: 'hardwood', movesSeasonally: true } });
      expect(answer.status()).toBe(200);
    }
    await open(page, '/woods');
    const list = page.getByRole('region', { name: "The shop's own woods" });
    const first = () => list.locator('tbody tr').first().innerText();
    expect(await list.getByRole('columnheader', { name: 'Name' }).getAttribute('aria-sort')).toBe('ascending');
    expect(await first()).toContain('Board 01');
    await list.getByRole('link', { name: 'Next' }).click();
    await list.getByText('Page 2').waitFor();
    await list.getByText('Board 51').waitFor();
    expect(await list.locator('tbody tr').count()).toBe(10);
    await list.getByRole('link', { name: 'Previous' }).click();
    await list.getByText('Board 01').waitFor();
    await list.getByRole('link', { name: 'Name' }).click();
    await list.getByText('Board 60').waitFor();
    expect(await list.getByRole('columnheader', { name: 'Name' }).getAttribute('aria-sort')).toBe('descending');
    await list.getByRole('link', { name: 'Board 60' }).focus();
    await page.keyboard.press('ArrowDown');
    expect(await page.evaluate(() => document.activeElement?.textContent)).toContain('Board 59');
    await context.close();
  });

  it('accepts what three widths that agree show a bit to cut, later programs use it, and a new bit begins again', async () => {
    const { page, context } = await as('owner');
    const get = async (path: string) => (await context.request.get(server.url + path)).json();
    const program = (await get('/api/shop/programs')).rows.find(({ rail }: { readonly rail: string }) => rail.startsWith('Day room'));
    const { bitId } = await get(`/api/shop/programs/${program.id}`);
    const log = (id: string, widths: readonly number[]) => context.request.post(`${server.url}/api/cuts`, { data: { id, programId: program.id, outcome: 'well', seconds: 600, widths, depths: [], cutAt: new Date().toISOString() } });
    expect((await log('first-off-of-two-widths', [0.379, 0.3784])).status()).toBe(200);
    await open(page, `/bits/${bitId}`);
    expect(await page.getByRole('button', { name: /Accept/ }).count()).toBe(0);
    await log('first-off-that-slipped', [0.3786, 0.395]);
    await page.reload();
    await page.getByText('Measure again').waitFor();
    await page.getByRole('checkbox', { name: /Count 0.3950/ }).uncheck();
    await page.getByText('3 measurements within 0.0006 in').waitFor();
    await page.getByRole('button', { name: 'Accept 0.2537 in' }).click();
    await page.getByText('in use', { exact: true }).waitFor();
    expect((await get(`/api/bits/${bitId}`)).spec.acceptedDiameter).toBeCloseTo((0.379 + 0.3784 + 0.3786) / 3 - 0.125, 9);
    expect(await page.locator('main').innerText()).toContain('20 minutes of cutting');
    expect((await get('/api/shop/deeds?limit=1')).rows[0]).toMatchObject({ what: 'took 0.2537 in as what it cuts: bit', subject: '1/4 straight' });
    await page.getByRole('button', { name: 'Put a new one in' }).click();
    await page.getByRole('alertdialog').getByRole('button', { name: 'Put it in' }).click();
    await page.getByText('0 minutes').waitFor();
    expect((await get(`/api/bits/${bitId}`)).spec.acceptedDiameter).toBeNull();
    await page.getByText('No width measured with it yet').waitFor();
    expect(await page.locator('main').innerText()).toContain('Accepted so far');
    expect(await page.getByText('in use', { exact: true }).count()).toBe(0);
    const refused = await context.request.post(`${server.url}/api/bits/${bitId}/correction`, { data: { measurements: ['first-off-of-two-widths:1'] } });
    expect(refused.status()).toBe(409);
    expect((await context.request.post(`${server.url}/api/bits/${bitId}/correction`, { data: { measurements: [] } })).status()).toBe(422);
    await context.close();
  });
});

describe('the shop hand', () => {
  it('looks at everything, and finds no button or page that changes it', async () => {
    const { page, context } = await as('hand');
    const id = async (path: string) => (await (await context.request.get(server.url + path)).json()).rows[0].id;
    const [machine, bit] = [await id('/api/machines'), await id('/api/bits')];
    for (const path of ['/machines', '/bits', '/woods', '/rails', '/programs', '/cuts', `/machines/${machine}`, `/machines/${machine}?change`, `/bits/${bit}`, `/bits/${bit}?change`]) {
      await open(page, path);
      expect(await page.locator('main h1').count(), path).toBe(1);
      expect(await page.locator('main').getByRole('button').allInnerTexts(), path).toEqual([]);
      expect(await page.locator('main a').filter({ hasText: /^(Add |Draw |Change it)/ }).count(), path).toBe(0);
      expect(await page.locator('main form:not([role="search"])').count(), path).toBe(0);
    }
    for (const path of ['/machines/new', '/bits/new', '/woods/new', '/log']) {
      await page.goto(server.url + path);
      expect(new URL(page.url()).pathname, path).toBe('/bench');
    }
    await context.close();
  });
});

describe('for everyone, on every screen', () => {
  /** Every page with something on it: a wood of the shop's own, and a bit that was measured. */
  const pages = async (context: BrowserContext) => {
    const get = async (path: string) => (await context.request.get(server.url + path)).json();
    const add = async (path: string, data: object) => expect((await context.request.post(server.url + path, { data })).status()).toBe(200);
    const id = async (path: string) => (await get(path)).rows[0].id;
    const [machine, program] = [await id('/api/machines'), await id('/api/shop/programs')];
    await add('/api/woods', { units: 'in', name: 'Board 1', kind: 'hardwood', movesSeasonally: true });
    await add('/api/cuts', { id: `to-be-looked-at-${randomUUID()}`, programId: program, outcome: 'well', seconds: 60, widths: [8.01, 8.02, 8], depths: [], cutAt: new Date().toISOString() });
    const [wood, { bitId: bit }] = [await id('/api/woods'), await get(`/api/shop/programs/${program}`)];
    return [
      '/rails', '/machines', '/machines/new', `/machines/${machine}`, '/bits', '/bits/new', `/bits/${bit}`, '/woods?q=Board 1', '/woods/new', `/woods/${wood}`,
      '/programs', `/programs/${program}`, '/cuts', '/log?q=1',
    ];
  };

  it.each([[1440, 'light'], [390, 'dark']] as const)('axe finds nothing: %i px, %s', async (width, colorScheme) => {
    const { page, context } = await as('owner', { viewport: { width, height: 844 }, colorScheme });
    for (const path of await pages(context)) {
      await open(page, path);
      expect(await page.locator('main h1').count(), path).toBe(1);
      const { violations } = await new AxeBuilder({ page }).analyze();
      expect(violations.map(({ id: rule, nodes }) => `${rule}: ${nodes.map(({ target }) => target.join(' ')).join(', ')}`), path).toEqual([]);
    }
    await context.close();
  }, 300_000); // ms: fourteen pages, each up to 7 s where the processor is shared

  it('nothing scrolls sideways', async () => {
    const { page, context } = await as('owner');
    for (const path of await pages(context)) {
      await open(page, path);
      for (const width of [1440, 820, 390, 320]) {
        await page.setViewportSize({ width, height: 844 });
        expect(await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth), `${path} at ${width}`).toBeLessThanOrEqual(0);
      }
    }
    await context.close();
  });
});
