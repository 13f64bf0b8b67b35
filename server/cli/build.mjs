import { buildIfChanged } from './setup/build.mjs';
import { installDependencies } from './setup/packages.mjs';
import { main } from './setup/run.mjs';

// npm run build: packages where they are missing, then the server where its sources have changed.
await main(async () => {
  await installDependencies();
  await buildIfChanged();
  return 0;
});
