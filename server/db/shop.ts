// eslint-disable-next-line @typescript-eslint/triple-slash-reference -- a module made by the build has no file to import its type from
/// <reference path="./migrations.d.ts" />
import migrations from '#migrations';
import { settings } from '../utils/settings';
import { type ShopDatabase, openDatabase } from './client';

let opened: ReturnType<typeof openDatabase> | undefined;

/** The server's own database, opened when first asked for: by the migrate plugin, at start. */
export function useDatabase(): ShopDatabase {
  opened ??= openDatabase(settings.TALLYRAIL_DATA, migrations);
  return opened.database;
}

export function closeDatabase(): void {
  opened?.close();
  opened = undefined;
}
