import { closeDatabase, useDatabase } from '#server/db/shop';
import { refuseDemoData, seedDemo } from '#server/demo/seed';
import { settings } from '#server/utils/settings';

/** Opens the database before the first request: a schema that cannot be brought up to date stops the server. */
export default defineNitroPlugin((nitro) => {
  useDatabase();
  nitro.hooks.hook('close', closeDatabase);
  const ready = settings.TALLYRAIL_DEMO ? seedDemo(settings.TALLYRAIL_DATA) : refuseDemoData(settings.TALLYRAIL_DATA);
  // Whoever asks before the shop stands waits for it; a demo that cannot be filled stops the server.
  nitro.hooks.hook('request', () => ready);
  ready.catch((error: unknown) => {
    console.error(error);
    process.exit(1);
  });
});
