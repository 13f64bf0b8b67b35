import { index, integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { UNITS } from '#shared/measure/units';
import type { Bit } from '#shared/shop/bit';
import type { Machine } from '#shared/shop/machine';
import type { OwnWood } from '#shared/shop/wood';
import { id, time } from './columns';
import { people, shops } from './people';

const shopId = () => text('shop_id').notNull().references(() => shops.id);

/** A table of what a shop owns, each with its figures; what is put away keeps its programs and cuts. */
const recordTable = <Spec>(name: string) => sqliteTable(name, {
  id: id(),
  shopId: shopId(),
  name: text('name').notNull(),
  spec: text('spec', { mode: 'json' }).$type<Spec>().notNull(),
  createdAt: time('created_at').notNull(),
  updatedAt: time('updated_at').notNull(),
  archivedAt: time('archived_at'),
}, (table) => [index(`${name}_name`).on(table.shopId, table.name), index(`${name}_time`).on(table.shopId, table.updatedAt)]);

export type RecordTable<Spec> = ReturnType<typeof recordTable<Spec>>;

export const machines = recordTable<Machine>('machines');
export const bits = recordTable<Bit>('bits');
/** Woods that the shop added to the species table. */
export const woods = recordTable<OwnWood>('woods');

/** When a bit was replaced by a new one of its kind: minutes are counted, and corrections hold, from the last. */
export const bitReplacements = sqliteTable('bit_replacements', {
  id: id(),
  shopId: shopId(),
  bitId: text('bit_id').notNull().references(() => bits.id),
  replacedBy: text('replaced_by').notNull().references(() => people.id),
  at: time('at').notNull(),
}, (table) => [index('bit_replacements_bit').on(table.bitId, table.at)]);

/** What a bit was found to cut, accepted by the owner; the newest since the bit was replaced holds. */
export const bitCorrections = sqliteTable('bit_corrections', {
  id: id(),
  shopId: shopId(),
  bitId: text('bit_id').notNull().references(() => bits.id),
  units: text('units', { enum: UNITS }).notNull(),
  /** Effective diameter, and the spread and count of the measurements it stands on. */
  diameter: real('diameter').notNull(),
  spread: real('spread').notNull(),
  count: integer('count').notNull(),
  acceptedBy: text('accepted_by').notNull().references(() => people.id),
  acceptedAt: time('accepted_at').notNull(),
}, (table) => [index('bit_corrections_bit').on(table.bitId, table.acceptedAt)]);
