import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { closeDatabase, useDatabase } from '#server/db/shop';
import { refuseDemoData, seedDemo } from '#server/demo/seed';
import { settings } from '#server/utils/settings';

/** Opens the database before the first request: a schema that cannot be brought up to date stops the server. */
export default defineNitroPlugin((nitro) => {
  useDatabase();
  writeFileSync(join(settings.TALLYRAIL_DATA, 'server.pid'), String(process.pid)); // so that nobody restores under a running server
  nitro.hooks.hook('close', closeDatabase);
  const ready = settings.TALLYRAIL_DEMO ? seedDemo(settings.TALLYRAIL_DATA) : refuseDemoData(settings.TALLYRAIL_DATA);
  // Whoever asks before the shop stands waits for it; a demo that cannot be filled stops the server.
  nitro.hooks.hook('request', () => ready);
  ready.catch((error: unknown) => {
    console.error(error);
    process.exit(1);
  });
});
