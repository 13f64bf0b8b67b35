import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ROUTES, routesAt } from '#server/access/table';
import { DEMO_BITS, DEMO_COMMISSIONS, DEMO_MACHINE, DEMO_RAILS } from '#server/demo/scenario';
import { type Caller, newCaller, openShop, secretMailedTo, signInAs } from '../support/people';
import { ROOT, type RunningServer, startServer } from '../support/server';

let server: RunningServer;
let owner: Caller;
let hand: Caller;
let customer: Caller;
let stranger: Caller;
/** Ids of the demo shop's things, by the first part of a route's address. */
const ids: Record<string, string> = {};

beforeAll(async () => {
  server = await startServer({ TALLYRAIL_DEMO: '1', TALLYRAIL_TRIES: '10000' });
  [owner, hand, customer] = [await signInAs(server, 'owner'), await signInAs(server, 'hand'), await signInAs(server, 'customer')];
  stranger = await openShop(server.url, owner, 'Other shop');
  const first = async (path: string) => (await owner.get(path)).rows[0].id;
  for (const name of ['machines', 'bits', 'rails', 'commissions']) ids[name] = await first(`/api/${name}`);
  ids.programs = await first('/api/shop/programs');
  ids.woods = (await owner.send('POST', '/api/woods', WOOD)).id;
  ids.people = (await owner.get('/api/people')).people.find(({ role }: { readonly role: string }) => role === 'hand').id;
}, 60_000);
afterAll(() => server.stop());

const WOOD = { units: 'in', name: 'Shop ash', kind: 'hardwood', movesSeasonally: true };
const [rail] = DEMO_RAILS;
const chosen = () => ({ machineId: ids.machines, bitId: ids.bits, holding: 0 });

/** Bodies that a route takes, so that nothing is refused for its form alone. */
const BODIES: Readonly<Record<string, () => unknown>> = {
  'POST /api/machines': () => DEMO_MACHINE, 'PUT /api/machines/{id}': () => DEMO_MACHINE,
  'POST /api/bits': () => DEMO_BITS[0], 'PUT /api/bits/{id}': () => DEMO_BITS[0],
  'POST /api/woods': () => WOOD, 'PUT /api/woods/{id}': () => WOOD,
  'POST /api/rails': () => ({ request: rail?.request }), 'PUT /api/rails/{id}': () => ({ request: rail?.request, basedOn: 1 }), 'PATCH /api/rails/{id}': () => ({ quantity: 2 }),
  'POST /api/commissions': () => DEMO_COMMISSIONS[0]?.asked, 'PATCH /api/commissions/{id}': () => ({ wishes: 'Another' }),
  'POST /api/commissions/{id}/revisions': () => ({ work: DEMO_COMMISSIONS[0]?.work, basedOn: 1 }), 'POST /api/commissions/{id}/rails': () => ({ revision: 1 }),
  'POST /api/commissions/{id}/made': () => ({ step: 'cutList' }), 'POST /api/commissions/{id}/ticks': () => ({ step: 'glue', done: true }),
  'POST /api/rails/{id}/check': chosen, 'POST /api/rails/{id}/programs': chosen,
  'POST /api/cuts': () => ({ id: 'a-cut-of-the-test-1', programId: ids.programs, outcome: 'well', cutAt: new Date().toISOString() }),
  'PATCH /api/people/{id}': () => ({ status: 'active' }),
  'POST /api/people': () => ({ name: 'New hand', email: 'new@example.test' }),
};

const addressOf = (path: string) => path.replace('{mark}', 'ACD-EFG').replace(/\/api\/(?:shop\/)?(\w+)\/\{id\}/, (whole, thing: string) => whole.replace('{id}', ids[thing] ?? 'nothing'));
const [routes, callers] = [Object.entries(ROUTES), () => ({ visitor: newCaller(server.url), hand, customer, owner })];

it('names every route that there is a file for, and no other', () => {
  const files = readdirSync(join(ROOT, 'server/api'), { recursive: true, encoding: 'utf8' }).filter((file) => file.endsWith('.ts')).map((file) => {
    const [, path = '', method = ''] = /^(.*)\.(get|post|put|patch|delete)\.ts$/.exec(file.replaceAll('\\', '/')) ?? [];
    return `${method.toUpperCase()} /api/${path.replace(/(^|\/)index$/, '').replaceAll('[', '{').replaceAll(']', '}')}`;
  });
  const ofModules = ['GET /api/_auth/session', 'DELETE /api/_auth/session'];
  expect(files.sort()).toEqual(Object.keys(ROUTES).filter((name) => !ofModules.includes(name)).sort());
});

it('finds one route for an address and a method', () => {
  for (const [name] of routes) {
    const [method = '', path = ''] = name.split(' ');
    expect(routesAt(addressOf(path)).filter((route) => route.method === method).map((route) => route.name), name).toEqual([name]);
  }
});

describe('role × route', () => {
  it.each(['visitor', 'customer', 'hand', 'owner'] as const)('%s is refused whatever the table does not allow', async (role) => {
    const caller = callers()[role];
    for (const [name, who] of routes) {
      if (who.some((one) => one === role)) continue;
      const [method = '', path = ''] = name.split(' ');
      const answer = await caller.call(method, addressOf(path), BODIES[name]?.());
      expect(answer.status, `${role}: ${name}`).toBe(role === 'visitor' ? 401 : 403);
      expect(await answer.json()).not.toHaveProperty('rows');
    }
  });

  it.each(['visitor', 'customer', 'hand', 'owner'] as const)('%s reads whatever the table allows', async (role) => {
    const caller = callers()[role];
    for (const [name, who] of routes) {
      if (!name.startsWith('GET') || !who.some((one) => one === role) || name.endsWith('_auth/session')) continue;
      for (const address of [addressOf(name.slice(4)), `${addressOf(name.slice(4))}?format=csv`]) {
        const answer = await caller.call('GET', address);
        expect(answer.status, `${role}: ${address} ${await answer.text()}`).toBeLessThan(500);
      }
      const answer = await caller.call('GET', addressOf(name.slice(4)));
      const nothingThere = name.includes('{mark}') || name.endsWith('/backup'); // no such mark; two shops share the database
      expect(nothingThere ? [403, 404] : [200], `${role}: ${name} ${await answer.text()}`).toContain(answer.status);
    }
  });
});

describe("another shop's people", () => {
  it('find nothing by the ids of ours, and change nothing', async () => {
    const before = await owner.get('/api/shop/deeds?limit=1');
    for (const [name] of routes) {
      const [method = '', path = ''] = name.split(' ');
      if (!path.includes('{id}') || path.includes('passkeys')) continue;
      const answer = await stranger.call(method, addressOf(path), BODIES[name]?.());
      expect(answer.status, `${name} ${await answer.text()}`).toBe(404);
    }
    expect(await owner.get('/api/shop/deeds?limit=1')).toEqual(before);
  });

  it('see none of our rows in any list, search, export or log', async () => {
    for (const path of ['/api/rails', '/api/commissions', '/api/machines', '/api/bits', '/api/woods', '/api/shop/programs', '/api/cuts']) expect((await stranger.get(path)).rows, path).toEqual([]);
    const { mark } = (await owner.get('/api/shop/programs')).rows[0];
    expect((await stranger.get(`/api/shop/programs?q=${mark}`)).rows).toEqual([]);
    expect((await stranger.get('/api/people')).people).toHaveLength(1);
    expect((await stranger.get('/api/bench/today')).rails ?? []).toEqual([]);
    const zip = Buffer.from(await (await stranger.call('GET', '/api/shop/export')).arrayBuffer());
    expect(zip.includes('programs/')).toBe(false);
    expect((await newCaller(server.url).call('GET', `/api/programs/${mark}`)).status).toBe(404);
  });

  it('cannot log a cut of ours, or make a program with our machine', async () => {
    expect((await stranger.call('POST', '/api/cuts', BODIES['POST /api/cuts']?.())).status).toBe(422);
    const { id } = await stranger.send('POST', '/api/rails', { request: rail?.request });
    const answer = await stranger.call('POST', `/api/rails/${id}/programs`, chosen());
    expect(answer.status).toBe(422);
    expect(JSON.stringify(await answer.json())).toContain('machineId');
  });
});

describe('what others may try', () => {
  it.each<Readonly<Record<string, string>>>([{ 'sec-fetch-site': 'cross-site' }, { 'sec-fetch-site': 'same-site' }, { origin: 'https://elsewhere.example' }, { origin: 'null' }])('%o is another site, and does nothing', async (headers) => {
    const answer = await owner.call('POST', '/api/woods', { ...WOOD, name: 'From elsewhere' }, headers);
    expect(answer.status).toBe(403);
    expect((await owner.get('/api/woods?q=From')).rows).toEqual([]);
  });

  it('a session that was planted before signing in is not the one after', async () => {
    const visitor = newCaller(server.url);
    await visitor.call('GET', '/api/_auth/session');
    const planted = visitor.cookie();
    const signedIn = newCaller(server.url, planted);
    const before = await (await newCaller(server.url, planted).call('GET', '/api/_auth/session')).json();
    const { email, password } = { email: 'othershop@example.test', password: 'a few plain words' };
    await signedIn.send('POST', '/api/account/sign-in', { email, password });
    const after = await (await signedIn.call('GET', '/api/_auth/session')).json();
    expect(after.id).not.toBe(before.id);
    expect((await newCaller(server.url, planted).get('/api/account')).person).toBeNull();
  });

  it('a name cannot close a comment, start a header or name a path', async () => {
    const name = 'x) G0 Z-9 (y ../../etc';
    const { id } = await owner.send('POST', '/api/rails', { request: { ...rail?.request, name } });
    const made = await owner.send('POST', `/api/rails/${id}/programs`, { ...chosen(), bitId: (await owner.get('/api/bits?q=1/4 str')).rows[0].id, holding: 2 });
    expect(made.program).not.toMatch(/^G0 Z-9/m);
    const file = await owner.call('GET', `/api/shop/programs/${made.id}/file`);
    expect(file.headers.get('content-disposition')).toMatch(/^attachment; filename="[\w.-]+"$/);
    expect(await file.text()).toBe(made.program);
    expect((await owner.call('POST', '/api/rails', { request: { ...rail?.request, name: 'a\r\nset-cookie: x' } })).status).toBe(422);
  });

  it('a formula in a name does not reach a spreadsheet', async () => {
    await owner.send('POST', '/api/woods', { ...WOOD, name: '=HYPERLINK("http://x.example")' });
    const csv = await (await owner.call('GET', '/api/woods?format=csv')).text();
    expect(csv).toContain(`"'=HYPERLINK`);
  });

  it('a person who is suspended, removed or has a new password has no session any more', async () => {
    const [email, password] = ['second@example.test', 'another few words'];
    await owner.send('POST', '/api/people', { name: 'Second', email });
    const second = newCaller(server.url);
    await second.send('POST', '/api/account/join', { secret: await secretMailedTo(owner, email), name: 'Second', password });
    expect((await second.call('GET', '/api/rails')).status).toBe(200);
    const { id } = (await owner.get('/api/people')).people.find((one: { readonly email: string }) => one.email === email);
    await owner.send('PATCH', `/api/people/${id}`, { status: 'suspended' });
    expect((await second.call('GET', '/api/rails')).status).toBe(401);
    expect((await newCaller(server.url).call('POST', '/api/account/sign-in', { email, password })).status).toBe(401);
    await owner.send('PATCH', `/api/people/${id}`, { status: 'active' });
    await second.send('POST', '/api/account/sign-in', { email, password });
    const other = newCaller(server.url);
    await other.send('POST', '/api/account/sign-in', { email, password });
    await second.send('POST', '/api/account/password', { old: password, password: 'yet another few words' });
    expect([(await second.call('GET', '/api/rails')).status, (await other.call('GET', '/api/rails')).status]).toEqual([401, 401]);
    await other.send('POST', '/api/account/sign-in', { email, password: 'yet another few words' });
    await owner.send('DELETE', `/api/people/${id}`);
    expect((await other.call('GET', '/api/rails')).status).toBe(401);
  });
});
