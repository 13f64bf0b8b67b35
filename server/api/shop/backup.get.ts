import { createReadStream, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { expectOnlyShop } from '#server/access/onlyShop';
import { copyDatabase } from '#server/db/shop';

/** A whole copy of the database, made while others go on working. */
export default defineEventHandler(async (event) => {
  await expectOnlyShop();
  const folder = mkdtempSync(join(tmpdir(), 'tallyrail-backup-'));
  event.node.res.once('close', () => rmSync(folder, { recursive: true, force: true }));
  const copy = join(folder, 'copy.sqlite');
  await copyDatabase(copy);
  setResponseHeaders(event, { 'content-type': 'application/vnd.sqlite3', 'content-disposition': 'attachment; filename="tallyrail-backup.sqlite"' });
  return sendStream(event, createReadStream(copy));
});
