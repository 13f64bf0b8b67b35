import { type H3Event, setResponseHeaders } from 'h3';
import Papa from 'papaparse';
import type { ListQuery } from '#shared/shop/list';

interface Page<Row> {
  readonly rows: readonly Row[];
  readonly next: string | null;
}

/** Rows fetched at once for a file. */
const BATCH = 200;
/** What a spreadsheet would take for a formula at a cell's start. */
const FORMULA = /^[=+\-@\t\r]/;

/** A list as asked for: one page as JSON, or all of it as a CSV file. */
export async function answerList<Row extends object>(event: H3Event, name: string, query: ListQuery, list: (query: ListQuery) => Promise<Page<Row>>) {
  if (query.format === 'json') return await list(query);
  const rows: Record<string, string>[] = [];
  let after = query.after;
  do {
    const page = await list({ ...query, limit: BATCH, after });
    rows.push(...page.rows.map((row) => flat(row)));
    after = page.next ?? undefined;
  } while (after !== undefined);
  setResponseHeaders(event, { 'content-type': 'text/csv; charset=utf-8', 'content-disposition': `attachment; filename="${name}.csv"` });
  return csvOf(rows);
}

/** Rows as CSV (RFC 4180), its columns those of all rows; no cell can act as a formula. Without rows nothing says what columns there are: the file is empty. */
export function csvOf(rows: readonly Readonly<Record<string, string>>[]): string {
  if (rows.length === 0) return '';
  const columns = [...new Set(rows.flatMap((row) => Object.keys(row)))];
  if (columns.length === 0) return ''; // an empty list has no columns to name
  return `${Papa.unparse([...rows], { columns, newline: '\r\n', escapeFormulae: FORMULA })}\r\n`;
}

/** One row's figures side by side, those inside objects by their dotted names. */
export function flat(row: object, prefix = ''): Record<string, string> {
  const cells: Record<string, string> = {};
  for (const [key, value] of Object.entries(row)) {
    const name = prefix ? `${prefix}.${key}` : key;
    if (value instanceof Date) cells[name] = value.toISOString();
    else if (typeof value === 'object' && value !== null && !Array.isArray(value)) Object.assign(cells, flat(value, name));
    else cells[name] = Array.isArray(value) ? JSON.stringify(value) : String(value ?? '');
  }
  return cells;
}
