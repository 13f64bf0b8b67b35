import { fileURLToPath } from 'node:url';
import { readMigrationFiles } from 'drizzle-orm/migrator';

/** What the build makes part of the server under the name #migrations. */
export default readMigrationFiles({ migrationsFolder: fileURLToPath(new URL('../../server/db/migrations', import.meta.url)) });
