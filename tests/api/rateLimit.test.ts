import { afterEach, describe, expect, it } from 'vitest';
import { type RunningServer, startServer } from '../support/server';
import { RAIL, post, problemOf } from './support';

let server: RunningServer | undefined;
afterEach(async () => {
  await server?.stop();
  server = undefined;
});

const start = async (env: Readonly<Record<string, string>>) => (server = await startServer({ TALLYRAIL_PROGRAMS_PER_MINUTE: '3', ...env }));

describe('the rate limit', () => {
  it('lets an address have its share, good requests and bad, then says when to come back', async () => {
    const { url } = await start({});
    const ask = (body: unknown = RAIL) => post(body, {}, `${url}/api/programs`);
    const statuses = [(await ask()).status, (await ask('{')).status, (await ask()).status];
    expect(statuses).toEqual([200, 400, 200]);
    const refused = await ask();
    const seconds = Number(refused.headers.get('retry-after'));
    expect((await problemOf(refused)).status).toBe(429);
    expect(seconds).toBeGreaterThan(0);
    expect(seconds).toBeLessThanOrEqual(60);
    expect((await fetch(`${url}/api/openapi.json`)).status).toBe(200);
  });

  it('takes no address from a header that anyone can write', async () => {
    const { url } = await start({});
    const statuses: number[] = [];
    for (let i = 0; i < 4; i++) statuses.push((await post(RAIL, { 'x-forwarded-for': `203.0.113.${i}` }, `${url}/api/programs`)).status);
    expect(statuses).toEqual([200, 200, 200, 429]);
  });

  it('takes the address that a trusted proxy saw, and not one that was sent to it', async () => {
    const { url } = await start({ TALLYRAIL_TRUST_PROXY: '1' });
    const ask = async (forwarded: string) => (await post(RAIL, { 'x-forwarded-for': forwarded }, `${url}/api/programs`)).status;
    for (let i = 0; i < 3; i++) expect(await ask(`198.51.100.${i}, 203.0.113.7`)).toBe(200);
    expect(await ask('198.51.100.99, 203.0.113.7')).toBe(429);
    expect(await ask('203.0.113.8')).toBe(200);
  });
});

describe('the settings', () => {
  it('stop the server where one cannot be read', async () => {
    await expect(startServer({ TALLYRAIL_PROGRAMS_PER_MINUTE: 'many' })).rejects.toThrow('TALLYRAIL_PROGRAMS_PER_MINUTE');
    await expect(startServer({ TALLYRAIL_TRUST_PROXY: 'yes' })).rejects.toThrow('TALLYRAIL_TRUST_PROXY');
  });

  it("open the benches' empty route only where asked", async () => {
    const { url } = await start({ TALLYRAIL_BENCH: '1' });
    const response = await fetch(`${url}/api/bench/empty`, { method: 'POST' });
    expect([response.status, await response.json()]).toEqual([200, {}]);
  });
});
