import { chromium } from 'playwright-core';

export const CHROMIUM_FLAGS = ['--headless=new', '--no-sandbox', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync'];
const WITH_WEBGL = ['--use-gl=angle', '--use-angle=swiftshader', '--enable-unsafe-swiftshader'];
const WITHOUT_WEBGL = ['--disable-gpu', '--disable-3d-apis', '--disable-software-rasterizer'];

const PLAY_MS = 6000;
const SEEKS = 20;
const LOOP_MS = 60_000;

/** The page's address for a drawing: what app/utils/link.ts writes. */
const linkOf = (texts, picks) => `#1.${Buffer.from(JSON.stringify([1, [1, 2], Object.entries(texts), Object.entries(picks)])).toString('base64url')}`;

/** Near the most blocks a program may have: round ends as fine chords, many laps, many passes. */
const HEAVY = linkOf({ l: '100', m: '0.875', w: '1', d: '0.5', rw: '2', rt: '0.75', b: '0.25', s: '0.0417', cl: '1', ot: '0.000001' }, { E: 'round' });

/** Milliseconds of processor time that the page's thread has spent in scripts, and bytes of heap after collecting. */
async function meter(page) {
  const client = await page.context().newCDPSession(page);
  await client.send('Performance.enable', { timeDomain: 'threadTicks' });
  return {
    script: async () => {
      const { metrics } = await client.send('Performance.getMetrics');
      return (metrics.find(({ name }) => name === 'ScriptDuration')?.value ?? 0) * 1000;
    },
    heap: async () => {
      await client.send('HeapProfiler.collectGarbage');
      await client.send('HeapProfiler.collectGarbage');
      return (await client.send('Runtime.getHeapUsage')).usedSize;
    },
  };
}

async function openAtCut(browser, address, solid) {
  const page = await browser.newPage({ viewport: { width: 1440, height: 900 } });
  await page.goto(address);
  await page.waitForFunction(() => document.documentElement.dataset.ready === 'yes');
  await page.locator('.rail[aria-busy="false"]').waitFor({ state: 'attached', timeout: 120_000 });
  await page.locator('.play').scrollIntoViewIfNeeded();
  await page.getByRole('slider', { name: 'Time in the program' }).first().waitFor();
  if (solid) await page.locator('canvas').first().waitFor({ timeout: 120_000 });
  return page;
}

/** Script per frame while playing at 20 times. */
async function perFrame(page, { script }) {
  await page.getByRole('button', { name: '20 times as fast' }).click();
  await page.getByRole('button', { name: 'Play', exact: true }).click();
  await page.waitForTimeout(500);
  await page.evaluate(() => {
    window.framesSeen = 0;
    const count = () => { window.framesSeen += 1; requestAnimationFrame(count); };
    requestAnimationFrame(count);
  });
  const before = await script();
  const first = await page.evaluate(() => window.framesSeen);
  // The sample runs a minute: at 20 times it ends within the measure, so it is sent back.
  for (let gone = 0; gone < PLAY_MS; gone += 1500) {
    await page.waitForTimeout(1500);
    const again = page.getByRole('button', { name: 'Play', exact: true });
    if (await again.count()) await again.first().click();
  }
  const frames = (await page.evaluate(() => window.framesSeen)) - first;
  return { ms: ((await script()) - before) / frames, frames };
}

/** Script for one jump to anywhere, until it is drawn. */
async function perSeek(page, { script }) {
  const slider = page.getByRole('slider', { name: 'Time in the program' }).first();
  const seek = (share) => slider.evaluate(async (input, to) => {
    input.value = String(Number(input.max) * to);
    input.dispatchEvent(new Event('input', { bubbles: true }));
    await new Promise((resolve) => requestAnimationFrame(() => requestAnimationFrame(resolve)));
  }, share);
  await seek(0.5);
  const before = await script();
  for (let i = 0; i < SEEKS; i++) await seek(((i * 7) % SEEKS) / SEEKS);
  return ((await script()) - before) / SEEKS;
}

/** Heap at the end of a minute of loops at 60 times, against its size after the first seconds. */
async function overLoops(page, { heap }) {
  await page.getByRole('button', { name: '60 times as fast' }).click();
  const loop = async (ms) => {
    for (const until = Date.now() + ms; Date.now() < until;) {
      const again = page.getByRole('button', { name: 'Play', exact: true });
      if (await again.count()) await again.first().click();
      await page.waitForTimeout(250);
    }
  };
  await loop(LOOP_MS / 6);
  const first = await heap();
  await loop(LOOP_MS);
  return { first, last: await heap() };
}

/** What playback costs with removal, and on the same page without. */
export async function playbackFigures(url, executablePath) {
  const table = {};
  for (const [name, flags, solid] of [['in 3D, with removal', WITH_WEBGL, true], ['from above, without', WITHOUT_WEBGL, false]]) {
    const browser = await chromium.launch({ executablePath, args: [...CHROMIUM_FLAGS, ...flags] });
    try {
      const page = await openAtCut(browser, url, solid);
      const meters = await meter(page);
      const { ms, frames } = await perFrame(page, meters);
      const { first, last } = await overLoops(page, meters);
      await page.close();
      const heavy = await openAtCut(browser, `${url}${HEAVY}`, solid);
      const seek = await perSeek(heavy, await meter(heavy));
      const round = (value, to = 100) => Math.round(value * to) / to;
      table[name] = {
        'script per frame at 20×, ms': round(ms), 'at most': 4, frames,
        'script per jump, heavy program, ms': round(seek), 'at most ': 50,
        'heap after a minute of loops, MB': round(last / 1e6), 'against the start of it': round(last / first, 1000),
      };
    } finally {
      await browser.close();
    }
  }
  return table;
}
