import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import type { SlotSpec } from '#shared/slot/spec';

// Every table; all but the visitors' programs belong to a shop.

/** Programs handed out to visitors: never changed, never deleted, so that a mark on a sheet can always be looked up. */
export const programs = sqliteTable('programs', {
  id: integer('id').primaryKey(),
  /** Of the text's bytes, hex: the same text is one program, however often it is asked for. */
  sha256: text('sha256').notNull().unique(),
  mark: text('mark').notNull(),
  fileName: text('file_name').notNull(),
  text: text('text').notNull(),
  spec: text('spec', { mode: 'json' }).$type<SlotSpec>().notNull(),
  createdAt: integer('created_at', { mode: 'timestamp_ms' }).notNull(),
}, (table) => [index('programs_mark').on(table.mark)]);

export * from './schema/people'; // shops, people, passkeys, tokens
export * from './schema/records'; // machines, bits, their corrections, own woods
export * from './schema/commissions'; // commissions, their pieces' revisions, what was made and ticked
export * from './schema/rails'; // rails, their revisions, their programs
export * from './schema/cuts'; // cuts, deeds
export * from './schema/mail'; // the mail queue
