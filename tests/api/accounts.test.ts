import { createServer } from 'node:net';
import { rmSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Caller, newCaller, secretMailedTo, signInAs } from '../support/people';
import { type RunningServer, newDataFolder, startServer } from '../support/server';

let server: RunningServer;
let owner: Caller;
beforeAll(async () => {
  server = await startServer({ TALLYRAIL_DEMO: '1', TALLYRAIL_TRIES: '40' });
  owner = await signInAs(server, 'owner');
}, 60_000);
afterAll(() => server.stop());

const signUp = { shop: 'Fen Lane Woodwork', name: 'Odalys Brandt', email: 'Odalys@Example.test ', password: 'beech and a half' };

describe('opening a shop', () => {
  it('answers the same whether or not the address has an account, and makes nothing by itself', async () => {
    const caller = newCaller(server.url);
    const before = await caller.send('POST', '/api/account/sign-up', signUp);
    await caller.send('POST', '/api/account/confirm', { secret: await secretMailedTo(owner, 'odalys@example.test') });
    const again = newCaller(server.url);
    expect(await again.send('POST', '/api/account/sign-up', { ...signUp, shop: 'Another' })).toEqual(before);
    expect((await caller.get('/api/account')).person).toMatchObject({ name: 'Odalys Brandt', email: 'odalys@example.test', role: 'owner', shop: 'Fen Lane Woodwork' });
    expect((await again.get('/api/account')).person).toBeNull();
  });

  it('keeps the drawing that the visitor had, and uses a link once', async () => {
    const caller = newCaller(server.url);
    await caller.send('POST', '/api/account/sign-up', { ...signUp, email: 'drawn@example.test', drawing: '1.WzAsWzBd' });
    const secret = await secretMailedTo(owner, 'drawn@example.test');
    expect(await caller.send('POST', '/api/account/confirm', { secret })).toEqual({ drawing: '1.WzAsWzBd' });
    expect((await newCaller(server.url).call('POST', '/api/account/confirm', { secret })).status).toBe(410);
  });

  it.each([
    [{ email: 'no address' }, 'email'], [{ password: 'too short' }, 'password'], [{ shop: ' ' }, 'shop'], [{ name: 'a\nb' }, 'name'],
    [{ drawing: '1.a"><script>' }, 'drawing'], [{ role: 'owner' }, 'role'], [{ password: 'x'.repeat(500) }, 'password'],
  ])('refuses %o by its name', async (change, path) => {
    const answer = await newCaller(server.url).call('POST', '/api/account/sign-up', { ...signUp, ...change });
    expect(answer.status).toBe(422);
    expect((await answer.json()).errors.map((error: { readonly path: string }) => error.path)).toContain(path);
  });
});

describe('a forgotten password', () => {
  it('is set anew by a link that works once; nobody learns whether the address has an account', async () => {
    const caller = newCaller(server.url);
    expect(await caller.send('POST', '/api/account/forgot', { email: 'nobody@example.test' })).toEqual({ sent: 'nobody@example.test' });
    await caller.send('POST', '/api/account/forgot', { email: 'odalys@example.test' });
    const secret = await secretMailedTo(owner, 'odalys@example.test');
    await caller.send('POST', '/api/account/reset', { secret, password: 'oak and a quarter' });
    expect((await caller.call('POST', '/api/account/reset', { secret, password: 'ash and a quarter' })).status).toBe(410);
    expect((await caller.call('POST', '/api/account/sign-in', { email: 'odalys@example.test', password: signUp.password })).status).toBe(401);
    await caller.send('POST', '/api/account/sign-in', { email: 'odalys@example.test', password: 'oak and a quarter' });
  });

  it('reads the same for a wrong password and an unknown address', async () => {
    const caller = newCaller(server.url);
    const [wrong, unknown] = [
      await caller.call('POST', '/api/account/sign-in', { email: 'odalys@example.test', password: 'not it, not it' }),
      await caller.call('POST', '/api/account/sign-in', { email: 'unknown@example.test', password: 'not it, not it' }),
    ];
    expect(wrong.status).toBe(401);
    expect(await wrong.text()).toBe(await unknown.text());
  });
});

describe('a shop hand', () => {
  it('is invited, made owner, and the owner becomes a hand', async () => {
    const [boss, hand] = [newCaller(server.url), newCaller(server.url)];
    await boss.send('POST', '/api/account/sign-in', { email: 'odalys@example.test', password: 'oak and a quarter' });
    await boss.send('POST', '/api/people', { name: 'Piet', email: 'piet@example.test' });
    await hand.send('POST', '/api/account/join', { secret: await secretMailedTo(owner, 'piet@example.test'), name: 'Piet Amsel', password: 'maple, maple, maple' });
    expect((await hand.get('/api/account')).person).toMatchObject({ role: 'hand', shop: 'Fen Lane Woodwork' });
    const { people } = await boss.get('/api/people');
    const [me, piet] = ['owner', 'hand'].map((role) => people.find((person: { readonly role: string }) => person.role === role).id);
    expect((await boss.call('DELETE', `/api/people/${me}`)).status).toBe(409);
    await boss.send('POST', `/api/people/${piet}/owner`);
    expect((await hand.get('/api/account')).person.role).toBe('owner');
    expect((await boss.call('GET', '/api/people')).status).toBe(403);
  });
});

describe('tries', () => {
  it('run out for an address that is guessed at, and for whoever guesses', async () => {
    const statuses: number[] = [];
    for (let n = 0; n < 45; n++) statuses.push((await newCaller(server.url).call('POST', '/api/account/sign-in', { email: 'guess@example.test', password: 'a wrong guess' })).status);
    expect(statuses[0]).toBe(401);
    expect(statuses.at(-1)).toBe(429);
  }, 60_000);
});

describe('live mode', () => {
  it('starts empty, without the demo, its mails or its sign-ins, and says what it cannot do without a mail server', async () => {
    const live = await startServer();
    const caller = newCaller(live.url);
    expect(await caller.get('/api/account')).toEqual({ person: null, demo: false, demoMail: false, sendsMail: false });
    const answer = await caller.call('POST', '/api/account/sign-up', signUp);
    expect([answer.status, (await answer.json()).detail]).toEqual([503, expect.stringContaining('TALLYRAIL_SMTP_URL')]);
    expect(statSync(join(live.folder, 'session-secret')).mode & 0o777).toBe(0o600);
    await live.stop();
  }, 60_000);

  it('refuses a folder that the demo has filled', async () => {
    const folder = newDataFolder();
    await (await startServer({ TALLYRAIL_DEMO: '1' }, folder)).stop();
    await expect(startServer({}, folder)).rejects.toThrow(/filled by the demo|fetch failed|exit code/);
    rmSync(folder, { recursive: true, force: true });
  }, 60_000);

  it('loses no mail and keeps nobody waiting while the mail server is down, and sends it when it is up', async () => {
    const port = await freePort();
    const live = await startServer({ TALLYRAIL_SMTP_URL: `smtp://127.0.0.1:${port}`, TALLYRAIL_ORIGIN: 'https://shop.example.test', TALLYRAIL_MAIL_PAUSE: '1' });
    const began = Date.now();
    await newCaller(live.url).send('POST', '/api/account/sign-up', signUp);
    expect(Date.now() - began).toBeLessThan(5000); // a refused connection is never waited for: hashing the password is all
    await new Promise((resolve) => setTimeout(resolve, 2500));
    const { SMTPServer } = await import('smtp-server');
    const got: string[] = [];
    const arrived = new Promise<void>((resolve) => {
      const smtp = new SMTPServer({
        authOptional: true, disabledCommands: ['STARTTLS'],
        onData(stream, _session, done) {
          stream.on('data', (chunk: Buffer) => got.push(chunk.toString())).on('end', () => {
            done();
            resolve();
          });
        },
      });
      smtp.listen(port, '127.0.0.1');
    });
    await arrived;
    // Links lead where the installation is, whatever Host a request came with.
    expect(got.join('').replaceAll('=\r\n', '')).toContain('https://shop.example.test/welcome#');
    await live.stop();
  }, 60_000);
});

function freePort(): Promise<number> {
  return new Promise((resolve) => {
    const probe = createServer().listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() => resolve(typeof address === 'object' && address ? address.port : 0));
    });
  });
}
