import { integer, text } from 'drizzle-orm/sqlite-core';

/** Columns that most tables have; each call makes its own. */
export const id = () => text('id').primaryKey();
export const time = (name: string) => integer(name, { mode: 'timestamp_ms' });
export const yes = (name: string) => integer(name, { mode: 'boolean' });
