import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import type { SlotSpec } from '#shared/slot/spec';

/** Programs that were handed out: never changed, never deleted, so that a mark on a sheet can always be looked up. */
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
