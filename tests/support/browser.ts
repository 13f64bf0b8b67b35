import { existsSync, readFileSync } from 'node:fs';
import { type Browser, type BrowserContext, type BrowserContextOptions, type Locator, type Page, chromium } from 'playwright-core';

const EXECUTABLE = process.env.CHROMIUM_PATH ?? '/usr/bin/chromium';

/** Quiet and offline; no sandbox, since tests may run as root in a container. */
const FLAGS = [
  '--headless=new', '--no-sandbox', '--disable-quic', '--no-first-run', '--disable-background-networking',
  '--disable-component-update', '--disable-sync',
];
/** WebGL drawn by the processor: slow, and the same everywhere. */
const WITH_WEBGL = ['--use-gl=angle', '--use-angle=swiftshader', '--enable-unsafe-swiftshader'];
const WITHOUT_WEBGL = ['--disable-gpu', '--disable-webgl', '--disable-webgl2', '--disable-3d-apis', '--disable-software-rasterizer'];

/**
 * Chromium as the tests use it; an error says how to get it rather than a test being skipped.
 *
 * @param hosts names that lead elsewhere, as Chromium's host rules write them.
 */
export async function launch({ webgl = true, hosts = '' } = {}): Promise<Browser> {
  if (!existsSync(EXECUTABLE)) throw new Error(`There is no Chromium at ${EXECUTABLE}. Run: apt-get install -y chromium, or set CHROMIUM_PATH.`);
  return chromium.launch({ executablePath: EXECUTABLE, args: [...FLAGS, ...(hosts ? [`--host-resolver-rules=${hosts}`] : []), ...(webgl ? WITH_WEBGL : WITHOUT_WEBGL)] });
}

export interface OpenPage {
  readonly page: Page;
  readonly context: BrowserContext;
  /** What the page complained of: errors of the console and uncaught ones. */
  readonly complaints: readonly string[];
}

/** Opens the one-groove page and waits until it answers to keys. */
export async function openPage(browser: Browser, url: string, options: BrowserContextOptions = {}): Promise<OpenPage> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 }, reducedMotion: 'reduce', acceptDownloads: true, ...options });
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on('console', (message) => { if (message.type() === 'error') complaints.push(message.text()); });
  page.on('pageerror', (error) => complaints.push(error.message));
  await page.goto(url);
  await ready(page);
  return { page, context, complaints };
}

/** The drawing is measured only by the browser: once it fills its sheet, the page is alive. */
export async function ready(page: Page): Promise<void> {
  await page.waitForFunction(() => document.documentElement.dataset.ready === 'yes');
}

/** The box of a field, by the field's name. */
export const box = (page: Page, field: string): Locator => page.locator(`[data-size="${field}"] input`).first();

export async function type(page: Page, field: string, text: string): Promise<void> {
  await box(page, field).focus();
  await box(page, field).fill(text);
}

/** Waits until what is typed has been made and read back (or refused). */
export async function settle(page: Page): Promise<void> {
  await page.waitForTimeout(50); // a keystroke reaches the page
  await page.locator('.rail[aria-busy="false"]').waitFor({ state: 'attached' });
}

export const mark = async (page: Page): Promise<string> => ((await page.locator('[data-mark]').textContent()) ?? '').trim();

/** Presses Download and gives what was saved. */
export async function download(page: Page): Promise<{ readonly name: string; readonly bytes: Buffer }> {
  const [saved] = await Promise.all([page.waitForEvent('download'), page.locator('[data-download]').click()]);
  return { name: saved.suggestedFilename(), bytes: readFileSync(await saved.path()) };
}
