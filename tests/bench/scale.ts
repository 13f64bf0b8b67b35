import SQLite from 'better-sqlite3';
import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { signInAs } from '../support/people';
import { newDataFolder, startServer } from '../support/server';

const DEMO = { TALLYRAIL_DEMO: '1' };
const SIZES = { few: { programs: 100, rails: 10 }, many: { programs: 100_000, rails: 1000 } } as const;
const ASKED = 150; // requests, of which the median counts
const LETTERS = 'ACDEFGHJKLMNPQRTUVWXY2346789'; // of program marks

/** Writes copies of the demo's first rail and program beside them, under names and marks of their own. */
function fill(folder: string, { programs, rails }: { readonly programs: number; readonly rails: number }): void {
  const file = new SQLite(join(folder, 'tallyrail.sqlite'));
  const copyOf = (table: string, changes: Readonly<Record<string, string>>) => {
    const columns = file.prepare(`SELECT name FROM pragma_table_info('${table}')`).pluck().all().map(String);
    return file.prepare(`INSERT INTO ${table} (${columns.join(', ')}) SELECT ${columns.map((column) => changes[column] ?? column).join(', ')} FROM ${table} ORDER BY rowid LIMIT 1`);
  };
  const rail = copyOf('rails', { id: '@id', name: '@name', updated_at: 'updated_at + @n', commission_id: 'NULL', label: 'NULL' });
  const revision = copyOf('rail_revisions', { id: '@id', rail_id: '@id' });
  const program = copyOf('rail_programs', { id: '@id', mark: '@mark', sha256: '@id', made_at: 'made_at + @n', rail_id: '@rail' });
  file.transaction(() => {
    for (let n = 0; n < rails; n++) {
      const id = `bench-rail-${String(n).padStart(8, '0')}`;
      rail.run({ id, n, name: `Rail ${n}` });
      revision.run({ id });
    }
    for (let n = 0; n < programs; n++) {
      const mark = Array.from({ length: 6 }, (_, i) => LETTERS[Math.floor(n / LETTERS.length ** (5 - i)) % LETTERS.length]).join('');
      program.run({ id: `bench-prog-${String(n).padStart(8, '0')}`, n, mark: `${mark.slice(0, 3)}-${mark.slice(3)}`, rail: `bench-rail-${String(n % rails).padStart(8, '0')}` });
    }
  })();
  file.close();
}

const PATHS = {
  'list of programs': '/api/shop/programs', 'look-up by mark': '/api/shop/programs?q=AAA-AAD', 'sorted by mark': '/api/shop/programs?sort=mark',
  // A short list fills no page: both are asked for as many as it has.
  'list of rails': '/api/rails?limit=10', 'rails by name': '/api/rails?q=Rail 1&sort=name&limit=1', 'list of cuts': '/api/cuts',
} as const;

/** Milliseconds of each list and look-up, the median of many. */
async function millisecondsOf(size: keyof typeof SIZES): Promise<Record<string, number>> {
  const folder = newDataFolder();
  await (await startServer(DEMO, folder)).stop();
  fill(folder, SIZES[size]);
  const server = await startServer(DEMO, folder);
  try {
    const owner = await signInAs({ ...server, folder }, 'owner');
    const medians: Record<string, number> = {};
    for (const [name, path] of Object.entries(PATHS)) {
      const times: number[] = [];
      for (let n = 0; n < ASKED; n++) {
        const began = performance.now();
        await owner.get(path);
        times.push(performance.now() - began);
      }
      medians[name] = times.sort((a, b) => a - b)[ASKED >> 1] ?? NaN;
    }
    return medians;
  } finally {
    await server.stop();
    rmSync(folder, { recursive: true, force: true });
  }
}

/** Lists and look-ups with 100 000 programs and 1000 rails against 100 and 10: at most 1.5 times as long. */
export async function benchScale(): Promise<Record<string, number | string>[]> {
  const [few, many] = [await millisecondsOf('few'), await millisecondsOf('many')];
  const round = (value: number) => Math.round(value * 100) / 100;
  return Object.keys(PATHS).map((name) => {
    const [a, b] = [few[name] ?? NaN, many[name] ?? NaN];
    return { 'asked for': name, 'ms with 100': round(a), 'ms with 100 000': round(b), 'ratio': round(b / a), 'at most': 1.5 };
  });
}
