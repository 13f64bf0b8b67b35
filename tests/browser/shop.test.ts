import type { Browser, BrowserContext, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { box, launch, ready, settle, type } from '../support/browser';
import { type Caller, demoSignIns, secretMailedTo, signInAs } from '../support/people';
import { type RunningServer, startServer } from '../support/server';

let server: RunningServer;
let browser: Browser;
let demoOwner: Caller;
beforeAll(async () => {
  server = await startServer({ TALLYRAIL_DEMO: '1', TALLYRAIL_TRIES: '1000' });
  demoOwner = await signInAs(server, 'owner');
  browser = await launch({ webgl: false });
});
afterAll(async () => {
  await browser.close();
  await server.stop();
});

async function visit(path: string): Promise<{ readonly page: Page; readonly context: BrowserContext; readonly complaints: string[] }> {
  const context = await browser.newContext({ viewport: { width: 1280, height: 900 }, reducedMotion: 'reduce', acceptDownloads: true });
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on('pageerror', (error) => complaints.push(error.message));
  await open(page, path);
  return { page, context, complaints };
}

async function open(page: Page, path: string): Promise<void> {
  await page.goto(server.url + path);
  await alive(page);
}
/** Until a page answers to keys. */
async function alive(page: Page): Promise<void> {
  await page.waitForFunction(() => {
    const root: (Element & { __vue_app__?: unknown }) | null = document.querySelector('#__nuxt');
    return root?.__vue_app__ !== undefined;
  });
  await page.waitForLoadState('networkidle');
}

async function signIn(page: Page, role: 'owner' | 'hand' | 'customer'): Promise<void> {
  const person = demoSignIns(server.folder).find((one) => one.role === role);
  await page.getByLabel('E-mail').fill(person?.email ?? '');
  await page.getByLabel('Password').fill(person?.password ?? '');
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
}

describe('a new owner', () => {
  const THREE_MINUTES = 180_000; // ms, a person's typing included: the steps here are the ones a person takes

  it('goes from a drawing to a program for their own machine in under three minutes', async () => {
    const began = Date.now();
    const { page, context, complaints } = await visit('/');
    await ready(page);
    await type(page, 'depth', '1/4');
    await settle(page);
    await page.getByRole('link', { name: 'open a shop' }).click();
    await page.getByLabel('Name of the shop').fill('Birch Hollow');
    await page.getByLabel('Your name').fill('Noor Ekdahl');
    await page.getByLabel('E-mail').fill('noor@example.test');
    await page.getByLabel('Password').fill('three plain boards');
    await page.getByRole('button', { name: 'Open the shop' }).click();
    await page.getByText('A mail is on its way').waitFor();
    expect(await page.getByText('The groove you drew comes along').count()).toBe(1);

    const secret = await secretMailedTo(demoOwner, 'noor@example.test');
    await open(page, `/welcome#${secret}`);
    expect(page.url()).not.toContain(secret); // gone from the address and the history
    await page.getByRole('button', { name: 'Open it' }).click();
    await page.waitForURL('**/rails/new**');
    await ready(page);
    await settle(page);
    expect(await box(page, 'depth').inputValue()).toBe('1/4');
    await page.getByLabel('Name on the program and the sheet').fill('First rail');
    await settle(page);
    await page.getByRole('button', { name: 'Keep the rail' }).click();
    await page.waitForURL(/\/rails\/[\w-]{16}$/);

    await page.getByRole('link', { name: 'enter your machine' }).click();
    await page.getByLabel('Name').fill('My router');
    const part = (name: string) => page.getByRole('group', { name });
    for (const [axis, size] of [['X', '32'], ['Y', '32'], ['Z', '4']] as const) await part('Work area').getByLabel(`Along ${axis}`).fill(size);
    for (const [axis, feed] of [['X', '200'], ['Y', '200'], ['Z', '60']] as const) await part('Highest feeds').getByLabel(`Along ${axis}`).fill(feed);
    await page.getByLabel('Lowest speed').fill('8000');
    await page.getByLabel('Highest speed').fill('24000');
    await page.getByRole('button', { name: 'Add the machine' }).click();
    await page.waitForURL(/\/machines\/[\w-]{16}$/);
    await open(page, '/bits/new');
    await page.getByLabel('Name').fill('1/4 straight');
    for (const [name, figure] of [['Diameter', '1/4'], ['Cutting length', '3/4'], ['Flutes', '2'], ['Collet nut', '1 1/4'], ['Stickout', '1 1/4']] as const) await page.getByLabel(name, { exact: false }).first().fill(figure);
    await page.getByRole('button', { name: 'Add the bit' }).click();
    await page.waitForURL(/\/bits\/[\w-]{16}$/);

    await page.getByRole('link', { name: 'Rails', exact: true }).click();
    await page.getByRole('link', { name: 'First rail' }).click();
    await ready(page);
    await page.locator('[data-make]:not([aria-disabled])').click();
    const mark = page.getByRole('link', { name: /^[A-Z0-9]{3}-[A-Z0-9]{3}$/ });
    await mark.waitFor();
    expect(Date.now() - began).toBeLessThan(THREE_MINUTES);
    expect(complaints).toEqual([]);
    await context.close();
  }, 240_000);
});

describe('a rail', () => {
  it('is changed, saved as a revision, compared and brought back; its program then says it is of an older one', async () => {
    const { page, context, complaints } = await visit('/sign-in');
    await signIn(page, 'owner');
    await page.getByRole('link', { name: 'Day room, rail A' }).click();
    await page.getByRole('heading', { name: 'Day room, rail A' }).waitFor();
    await ready(page);
    await settle(page);
    expect(await page.locator('[data-save]').count()).toBe(0);
    await type(page, 'depth', '0.2');
    await settle(page);
    await page.getByLabel('What changed').fill('deeper for the founders');
    await page.locator('[data-save]').click();
    await page.getByText('of revision 1: the rail was changed since').waitFor();
    await page.getByText('Revision 2 ·').waitFor();
    const row = page.getByRole('row', { name: /slot depth/ });
    expect(await row.getByRole('cell').allTextContents()).toEqual(['3/16', '0.2']);
    await page.getByRole('button', { name: 'Bring back' }).click();
    await settle(page);
    expect(await box(page, 'depth').inputValue()).toBe('3/16');
    expect(await page.locator('[data-save]').count()).toBe(1);
    expect(complaints).toEqual([]);
    await context.close();
  });

  it("is refused where somebody saved it meanwhile, and the drawing stays", async () => {
    const { page, context } = await visit('/sign-in');
    await signIn(page, 'owner');
    await page.getByRole('link', { name: 'Day room, rail B' }).click();
    await page.getByRole('heading', { name: 'Day room, rail B' }).waitFor();
    await ready(page);
    const id = new URL(page.url()).pathname.split('/').at(-1);
    const { request, revision } = await demoOwner.get(`/api/rails/${id}`);
    await demoOwner.send('PUT', `/api/rails/${id}`, { request: { ...request, depth: '1/4' }, basedOn: revision });
    await type(page, 'depth', '0.21');
    await settle(page);
    await page.locator('[data-save]').click();
    await page.getByText('Somebody saved this rail since you opened it').waitFor();
    expect(await box(page, 'depth').inputValue()).toBe('0.21');
    await context.close();
  });
});

describe('who is not let in', () => {
  it('is asked to sign in, and comes back to where they were going, never to another site', async () => {
    const { page, context } = await visit('/people');
    expect(new URL(page.url()).pathname).toBe('/sign-in');
    await signIn(page, 'owner');
    expect(new URL(page.url()).pathname).toBe('/people');
    await page.getByRole('button', { name: 'Sign out' }).click();
    await page.waitForURL(`${server.url}/`);
    await open(page, '/sign-in?to=//elsewhere.example/rails');
    await signIn(page, 'owner');
    expect(new URL(page.url()).origin).toBe(server.url);
    await context.close();
  });

  it('a shop hand begins at the bench and finds no people; a customer finds an account and nothing of the shop', async () => {
    const hand = await visit('/sign-in');
    await signIn(hand.page, 'hand');
    await hand.page.waitForURL('**/bench');
    await open(hand.page, '/people');
    expect(new URL(hand.page.url()).pathname).toBe('/bench');
    await hand.context.close();
    const customer = await visit('/sign-in');
    await signIn(customer.page, 'customer');
    await customer.page.waitForURL('**/account');
    await open(customer.page, '/rails');
    expect(new URL(customer.page.url()).pathname).toBe('/account');
    await customer.context.close();
  });

  it('the demo says on every page that it is one', async () => {
    for (const path of ['/', '/sign-in', '/sign-up', '/forgot', '/parts']) {
      const { page, context } = await visit(path);
      expect(await page.getByText('Demo on this computer').count(), path).toBe(1);
      await context.close();
    }
  });
});

describe('a passkey', () => {
  it('is added, and is a way in', async () => {
    const { page, context } = await visit('/sign-in');
    const devtools = await context.newCDPSession(page);
    await devtools.send('WebAuthn.enable');
    await devtools.send('WebAuthn.addVirtualAuthenticator', { options: { protocol: 'ctap2', transport: 'internal', hasResidentKey: true, hasUserVerification: true, isUserVerified: true, automaticPresenceSimulation: true } });
    // A passkey belongs to a name, not to a number: the same server by its name.
    const base = server.url.replace('127.0.0.1', 'localhost');
    await page.goto(`${base}/sign-in`);
    await alive(page);
    await signIn(page, 'owner');
    await page.goto(`${base}/account`);
    await alive(page);
    await page.getByLabel('Name of the passkey').fill('bench tablet');
    await page.getByRole('button', { name: 'Add a passkey' }).click();
    await page.getByRole('listitem').filter({ hasText: 'bench tablet' }).waitFor();
    await page.getByRole('button', { name: 'Sign out', exact: true }).click();
    await page.waitForURL(`${base}/`);
    await page.goto(`${base}/sign-in`);
    await alive(page);
    await page.getByRole('button', { name: 'Sign in with a passkey' }).click();
    await page.waitForURL('**/rails');
    await context.close();
  });
});
