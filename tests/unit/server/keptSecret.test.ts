import { mkdtempSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { keptSecret } from '#server/utils/keptSecret';

let folder: string;
beforeEach(() => (folder = mkdtempSync(join(tmpdir(), 'tallyrail-'))));
afterEach(() => rmSync(folder, { recursive: true, force: true }));

it('makes a secret once, for its owner alone, and each folder another', () => {
  const secret = keptSecret(join(folder, 'a'), 'secret');
  expect(secret).toMatch(/^[\w-]{64}$/);
  expect(keptSecret(join(folder, 'a'), 'secret')).toBe(secret);
  expect(keptSecret(join(folder, 'b'), 'secret')).not.toBe(secret);
  expect(statSync(join(folder, 'a', 'secret')).mode & 0o777).toBe(0o600);
});

it('does not hide that it cannot be kept', () => {
  expect(() => keptSecret('/dev/null/x', 'secret')).toThrow();
});
