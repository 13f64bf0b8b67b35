// eslint-disable-next-line @typescript-eslint/triple-slash-reference -- a module made by the build has no file to import its type from
/// <reference path="./migrations.d.ts" />
import migrations from '#migrations';
import { settings } from '../utils/settings';
import { type ShopDatabase, faultOf, openDatabase, putInPlace } from './client';

let opened: ReturnType<typeof openDatabase> | undefined;
const open = () => (opened ??= openDatabase(settings.TALLYRAIL_DATA, migrations));

/** The server's own database, opened when first asked for: by the migrate plugin, at start. */
export function useDatabase(): ShopDatabase {
  return open().database;
}

export function closeDatabase(): void {
  opened?.close();
  opened = undefined;
}

/** Writes a whole copy of the database. */
export const copyDatabase = (path: string): Promise<void> => open().copyTo(path);

/**
 * Takes a copy in the database's place, at once for everyone: nothing runs between closing the one and opening the other.
 *
 * @returns what is wrong with the copy, or null where it stands.
 */
export function restoreDatabase(copy: string): string | null {
  const fault = faultOf(copy, migrations);
  if (fault !== null) return fault;
  closeDatabase();
  putInPlace(settings.TALLYRAIL_DATA, copy);
  open();
  return null;
}
