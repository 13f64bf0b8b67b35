import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { buildIfChanged } from './setup/build.mjs';
import { chromiumPath, prepareChromium } from './setup/chromium.mjs';
import { installDependencies } from './setup/packages.mjs';
import { lighthouseScores } from './setup/lighthouse.mjs';
import { playbackFigures } from './setup/playbackFigures.mjs';
import { ROOT, Stop, main, say } from './setup/run.mjs';

/** Long enough for a busy machine. */
const START_MS = 30_000;

/** The built server on a free port, with an empty data folder. */
async function startBuilt() {
  const folder = mkdtempSync(join(tmpdir(), 'tallyrail-bench-'));
  const server = spawn(process.execPath, [join(ROOT, '.output/server/index.mjs')], {
    cwd: folder,
    stdio: ['ignore', 'pipe', 'inherit'],
    env: { ...process.env, NODE_ENV: 'production', NITRO_HOST: '127.0.0.1', NITRO_PORT: '0', TALLYRAIL_DATA: folder },
  });
  const ended = new Promise((resolve) => server.once('exit', resolve));
  const stop = async () => {
    server.kill('SIGTERM');
    await ended;
    rmSync(folder, { recursive: true, force: true });
  };
  const url = await new Promise((resolve, reject) => {
    const timer = setTimeout(() => reject(new Stop('The server did not say where it listens.')), START_MS);
    let said = '';
    server.stdout.setEncoding('utf8').on('data', (text) => {
      said += text;
      const address = /Listening on (\S+)/.exec(said)?.[1];
      if (!address) return;
      clearTimeout(timer);
      resolve(address);
    });
    ended.then((code) => reject(new Stop(`The server ended with exit code ${code}.`)));
  });
  return { url, stop };
}

// npm run bench:page: Lighthouse's four categories, then what playback costs, in processor time of the page's thread.
await main(async () => {
  await installDependencies();
  await prepareChromium();
  await buildIfChanged();
  const { url, stop } = await startBuilt();
  try {
    say('Lighthouse, as a phone and as a desk.');
    const scores = await lighthouseScores(`${url}/`, chromiumPath());
    console.table(scores.table);
    for (const line of scores.lost) console.log(`  ${line}`);
    say('Playback: each figure against the picture from above, which removes no wood. Drawing is by the processor here.');
    console.table(await playbackFigures(`${url}/`, chromiumPath()));
  } finally {
    await stop();
  }
  return 0;
});
