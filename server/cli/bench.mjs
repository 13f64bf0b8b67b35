import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { buildIfChanged } from './setup/build.mjs';
import { installDependencies } from './setup/packages.mjs';
import { ROOT, main } from './setup/run.mjs';

// npm run bench: the tables of tests/bench. The code is bundled as the built server's is: run from its sources, module
// by module, every shared constant would be looked up through its module, which no one who uses the product does.
await main(async () => {
  await installDependencies();
  await buildIfChanged();
  const { build } = await import('vite');
  const outDir = join(ROOT, '.output/bench'); // two folders down, as tests/bench is
  const here = (path) => join(ROOT, path);
  await build({
    root: ROOT,
    configFile: false,
    logLevel: 'warn',
    resolve: { alias: { '#shared': here('shared'), '#server': here('server') } },
    build: { ssr: here('tests/bench/index.ts'), outDir, target: 'node20', rollupOptions: { output: { entryFileNames: 'index.mjs' } } },
  });
  await import(pathToFileURL(join(outDir, 'index.mjs')).href);
  return 0;
});
