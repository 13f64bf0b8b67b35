import SQLite from 'better-sqlite3';
import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Caller, demoSignIns, newCaller, signInAs } from '../support/people';
import { newDataFolder, startServer } from '../support/server';

const KILLS = 10;
const WRITES = 200;
const DEMO = { TALLYRAIL_DEMO: '1', TALLYRAIL_TRIES: '10000' };

let folder: string;
beforeAll(() => {
  folder = newDataFolder();
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** Logs cuts one after the other until there is no server, or all are sent; answers the ids that were acknowledged. */
async function logUntilKilled(hand: Caller, programId: string, round: number): Promise<string[]> {
  const acknowledged: string[] = [];
  for (let n = 0; n < WRITES; n++) {
    const id = `cut-of-round-${round}-number-${n}`;
    try {
      const answer = await hand.call('POST', '/api/cuts', { id, programId, outcome: n % 7 ? 'well' : 'spoiled', reason: 'a check', cutAt: new Date().toISOString(), widths: [0.375, 0.376, 0.3755] });
      if (answer.ok) acknowledged.push(id);
      await answer.arrayBuffer();
    } catch {
      break; // killed
    }
  }
  return acknowledged;
}

describe('a server that is killed in the middle of its writes', () => {
  it(`loses nothing it acknowledged and keeps nothing half, ${KILLS} times`, async () => {
    const all: string[] = [];
    for (let round = 0; round < KILLS; round++) {
      const server = await startServer(DEMO, folder);
      const hand = await signInAs(server, 'hand');
      const programId = (await hand.get('/api/shop/programs')).rows[0].id;
      const ended = new Promise((resolve) => server.process.once('exit', resolve));
      // From nearly none to nearly all of the writes done when it dies.
      setTimeout(() => server.process.kill('SIGKILL'), 40 + round * 60);
      all.push(...(await logUntilKilled(hand, programId, round)));
      server.process.kill('SIGKILL');
      await ended;
    }
    expect(all.length).toBeGreaterThan(KILLS);

    const file = new SQLite(join(folder, 'tallyrail.sqlite'));
    expect(file.pragma('integrity_check', { simple: true })).toBe('ok');
    expect(file.pragma('foreign_key_check')).toEqual([]);
    const kept = new Set(file.prepare('SELECT id FROM cuts').pluck().all());
    expect(all.filter((id) => !kept.has(id))).toEqual([]);
    // A cut and its line in the log are one write: neither stands without the other.
    const count = (sql: string) => Number(file.prepare(sql).pluck().get());
    expect(count("SELECT count(*) FROM deeds WHERE what IN ('cut rail', 'spoiled rail')")).toBe(kept.size);
    file.close();
  }, 120_000);

  it('refuses to change or delete what was kept, even from inside', () => {
    const file = new SQLite(join(folder, 'tallyrail.sqlite'));
    for (const table of ['rail_programs', 'rail_revisions', 'cuts']) {
      expect(() => file.prepare(`UPDATE ${table} SET shop_id = shop_id`).run(), table).toThrow('never changed');
      expect(() => file.prepare(`DELETE FROM ${table}`).run(), table).toThrow('never changed');
    }
    file.close();
  });
});

describe('backup and restore from the page', () => {
  it('brings everything back after the file is lost', async () => {
    const first = await startServer(DEMO, folder);
    const owner = await signInAs(first, 'owner');
    const [rails, cuts] = [await owner.get('/api/rails'), await owner.get('/api/cuts?limit=200')];
    const { id, mark } = (await owner.get('/api/shop/programs')).rows[0];
    const text = await (await owner.call('GET', `/api/shop/programs/${id}/file`)).text();
    const copy = Buffer.from(await (await owner.call('GET', '/api/shop/backup')).arrayBuffer());
    const signIn = demoSignIns(folder).find(({ role }) => role === 'owner');
    await first.stop();
    rmSync(folder, { recursive: true, force: true });

    const second = await startServer(DEMO);
    const fresh = await signInAs(second, 'owner');
    const damaged = Buffer.from(copy).fill(7, 4096, 3 * 4096);
    for (const [bad, words] of [[Buffer.from('no database at all'), 'not a copy'], [damaged, /damaged|not a copy/]] as const) {
      const answer = await fetch(`${second.url}/api/shop/restore`, { method: 'POST', body: bad, headers: { cookie: fresh.cookie(), 'content-type': 'application/vnd.sqlite3' } });
      expect([answer.status, (await answer.json()).detail]).toEqual([422, expect.stringMatching(words)]);
      expect((await fresh.get('/api/cuts')).rows).toEqual([]);
    }
    const answer = await fetch(`${second.url}/api/shop/restore`, { method: 'POST', body: copy, headers: { cookie: fresh.cookie(), 'content-type': 'application/vnd.sqlite3' } });
    expect([answer.status, await answer.text()]).toEqual([200, '{"restored":true}']);

    expect((await fresh.call('GET', '/api/rails')).status).toBe(401); // the person of before is not of this database
    const back = newCaller(second.url);
    await back.send('POST', '/api/account/sign-in', { email: signIn?.email, password: signIn?.password });
    expect(await back.get('/api/rails')).toEqual(rails);
    expect(await back.get('/api/cuts?limit=200')).toEqual(cuts);
    expect((await back.get(`/api/shop/programs?q=${mark}`)).rows[0].id).toBe(id);
    expect(await (await back.call('GET', `/api/shop/programs/${id}/file`)).text()).toBe(text);
    await second.stop();
  }, 60_000);
});
