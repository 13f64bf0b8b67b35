import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { id, time } from './columns';
import { shops } from './people';

/** Mail waits here until the mail server has taken it. */
export const mails = sqliteTable('mails', {
  id: id(),
  /** Null for who has no shop yet. */
  shopId: text('shop_id').references(() => shops.id),
  to: text('to').notNull(),
  subject: text('subject').notNull(),
  text: text('text').notNull(),
  html: text('html').notNull(),
  createdAt: time('created_at').notNull(),
  attempts: integer('attempts').notNull().default(0),
  /** When to try next; null once it is sent or given up. */
  nextAt: time('next_at'),
  sentAt: time('sent_at'),
  /** What the mail server said last. */
  refusal: text('refusal'),
}, (table) => [index('mails_next').on(table.nextAt), index('mails_shop').on(table.shopId, table.createdAt)]);
