import { index, integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { id, time } from './columns';
import { OUTCOMES } from '#shared/shop/cut';
import { people, shops } from './people';
import { railPrograms, rails } from './rails';
import { bits, machines } from './records';

const shopId = () => text('shop_id').notNull().references(() => shops.id);

/** Every rail that was cut, logged at the bench under an id of the bench's own, so that sending twice logs once. */
export const cuts = sqliteTable('cuts', {
  id: id(),
  shopId: shopId(),
  railId: text('rail_id').notNull().references(() => rails.id),
  programId: text('program_id').notNull().references(() => railPrograms.id),
  machineId: text('machine_id').notNull().references(() => machines.id),
  bitId: text('bit_id').notNull().references(() => bits.id),
  personId: text('person_id').notNull().references(() => people.id),
  outcome: text('outcome', { enum: OUTCOMES }).notNull(),
  reason: text('reason').notNull().default(''),
  /** How long it ran, by the bench's stopwatch; null where nobody started it. */
  seconds: real('seconds'),
  /** First-off measurements in the drawing's units; empty where none were taken. */
  widths: text('widths', { mode: 'json' }).$type<readonly number[]>().notNull(),
  depths: text('depths', { mode: 'json' }).$type<readonly number[]>().notNull(),
  /** When it was cut, by the bench's clock, and when it reached us. */
  cutAt: time('cut_at').notNull(),
  loggedAt: time('logged_at').notNull(),
}, (table) => [
  index('cuts_shop').on(table.shopId, table.cutAt), index('cuts_rail').on(table.railId),
  index('cuts_bit').on(table.bitId), index('cuts_program').on(table.programId),
]);

/** Who did what in a shop. */
export const deeds = sqliteTable('deeds', {
  id: integer('id').primaryKey(),
  shopId: shopId(),
  personId: text('person_id').references(() => people.id),
  /** In the past tense: `saved rail`, `invited`. */
  what: text('what').notNull(),
  /** What it was done to, as it was called then. */
  subject: text('subject').notNull(),
  at: time('at').notNull(),
}, (table) => [index('deeds_shop').on(table.shopId, table.at)]);
