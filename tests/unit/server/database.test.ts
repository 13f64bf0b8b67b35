import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { sql } from 'drizzle-orm';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import migrations from '#migrations';
import { openDatabase } from '#server/db/client';
import { programs } from '#server/db/schema';
import { programsIn } from '#server/services/programs';
import { makeProgram } from '#shared/makeProgram';
import { slotRequestSchema } from '#shared/slot/request';
import { RAIL } from '../../api/support';

let folder: string;
beforeEach(() => (folder = mkdtempSync(join(tmpdir(), 'tallyrail-'))));
afterEach(() => rmSync(folder, { recursive: true, force: true }));

const good = (name: string) => {
  const made = makeProgram(slotRequestSchema.parse({ ...RAIL, name }));
  if (!made.ok) throw new Error('The rail is good.');
  return made;
};

const broken = { sql: ['CREATE TABLE half (id integer)', 'CREATE TABLE nonsense ('], hash: 'x', folderMillis: Date.now() + 1e9, bps: true };

describe('openDatabase', () => {
  it('has the pragmas a shop relies on', () => {
    const { database, close } = openDatabase(folder, migrations);
    const pragma = (name: string) => Object.values(database.get<Record<string, unknown>>(sql.raw(`PRAGMA ${name}`)))[0];
    expect({ journal: pragma('journal_mode'), keys: pragma('foreign_keys'), wait: pragma('busy_timeout'), sync: pragma('synchronous') })
      .toEqual({ journal: 'wal', keys: 1, wait: 5000, sync: 1 });
    close();
  });

  it('applies each migration once, and finds everything again', async () => {
    const first = openDatabase(folder, migrations);
    await programsIn(first.database).keep(good('Rail A'));
    first.close();
    const second = openDatabase(folder, migrations);
    expect(await second.database.$count(programs)).toBe(1);
    expect(second.database.all(sql`SELECT * FROM __drizzle_migrations`)).toHaveLength(migrations.length);
    second.close();
  });

  it('applies all of what is new or none, and says why', () => {
    expect(() => openDatabase(folder, [...migrations, broken])).toThrow(/near "\("|incomplete input/);
    const { database, close } = openDatabase(folder, []);
    expect(database.all(sql`SELECT name FROM sqlite_master WHERE name IN ('half', 'programs')`)).toEqual([]);
    close();
  });

  it('refuses a migration that leaves a row pointing nowhere', () => {
    const orphan = { ...broken, sql: ['CREATE TABLE a (id integer primary key)', 'CREATE TABLE b (a integer references a(id))', 'INSERT INTO b VALUES (7)'] };
    expect(() => openDatabase(folder, [...migrations, orphan])).toThrow('points nowhere');
  });

  it('may be opened twice at once', async () => {
    const [one, two] = [openDatabase(folder, migrations), openDatabase(folder, migrations)];
    await programsIn(one.database).keep(good('Rail A'));
    await programsIn(two.database).keep(good('Rail B'));
    expect(await one.database.$count(programs)).toBe(2);
    one.close();
    two.close();
  });
});

describe('programs', () => {
  it('keeps a text once, the first time it was made', async () => {
    const { database, close } = openDatabase(folder, migrations);
    const service = programsIn(database);
    const made = good('Rail A');
    await service.keep(made);
    const [before] = await service.findByMark(made.mark);
    await service.keep(made);
    expect(await service.findByMark(made.mark)).toEqual([before]);
    expect(before).toMatchObject({ sha256: made.sha256, fileName: made.fileName, program: made.program, spec: made.spec });
    close();
  });

  it('finds by mark with an index', () => {
    const { database, close } = openDatabase(folder, migrations);
    const plan = database.all<{ detail: string }>(sql`EXPLAIN QUERY PLAN SELECT * FROM programs WHERE mark = 'K74-QDM'`);
    expect(plan[0]?.detail).toContain('programs_mark');
    close();
  });
});
