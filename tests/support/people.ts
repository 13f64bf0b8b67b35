import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Role } from '#shared/types/people';

/** Somebody with a cookie of their own, as the API sees them. */
export interface Caller {
  readonly call: (method: string, path: string, body?: unknown, headers?: Readonly<Record<string, string>>) => Promise<Response>;
  /** The answer's JSON; a status that is no success fails the test with what was said. */
  readonly get: (path: string) => Promise<any>; // eslint-disable-line @typescript-eslint/no-explicit-any -- tests look into whatever comes
  readonly send: (method: string, path: string, body?: unknown) => Promise<any>; // eslint-disable-line @typescript-eslint/no-explicit-any -- as above
  readonly cookie: () => string;
}

/** A caller without a session, until it signs in. */
export function newCaller(url: string, cookie = ''): Caller {
  let jar = cookie;
  const call: Caller['call'] = async (method, path, body, headers = {}) => {
    const answer = await fetch(url + path, {
      method, redirect: 'manual',
      headers: { ...(jar && { cookie: jar }), ...(body !== undefined && { 'content-type': 'application/json' }), ...headers },
      ...(body !== undefined && { body: JSON.stringify(body) }),
    });
    for (const set of answer.headers.getSetCookie()) jar = set.split(';')[0] ?? '';
    return answer;
  };
  const send: Caller['send'] = async (method, path, body) => {
    const answer = await call(method, path, body);
    const text = await answer.text();
    if (!answer.ok) throw new Error(`${method} ${path}: ${answer.status} ${text.slice(0, 500)}`);
    return JSON.parse(text);
  };
  return { call, send, get: (path) => send('GET', path), cookie: () => jar };
}

interface SignIn {
  readonly role: Role;
  readonly email: string;
  readonly password: string;
}

/** The demo's people, as `npm start` prints them. */
export function demoSignIns(folder: string): readonly SignIn[] {
  return JSON.parse(readFileSync(join(folder, 'demo-sign-ins.json'), 'utf8'));
}

/** A caller signed in as one of the demo's people. */
export async function signInAs(server: { readonly url: string; readonly folder: string }, role: Role): Promise<Caller> {
  const person = demoSignIns(server.folder).find((one) => one.role === role);
  if (!person) throw new Error(`The demo has no ${role}.`);
  const caller = newCaller(server.url);
  await caller.send('POST', '/api/account/sign-in', { email: person.email, password: person.password });
  return caller;
}

const PATIENCE = 10_000; // ms until a queued mail has to be there

/** The secret in the newest mail to an address, as the demo's owner reads it. */
export async function secretMailedTo(owner: Caller, address: string): Promise<string> {
  for (const until = Date.now() + PATIENCE; Date.now() < until;) {
    const { mails } = await owner.get('/api/demo/mails');
    const mail = mails.find(({ to }: { readonly to: string }) => to === address);
    const secret = /#([\w-]+)/.exec(mail?.text ?? '')?.[1];
    if (secret) return secret;
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  throw new Error(`No mail with a link came to ${address}.`);
}

/** The owner of a new shop, by the way a person takes: sign up, open the mail, press the link. */
export async function openShop(url: string, demoOwner: Caller, name: string): Promise<Caller> {
  const email = `${name.toLowerCase().replaceAll(/[^a-z]/g, '')}@example.test`;
  const caller = newCaller(url);
  await caller.send('POST', '/api/account/sign-up', { shop: name, name: `Owner of ${name}`, email, password: 'a few plain words' });
  await caller.send('POST', '/api/account/confirm', { secret: await secretMailedTo(demoOwner, email) });
  return caller;
}
