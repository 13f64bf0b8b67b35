import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { UNITS } from '#shared/measure/units';
import type { Contact } from '#shared/commission/commission';
import { STAGES, type StageDays } from '#shared/commission/stages';
import type { WorkInput } from '#shared/commission/work';
import { STEPS } from '#shared/piece/stale';
import { id, time, yes } from './columns';
import { people, shops } from './people';

const shopId = () => text('shop_id').notNull().references(() => shops.id);
const commissionId = () => text('commission_id').notNull().references(() => commissions.id);

/** A customer's piece, from the first message to the wall. */
export const commissions = sqliteTable('commissions', {
  id: id(),
  shopId: shopId(),
  name: text('name').notNull(),
  /** The owner's alone. */
  contact: text('contact', { mode: 'json' }).$type<Contact>().notNull(),
  occasion: text('occasion').notNull().default(''),
  wall: text('wall').notNull().default(''),
  /** Day it is promised for, `2026-12-18`. */
  due: text('due'),
  stage: text('stage', { enum: STAGES }).notNull().default('enquiry'),
  /** When each stage was reached. */
  stageDays: text('stage_days', { mode: 'json' }).$type<StageDays>().notNull(),
  units: text('units', { enum: UNITS }).notNull(),
  wishes: text('wishes').notNull().default(''),
  createdAt: time('created_at').notNull(),
  updatedAt: time('updated_at').notNull(),
  archivedAt: time('archived_at'),
}, (table) => [index('commissions_shop').on(table.shopId, table.updatedAt), index('commissions_name').on(table.shopId, table.name), index('commissions_due').on(table.shopId, table.due)]);

/** Each save of a commission's whole work; triggers refuse any change (migrations). */
export const pieceRevisions = sqliteTable('piece_revisions', {
  id: id(),
  shopId: shopId(),
  commissionId: commissionId(),
  number: integer('number').notNull(),
  /** As it was sent: figures as they were typed. */
  work: text('work', { mode: 'json' }).$type<WorkInput>().notNull(),
  savedBy: text('saved_by').notNull().references(() => people.id),
  savedAt: time('saved_at').notNull(),
}, (table) => [uniqueIndex('piece_revisions_number').on(table.commissionId, table.number), index('piece_revisions_shop').on(table.shopId)]);

/** Which revision a step was made from, each time it was made: the newest holds. */
export const madeSteps = sqliteTable('made_steps', {
  id: integer('id').primaryKey(),
  shopId: shopId(),
  commissionId: commissionId(),
  step: text('step', { enum: STEPS }).notNull(),
  revision: integer('revision').notNull(),
  madeBy: text('made_by').notNull().references(() => people.id),
  madeAt: time('made_at').notNull(),
}, (table) => [index('made_steps_commission').on(table.commissionId, table.step), index('made_steps_shop').on(table.shopId)]);

/** Bench steps ticked off, and ticks taken back: the newest of a step holds. */
export const benchTicks = sqliteTable('bench_ticks', {
  id: integer('id').primaryKey(),
  shopId: shopId(),
  commissionId: commissionId(),
  step: text('step').notNull(),
  done: yes('done').notNull(),
  tickedBy: text('ticked_by').notNull().references(() => people.id),
  tickedAt: time('ticked_at').notNull(),
}, (table) => [index('bench_ticks_commission').on(table.commissionId), index('bench_ticks_shop').on(table.shopId)]);
