import { sql } from 'drizzle-orm';
import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import type { ProgramSummary } from '#shared/makeProgram';
import type { Readback } from '#shared/readback/finding';
import type { Bit } from '#shared/shop/bit';
import type { Machine } from '#shared/shop/machine';
import { RAIL_STATUSES } from '#shared/shop/railStatus';
import type { SlotRequestInput } from '#shared/slot/request';
import type { SlotSpec } from '#shared/slot/spec';
import { id, time } from './columns';
import { commissions } from './commissions';
import { people, shops } from './people';
import { bits, machines } from './records';

const shopId = () => text('shop_id').notNull().references(() => shops.id);

export const rails = sqliteTable('rails', {
  id: id(),
  shopId: shopId(),
  name: text('name').notNull(),
  status: text('status', { enum: RAIL_STATUSES }).notNull(),
  /** Number of its newest revision. */
  revision: integer('revision').notNull(),
  wood: text('wood').notNull(),
  /** How many are to be cut. */
  quantity: integer('quantity').notNull().default(1),
  /** Day it has to be cut by, `2026-12-18`. */
  due: text('due'),
  /** The commission whose piece it is of, and which of its rails: A, B, C. Null: a rail by itself. */
  commissionId: text('commission_id').references(() => commissions.id),
  label: text('label'),
  createdAt: time('created_at').notNull(),
  updatedAt: time('updated_at').notNull(),
  archivedAt: time('archived_at'),
}, (table) => [
  index('rails_shop').on(table.shopId, table.updatedAt),
  index('rails_status').on(table.shopId, table.status),
  index('rails_name').on(table.shopId, table.name),
  uniqueIndex('rails_label').on(table.commissionId, table.label).where(sql`archived_at IS NULL`),
]);

/** Each save of a rail; none is ever changed. */
export const railRevisions = sqliteTable('rail_revisions', {
  id: id(),
  shopId: shopId(),
  railId: text('rail_id').notNull().references(() => rails.id),
  number: integer('number').notNull(),
  /** The drawing as its link writes it: figures as they were typed. */
  draft: text('draft').notNull(),
  /** The request that the drawing stands for, as posted. */
  request: text('request', { mode: 'json' }).$type<SlotRequestInput>().notNull(),
  note: text('note').notNull().default(''),
  savedBy: text('saved_by').notNull().references(() => people.id),
  savedAt: time('saved_at').notNull(),
}, (table) => [uniqueIndex('rail_revisions_number').on(table.railId, table.number), index('rail_revisions_shop').on(table.shopId)]);

/** A shop's programs, each with all that it was made from as it was then. Triggers refuse any change (migrations). */
export const railPrograms = sqliteTable('rail_programs', {
  id: id(),
  shopId: shopId(),
  railId: text('rail_id').notNull().references(() => rails.id),
  revision: integer('revision').notNull(),
  machineId: text('machine_id').notNull().references(() => machines.id),
  bitId: text('bit_id').notNull().references(() => bits.id),
  mark: text('mark').notNull(),
  sha256: text('sha256').notNull(),
  fileName: text('file_name').notNull(),
  text: text('text').notNull(),
  spec: text('spec', { mode: 'json' }).$type<SlotSpec>().notNull(),
  machine: text('machine', { mode: 'json' }).$type<Machine>().notNull(),
  bit: text('bit', { mode: 'json' }).$type<Bit>().notNull(),
  /** Which of the machine's ways of holding. */
  holding: integer('holding').notNull(),
  readback: text('readback', { mode: 'json' }).$type<Readback>().notNull(),
  summary: text('summary', { mode: 'json' }).$type<ProgramSummary>().notNull(),
  madeBy: text('made_by').notNull().references(() => people.id),
  madeAt: time('made_at').notNull(),
}, (table) => [
  index('rail_programs_shop').on(table.shopId, table.madeAt),
  index('rail_programs_mark').on(table.shopId, table.mark),
  index('rail_programs_rail').on(table.railId, table.revision),
]);
