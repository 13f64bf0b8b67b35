import { buildIfChanged } from './setup/build.mjs';
import { installDependencies } from './setup/packages.mjs';
import { main, runTool } from './setup/run.mjs';

// npm run bench: the table of tests/bench, from the built server and the sources.
await main(async () => {
  await installDependencies();
  await buildIfChanged();
  return runTool('tsx/dist/cli.mjs', ['tests/bench/index.ts', ...process.argv.slice(2)]);
});
