import { closeDatabase, useDatabase } from '#server/db/shop';

/** Opens the database before the first request: a schema that cannot be brought up to date stops the server. */
export default defineNitroPlugin((nitro) => {
  useDatabase();
  nitro.hooks.hook('close', closeDatabase);
});
