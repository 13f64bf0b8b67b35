import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { buildIfChanged } from './setup/build.mjs';
import { chromiumPath, prepareChromium, prepareCurl } from './setup/chromium.mjs';
import { count } from './setup/count.mjs';
import { installDependencies } from './setup/packages.mjs';
import { Stop, main, mustRun, runTool, say } from './setup/run.mjs';

async function runVitest(args) {
  const folder = mkdtempSync(join(tmpdir(), 'tallyrail-'));
  const file = join(folder, 'report.json');
  try {
    const code = await runTool('vitest/vitest.mjs', ['run', '--reporter=default', '--reporter=json', `--outputFile.json=${file}`, ...args], {
      env: { CHROMIUM_PATH: chromiumPath() },
    });
    if (!existsSync(file)) throw new Stop(`vitest ended with exit code ${code} and left no report.`);
    const counted = count(JSON.parse(readFileSync(file, 'utf8')), console.error);
    // An error outside every test fails the run though no test did.
    return code !== 0 && counted.failed === 0 ? { ...counted, failed: 1 } : counted;
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** A check beside the tests: one that fails counts as one failed. */
async function check(what, script, args) {
  say(`${what}.`);
  const code = await runTool(script, args);
  if (code !== 0) console.error(`${what}: failed.`);
  return code === 0 ? 0 : 1;
}

// npm test: lint, types, build and every test. The last line printed is the count.
await main(async () => {
  let total = { passed: 0, failed: 1 };
  try {
    await installDependencies();
    await prepareChromium();
    await prepareCurl();
    await mustRun('nuxt prepare', process.execPath, ['node_modules/nuxt/bin/nuxt.mjs', 'prepare']);
    const unsound = await check('Lint', 'eslint/bin/eslint.js', ['.', '--max-warnings=0'])
      + await check('Types', 'nuxt/bin/nuxt.mjs', ['typecheck']);
    await buildIfChanged();
    say('Tests.');
    const counted = await runVitest(process.argv.slice(2));
    total = { passed: counted.passed, failed: counted.failed + unsound };
  } finally {
    // Also where something stopped us: its message then follows on stderr, and the count is still the last line of stdout.
    process.once('exit', () => console.log(`${total.passed} passed, ${total.failed} failed`));
  }
  return total.failed === 0 ? 0 : 1;
});
