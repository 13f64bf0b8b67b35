import { describe, expect, inject, it } from 'vitest';
import { NEEDS_A_PLUNGE, post, problemOf, url } from './support';

describe('a program whose readback disagrees', () => {
  for (const accept of ['application/json', 'text/plain', '*/*', 'text/plain, application/problem+json']) {
    it(`is withheld from Accept: ${accept}`, async () => {
      const response = await post(NEEDS_A_PLUNGE, { accept });
      expect(response.status).toBe(500);
      expect(response.headers.get('program-mark')).toBeNull();
      expect(response.headers.get('content-disposition')).toBeNull();
      const text = await response.clone().text();
      expect(text).not.toMatch(/G0|G20|M30|program"/);

      const { readback, errors } = await problemOf(response);
      expect(readback?.verdict).toBe('disagrees');
      const wrong = readback?.findings.filter((finding) => finding.severity === 'disagrees') ?? [];
      expect(wrong.map((finding) => finding.rule)).toContain('entry');
      expect(errors?.map((error) => error.path)).toEqual(wrong.map((finding) => `readback.${finding.rule}`));
    });
  }

  it('is not kept: the plunge that a centre-cutting bit may make is', async () => {
    const { openDatabase } = await import('#server/db/client');
    const { programs } = await import('#server/db/schema');
    const { database, close } = openDatabase(inject('dataFolder'), []);
    const count = () => database.$count(programs);
    const before = await count();
    await post(NEEDS_A_PLUNGE);
    expect(await count()).toBe(before);
    const made = await post({ ...NEEDS_A_PLUNGE, centreCutting: true });
    expect(made.status).toBe(200);
    expect(await count()).toBe(before + 1);
    close();
    expect((await fetch(url('/api/openapi.json'))).status).toBe(200);
  });
});
