import { defineConfig } from 'drizzle-kit';

/** `npm run db:generate -- --name what_it_changes` writes the next migration. */
export default defineConfig({ dialect: 'sqlite', schema: './server/db/schema.ts', out: './server/db/migrations' });
