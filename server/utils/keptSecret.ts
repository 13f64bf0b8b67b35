import { randomBytes } from 'node:crypto';
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/** The secret kept in a file of the data folder, made when first needed and readable by its owner alone. */
export function keptSecret(folder: string, name: string): string {
  const file = join(folder, name);
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  try {
    writeFileSync(file, randomBytes(48).toString('base64url'), { flag: 'wx', mode: 0o600 });
  } catch (error) {
    if (!(error instanceof Error && 'code' in error && error.code === 'EEXIST')) throw error;
  }
  return readFileSync(file, 'utf8');
}
