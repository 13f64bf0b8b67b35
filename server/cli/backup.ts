import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { parseArgs } from 'node:util';
import { readMigrationFiles } from 'drizzle-orm/migrator';
import { faultOf, openDatabase, putInPlace } from '#server/db/client';

// npm run backup -- copy.sqlite   writes a whole copy of the database; the server may be running.
// npm run restore -- copy.sqlite  puts one in its place; the server must not be.

const USAGE = 'Use: npm run backup -- copy.sqlite, or npm run restore -- copy.sqlite. TALLYRAIL_DATA names the data folder; .data without it.';
const migrations = readMigrationFiles({ migrationsFolder: fileURLToPath(new URL('../db/migrations', import.meta.url)) });

async function backup(folder: string, copy: string): Promise<string> {
  if (!existsSync(join(folder, 'tallyrail.sqlite'))) return `There is no database in ${folder}.`;
  if (existsSync(copy)) return `${copy} is there already. Name a file that is not.`;
  const { copyTo, close } = openDatabase(folder, migrations);
  try {
    await copyTo(copy);
  } finally {
    close();
  }
  return faultOf(copy, migrations) ?? '';
}

function restore(folder: string, copy: string): string {
  if (!existsSync(copy)) return `There is no file ${copy}.`;
  if (isServed(folder)) return 'A server is using this data folder. Stop it first.';
  const fault = faultOf(copy, migrations);
  if (fault !== null) return `${fault} Nothing was changed.`;
  putInPlace(folder, copy);
  return '';
}

/** Whether the server that noted itself in the folder still runs. */
function isServed(folder: string): boolean {
  const note = join(folder, 'server.pid');
  if (!existsSync(note)) return false;
  try {
    process.kill(Number(readFileSync(note, 'utf8')), 0); // signal 0 only asks
    return true;
  } catch {
    return false;
  }
}

const { positionals: [what, file] } = parseArgs({ allowPositionals: true });
const folder = process.env.TALLYRAIL_DATA || '.data';
const fault = file === undefined ? USAGE : what === 'backup' ? await backup(folder, file) : what === 'restore' ? restore(folder, file) : USAGE;
if (fault) console.error(fault);
else console.log(what === 'backup' ? `The database of ${folder} is copied to ${file}.` : `${file} stands in ${folder}. What was there is kept as before-restore.sqlite.`);
process.exitCode = fault ? 1 : 0;
