import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import type { AuthenticatorTransportFuture } from '@simplewebauthn/types';
import { PERSON_STATUSES, ROLES } from '#shared/types/people';
import { id, time, yes } from './columns';

export const shops = sqliteTable('shops', {
  id: id(),
  name: text('name').notNull(),
  /** The shop that `npm start` fills with invented people and rails. */
  demo: yes('demo').notNull().default(false),
  createdAt: time('created_at').notNull(),
});

/** Whoever belongs to a shop. A person who was removed stays, without address and password, for the log's sake. */
export const people = sqliteTable('people', {
  id: id(),
  shopId: text('shop_id').notNull().references(() => shops.id),
  role: text('role', { enum: ROLES }).notNull(),
  status: text('status', { enum: PERSON_STATUSES }).notNull().default('active'),
  name: text('name').notNull(),
  /** Lower case; one address is one person in one shop. */
  email: text('email').unique(),
  passwordHash: text('password_hash'),
  /** Rises when the password changes or all sessions are ended: a session that bears an older one is over. */
  epoch: integer('epoch').notNull().default(0),
  createdAt: time('created_at').notNull(),
}, (table) => [index('people_shop').on(table.shopId)]);

export const passkeys = sqliteTable('passkeys', {
  /** The credential's own id, base64url. */
  id: id(),
  shopId: text('shop_id').notNull().references(() => shops.id),
  personId: text('person_id').notNull().references(() => people.id),
  name: text('name').notNull(),
  publicKey: text('public_key').notNull(),
  counter: integer('counter').notNull(),
  backedUp: yes('backed_up').notNull(),
  transports: text('transports', { mode: 'json' }).$type<AuthenticatorTransportFuture[]>().notNull(),
  createdAt: time('created_at').notNull(),
}, (table) => [index('passkeys_person').on(table.personId)]);

export const TOKEN_KINDS = ['sign-up', 'reset', 'invite'] as const;

/** What a link in a mail stands for; of the secret itself only the hash is kept. */
export const tokens = sqliteTable('tokens', {
  hash: text('hash').primaryKey(),
  kind: text('kind', { enum: TOKEN_KINDS }).notNull(),
  shopId: text('shop_id').references(() => shops.id),
  personId: text('person_id').references(() => people.id),
  payload: text('payload', { mode: 'json' }).$type<Readonly<Record<string, string>>>().notNull(),
  createdAt: time('created_at').notNull(),
  expiresAt: time('expires_at').notNull(),
}, (table) => [index('tokens_shop').on(table.shopId), index('tokens_expiry').on(table.expiresAt)]);
