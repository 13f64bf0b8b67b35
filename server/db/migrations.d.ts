/** Every migration in server/db/migrations, in order; made part of the server when it is built (nuxt.config.ts). */
declare module '#migrations' {
  import type { MigrationMeta } from 'drizzle-orm/migrator';

  const migrations: readonly MigrationMeta[];
  export default migrations;
}
