import { createWriteStream, mkdtempSync, rmSync } from 'node:fs';
import type { IncomingMessage } from 'node:http';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pipeline } from 'node:stream/promises';
import { restoreDatabase } from '../db/shop';

/** A backup sent to us is put in the database's place; what is wrong with it, or null. The file comes in pieces, never whole in memory. */
export async function restoreFrom(request: IncomingMessage): Promise<string | null> {
  const folder = mkdtempSync(join(tmpdir(), 'tallyrail-restore-'));
  try {
    const copy = join(folder, 'copy.sqlite');
    await pipeline(request, createWriteStream(copy, { mode: 0o600 }));
    return restoreDatabase(copy);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
