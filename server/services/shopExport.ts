import { Zip, ZipDeflate, strToU8 } from 'fflate';
import { and, asc, eq, gt } from 'drizzle-orm';
import type { ListQuery } from '#shared/shop/list';
import { railPrograms } from '../db/schema';
import { useDatabase } from '../db/shop';
import { csvOf, flat } from '../utils/answerList';
import { listCommissions } from './commissions';
import { listCuts } from './cuts';
import { deedsOf } from './deeds';
import { listRailPrograms } from './railPrograms';
import { listRails } from './rails';
import { shopBits, shopMachines, shopWoods } from './records';

/** Rows read at once: a long list never stands in memory whole. */
const BATCH = 200;
const ALL: ListQuery = { q: '', limit: BATCH, format: 'csv' };

type List = (shopId: string, query: ListQuery) => Promise<{ readonly rows: readonly object[]; readonly next: string | null }>;

const LISTS: Readonly<Record<string, List>> = {
  'commissions.csv': listCommissions('owner'), 'rails.csv': listRails, 'programs.csv': listRailPrograms, 'cuts.csv': listCuts, 'log.csv': deedsOf,
  'machines.csv': shopMachines.list, 'bits.csv': shopBits.list, 'woods.csv': shopWoods.list,
};

/** Everything of a shop that a spreadsheet or a machine can read, as one zip: lists as CSV, programs as their own files. */
export async function* shopZip(shopId: string): AsyncGenerator<Uint8Array> {
  const ready: Uint8Array[] = [];
  let failure: Error | null = null;
  const zip = new Zip((error, chunk) => {
    if (error) failure = error;
    else ready.push(chunk);
  });
  const add = (name: string, text: string) => {
    const entry = new ZipDeflate(name);
    zip.add(entry);
    entry.push(strToU8(text), true);
  };
  const drain = function* () {
    if (failure) throw failure;
    yield* ready.splice(0);
  };

  for (const [name, list] of Object.entries(LISTS)) {
    add(name, csvOf(await everyRow(list, shopId)));
    yield* drain();
  }
  for await (const { id, fileName, text } of everyProgram(shopId)) {
    // Two programs may share a name and a mark, so each file is named by its id as well.
    const safe = fileName.replaceAll(/[^\w.-]/g, '_');
    add(`programs/${id}_${safe}`, text);
    yield* drain();
  }
  zip.end();
  yield* drain();
}

async function everyRow(list: List, shopId: string): Promise<Record<string, string>[]> {
  const rows: Record<string, string>[] = [];
  let after: string | undefined;
  do {
    const page = await list(shopId, { ...ALL, after });
    rows.push(...page.rows.map((row) => flat(row)));
    after = page.next ?? undefined;
  } while (after !== undefined);
  return rows;
}

async function* everyProgram(shopId: string) {
  let last = '';
  for (;;) {
    const rows = await useDatabase().select({ id: railPrograms.id, fileName: railPrograms.fileName, text: railPrograms.text }).from(railPrograms)
      .where(and(eq(railPrograms.shopId, shopId), gt(railPrograms.id, last))).orderBy(asc(railPrograms.id)).limit(BATCH);
    yield* rows;
    if (rows.length < BATCH) return;
    last = rows[rows.length - 1]?.id ?? last;
  }
}
