import { type SQL, and, asc, desc, eq, gte, lt, sql } from 'drizzle-orm';
import type { SQLiteColumn } from 'drizzle-orm/sqlite-core';
import type { ListQuery } from '#shared/shop/list';
import { problem } from '../utils/problem';

/** How a list may be asked for: its columns by the names that an address uses. */
export interface ListShape {
  readonly id: SQLiteColumn;
  readonly shopId: SQLiteColumn;
  readonly sorts: Readonly<Record<string, SQLiteColumn>>;
  /** The sort of who asks for none, and which way. */
  readonly first: readonly [string, 'asc' | 'desc'];
  /** Where `q` is looked for at the beginning. */
  readonly search?: SQLiteColumn;
  readonly status?: SQLiteColumn;
}

/** The part of a query that makes a list of rows a page of it. */
export interface ListPage {
  readonly where: SQL | undefined;
  readonly orderBy: SQL[];
  /** One more than the page has: its row says that another page follows. */
  readonly limit: number;
  /** The page and where the next begins, from the rows found; `sorted` gives a row's value of the sort. */
  readonly cut: <Row extends { readonly id: string | number }>(rows: readonly Row[], sorted: (row: Row, sort: string) => unknown) => { rows: Row[]; next: string | null };
}

/** Pages by value and id of the last row, so that each costs the same however many came before it. */
export function pageOf(shape: ListShape, shopId: string, query: ListQuery): ListPage {
  const sort = query.sort ?? shape.first[0];
  const column = Object.hasOwn(shape.sorts, sort) ? shape.sorts[sort] : undefined;
  if (!column) throw problem(422, `This list cannot be sorted by "${sort}". Use ${Object.keys(shape.sorts).join(', ')}.`);
  const order = query.order ?? (query.sort === undefined ? shape.first[1] : 'asc');
  const after = query.after === undefined ? null : readCursor(query.after);
  const beyond = order === 'asc' ? sql`>` : sql`<`;
  return {
    where: and(
      eq(shape.shopId, shopId),
      query.status && shape.status ? eq(shape.status, query.status) : undefined,
      query.q && shape.search ? and(gte(shape.search, query.q), lt(shape.search, `${query.q}\u{10FFFF}`)) : undefined,
      after ? sql`(${column}, ${shape.id}) ${beyond} (${after[0]}, ${after[1]})` : undefined,
    ),
    orderBy: order === 'asc' ? [asc(column), asc(shape.id)] : [desc(column), desc(shape.id)],
    limit: query.limit + 1,
    cut: (rows, sorted) => {
      const page = rows.slice(0, query.limit);
      const last = page[page.length - 1];
      return { rows: page, next: last && rows.length > page.length ? writeCursor(sorted(last, sort), last.id) : null };
    },
  };
}

type Cursor = readonly [string | number, string | number];

function writeCursor(value: unknown, id: string | number): string {
  const plain = value instanceof Date ? value.getTime() : value;
  return Buffer.from(JSON.stringify([plain, id])).toString('base64url');
}

function readCursor(text: string): Cursor {
  try {
    const [value, id]: unknown[] = JSON.parse(Buffer.from(text, 'base64url').toString());
    const plain = (part: unknown): part is string | number => typeof part === 'string' || typeof part === 'number';
    if (plain(value) && plain(id)) return [value, id];
  } catch (error) {
    if (!(error instanceof SyntaxError)) throw error;
  }
  throw problem(422, 'The place to go on from cannot be read. Start from the first page.');
}
