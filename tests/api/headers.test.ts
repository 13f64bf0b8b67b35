import { statSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, inject, it } from 'vitest';
import { RAIL, post, url } from './support';

const page = (path: string) => fetch(url(path), { headers: { accept: 'text/html' } });

const answers = async () => ({
  'a page': await page('/'),
  'a file': await fetch(url('/favicon.svg')),
  'a program': await post(RAIL),
  'a refusal': await post({}),
  'nothing there': await fetch(url('/api/nothing')),
  'no such page': await page('/no-such-page'),
});

describe('headers', () => {
  it('guard every answer', async () => {
    for (const [what, { headers }] of Object.entries(await answers())) {
      expect(headers.get('x-content-type-options'), what).toBe('nosniff');
      expect(headers.get('referrer-policy'), what).toMatch(/^(same-origin|no-referrer)$/);
      expect(headers.get('permissions-policy'), what).toContain('camera=()');
      const policy = headers.get('content-security-policy') ?? '';
      for (const part of ["frame-ancestors 'none'", "object-src 'none'", "base-uri 'none'", "default-src 'self'"]) expect(policy, what).toContain(part);
      expect(/script-src ([^;]*)/.exec(policy)?.[1], what).not.toMatch(/unsafe|\*|https?:/);
    }
  });

  it('leave out what is wrong for a shop on its own network, and what opens private data to other sites', async () => {
    for (const [what, { headers }] of Object.entries(await answers())) {
      expect(headers.get('strict-transport-security'), what).toBeNull();
      expect(headers.get('access-control-allow-origin'), what).toBeNull();
      expect(headers.get('content-security-policy'), what).not.toContain('upgrade-insecure-requests');
      expect(headers.get('set-cookie'), what).toBeNull();
    }
  });

  it('name the nonce that the scripts of that page, and only they, bear', async () => {
    for (const path of ['/', '/no-such-page']) {
      const [first, second] = [await page(path), await page(path)];
      const nonceOf = ({ headers }: Response) => /'nonce-([^']+)'/.exec(headers.get('content-security-policy') ?? '')?.[1];
      expect(nonceOf(first)).toMatch(/^[A-Za-z0-9+/]{22}==$/);
      expect(nonceOf(first)).not.toBe(nonceOf(second));
      const scripts = (await first.text()).match(/<script[^>]*>/g) ?? [];
      expect(scripts.length).toBeGreaterThan(1);
      for (const script of scripts) expect(script).toContain(`nonce="${nonceOf(first)}"`);
    }
  });
});

describe('the data folder', () => {
  it('keeps a session secret that only its owner can read', () => {
    const { mode, size } = statSync(join(inject('dataFolder'), 'session-secret'));
    expect((mode & 0o777).toString(8)).toBe('600');
    expect(size).toBeGreaterThanOrEqual(32);
  });
});
