import { strFromU8, unzipSync } from 'fflate';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { DEMO_COMMISSIONS } from '#server/demo/scenario';
import { type Caller, openShop, signInAs } from '../support/people';
import { type RunningServer, startServer } from '../support/server';

let server: RunningServer;
let owner: Caller;
let hand: Caller;
beforeAll(async () => {
  server = await startServer({ TALLYRAIL_DEMO: '1', TALLYRAIL_TRIES: '10000' });
  [owner, hand] = [await signInAs(server, 'owner'), await signInAs(server, 'hand')];
}, 60_000);
afterAll(() => server.stop());

const [dayRoom] = DEMO_COMMISSIONS;
const demoId = async (who = owner): Promise<string> => (await who.get('/api/commissions?q=42 coins')).rows[0].id;
/** A new commission with the day room's work as its first revision. */
async function fresh(name: string) {
  const { id } = await owner.send('POST', '/api/commissions', { ...dayRoom?.asked, name });
  await owner.send('POST', `/api/commissions/${id}/revisions`, { work: dayRoom?.work, basedOn: 0 });
  return String(id);
}
const stepsStale = async (id: string) => (await owner.get(`/api/commissions/${id}/stale`)).stale.map(({ step }: { readonly step: string }) => step);

describe('what the shop hand is told', () => {
  const secrets = [dayRoom?.asked.contact.email, dayRoom?.asked.contact.person, dayRoom?.asked.contact.phone, dayRoom?.asked.contact.customer, 'centsPerBoardFoot":{"', '1250'].map(String);

  it('is the tally, the piece and the rails, and neither a contact nor a price, in the list, the record and the file', async () => {
    const id = await demoId(hand);
    const seen = await hand.get(`/api/commissions/${id}`);
    expect(seen.work.tally.kinds).toHaveLength(4);
    expect(seen.rails.map(({ label }: { readonly label: string }) => label)).toEqual(['A', 'B', 'C']);
    const told = [JSON.stringify(seen), JSON.stringify(await hand.get('/api/commissions')), await (await hand.call('GET', '/api/commissions?format=csv')).text(), JSON.stringify(await hand.get(`/api/commissions/${id}/stale`)), JSON.stringify(await hand.get(`/api/commissions/${id}/revisions`))];
    for (const text of told) for (const secret of secrets) expect(text).not.toContain(secret);
  });

  it('is all there for the owner', async () => {
    const text = JSON.stringify(await owner.get(`/api/commissions/${await demoId()}`));
    for (const secret of secrets) expect(text).toContain(secret);
    const zip = unzipSync(Buffer.from(await (await owner.call('GET', '/api/shop/export')).arrayBuffer()));
    expect(strFromU8(zip['commissions.csv'] ?? new Uint8Array())).toContain('halvard@station9.example.com');
  });
});

describe('the work', () => {
  it('keeps sizes as they were typed, and one that was drawn from an older revision is refused with the newest\'s number', async () => {
    const id = await fresh('Conflict');
    const changed = { ...dayRoom?.work, piece: { ...dayRoom?.work.piece, gap: '3/16' } };
    expect(await owner.send('POST', `/api/commissions/${id}/revisions`, { work: changed, basedOn: 1 })).toMatchObject({ revision: 2 });
    const late = await owner.call('POST', `/api/commissions/${id}/revisions`, { work: dayRoom?.work, basedOn: 1 });
    expect([late.status, (await late.json()).newest]).toEqual([409, 2]);
    const kept = await owner.get(`/api/commissions/${id}`);
    expect([kept.revision, kept.work.piece.gap, kept.work.piece.height]).toEqual([2, '3/16', '16 1/4']);
  });

  it.each([
    ['piece.gap', { piece: { ...dayRoom?.work.piece, gap: 'wide' } }],
    ['tally.kinds.0.thickness', { tally: { units: 'in', kinds: [{ name: 'Coin', diameter: 1, thickness: 0.7, count: 1 }] } }],
    ['build.batten.width', { build: { ...dayRoom?.work.build, batten: { ...dayRoom?.work.build.batten, width: 'thick' } } }],
    ['surface.finish', { surface: { colour: 'none', finish: 'butter', coats: 1, coatHours: 1 } }],
  ])('names %s where that cannot be read, and saves nothing', async (path, part) => {
    const id = await fresh(`Bad ${path}`);
    const answer = await owner.call('POST', `/api/commissions/${id}/revisions`, { work: { ...dayRoom?.work, ...part }, basedOn: 1 });
    const { errors } = await answer.json();
    expect([answer.status, errors.map((error: { readonly path: string }) => error.path)]).toEqual([422, [`work.${path}`]]);
    expect((await owner.get(`/api/commissions/${id}`)).revision).toBe(1);
  });
});

describe('rails', () => {
  it('are made from the newest revision alone, once each; a second making keeps them with their programs', async () => {
    const id = await fresh('Rails');
    expect((await owner.call('POST', `/api/commissions/${id}/rails`, { revision: 7 })).status).toBe(409);
    expect(await owner.send('POST', `/api/commissions/${id}/rails`, { revision: 1 })).toMatchObject({ drawn: 3, revised: 0, kept: 0 });
    const { rails } = await owner.get(`/api/commissions/${id}`);
    const rail = await owner.get(`/api/rails/${rails[0].id}`);
    expect(rail.request).toMatchObject({ length: 24.5, width: 0.375, depth: 0.1875, stopMargin: 0.875, wood: 'white-oak' });
    expect(await owner.send('POST', `/api/commissions/${id}/rails`, { revision: 1 })).toMatchObject({ drawn: 0, revised: 0, kept: 3 });
    expect((await owner.get(`/api/commissions/${id}`)).rails.map((one: { readonly id: string }) => one.id)).toEqual(rails.map((one: { readonly id: string }) => one.id));
  });

  it('of the demo are drawn as its piece says: making them changes none', async () => {
    expect(await owner.send('POST', `/api/commissions/${await demoId()}/rails`, { revision: 1 })).toMatchObject({ drawn: 0, revised: 0, kept: 3, away: 0 });
  });

  it('follow the piece: a changed groove revises all, a rail that is gone is put away, an impossible one changes nothing', async () => {
    const id = await fresh('Follow');
    await owner.send('POST', `/api/commissions/${id}/rails`, { revision: 1 });
    const next = (piece: object, basedOn: number) => owner.send('POST', `/api/commissions/${id}/revisions`, { work: { ...dayRoom?.work, piece: { ...dayRoom?.work.piece, ...piece } }, basedOn });
    await next({ stopMargin: '1', railLanes: [8, 12] }, 1);
    expect(await owner.send('POST', `/api/commissions/${id}/rails`, { revision: 2 })).toMatchObject({ drawn: 0, revised: 2, away: 1 });
    const { rails } = await owner.get(`/api/commissions/${id}`);
    expect(rails.map(({ label, revision }: { readonly label: string; readonly revision: number }) => [label, revision])).toEqual([['A', 2], ['B', 2]]);
    await next({ stopMargin: '1', railLanes: [8, 12], width: '3' }, 2);
    const refused = await owner.call('POST', `/api/commissions/${id}/rails`, { revision: 3 });
    expect([refused.status, (await refused.json()).detail]).toEqual([422, expect.stringContaining('Rail A')]);
    expect((await owner.get(`/api/commissions/${id}`)).rails).toEqual(rails);
  });
});

describe('what is stale', () => {
  it('follows the change: a coin makes all that was made stale, another finish the assembly sheet alone', async () => {
    const id = await fresh('Stale');
    await owner.send('POST', `/api/commissions/${id}/rails`, { revision: 1 });
    for (const step of ['cutList', 'assembly']) await hand.send('POST', `/api/commissions/${id}/made`, { step });
    expect(await stepsStale(id)).toEqual([]);
    await owner.send('POST', `/api/commissions/${id}/revisions`, { work: { ...dayRoom?.work, surface: { ...dayRoom?.work.surface, coats: 4 } }, basedOn: 1 });
    expect(await stepsStale(id)).toEqual(['assembly']);
    const kinds = dayRoom?.work.tally.kinds.map((kind, n) => (n === 3 ? { ...kind, thickness: 0.13 } : kind));
    await owner.send('POST', `/api/commissions/${id}/revisions`, { work: { ...dayRoom?.work, tally: { units: 'in', kinds } }, basedOn: 2 });
    const { stale } = await owner.get(`/api/commissions/${id}/stale`);
    expect(stale).toEqual([{ step: 'rails', because: ['coins'] }, { step: 'cutList', because: ['coins'] }, { step: 'assembly', because: ['coins'] }]);
    await owner.send('POST', `/api/commissions/${id}/rails`, { revision: 3 });
    expect(await stepsStale(id)).toEqual(['cutList', 'assembly']);
  });
});

it('a stage takes its day, and those after it lose theirs when it is moved back', async () => {
  const id = await fresh('Stages');
  for (const stage of ['cutting', 'ready', 'assembly']) await owner.send('PATCH', `/api/commissions/${id}`, { stage });
  const { stage, stageDays } = await owner.get(`/api/commissions/${id}`);
  expect([stage, Object.keys(stageDays).sort()]).toEqual(['assembly', ['assembly', 'cutting', 'enquiry']]);
});

it('a bench step is ticked off with who and when, and the tick can be taken back', async () => {
  const id = await fresh('Ticks');
  expect((await hand.send('POST', `/api/commissions/${id}/ticks`, { step: 'glue', done: true })).ticks).toMatchObject([{ step: 'glue', done: true, by: 'Teo Varga' }]);
  expect((await owner.send('POST', `/api/commissions/${id}/ticks`, { step: 'glue', done: false })).ticks).toMatchObject([{ step: 'glue', done: false, by: 'Ines Okafor-Lindqvist' }]);
});

it('another shop finds none of it, and its own rails stay its own', async () => {
  const other = await openShop(server.url, owner, 'Third shop');
  const id = await fresh('Ours');
  for (const [method, path, body] of [['GET', '', undefined], ['GET', '/stale', undefined], ['POST', '/rails', { revision: 1 }], ['POST', '/ticks', { step: 'glue', done: true }], ['PATCH', '', { wishes: 'x' }]] as const) {
    expect((await other.call(method, `/api/commissions/${id}${path}`, body)).status, method + path).toBe(404);
  }
  expect((await other.get('/api/commissions')).rows).toEqual([]);
});

it('one that is put away is in no list, and its rails stay', async () => {
  const id = await fresh('Away');
  await owner.send('POST', `/api/commissions/${id}/rails`, { revision: 1 });
  await owner.send('DELETE', `/api/commissions/${id}`);
  expect((await owner.call('GET', `/api/commissions/${id}`)).status).toBe(404);
  expect((await owner.get('/api/commissions?q=Away')).rows).toEqual([]);
  expect((await owner.get('/api/rails?q=Away')).rows).toHaveLength(3);
});
