import { existsSync } from 'node:fs';
import { installPackages } from './debian.mjs';
import { Stop, answers } from './run.mjs';

/** Debian's; CHROMIUM_PATH names another. */
export const chromiumPath = () => process.env.CHROMIUM_PATH || '/usr/bin/chromium';

/** The browser the browser tests run in: they are never skipped for want of it. */
export async function prepareChromium() {
  if (existsSync(chromiumPath())) return;
  if (process.env.CHROMIUM_PATH) throw new Stop(`CHROMIUM_PATH names ${process.env.CHROMIUM_PATH}, and nothing is there.`);
  await installPackages('The browser tests need Chromium (or its place in CHROMIUM_PATH)', ['chromium']);
  if (!existsSync(chromiumPath())) throw new Stop(`Chromium is installed but not at ${chromiumPath()}. Give its place in CHROMIUM_PATH.`);
}

/** The README's own request is run as it is printed there. */
export async function prepareCurl() {
  if (!answers('curl')) await installPackages("The README's request is tested with curl", ['curl', 'ca-certificates']);
}
