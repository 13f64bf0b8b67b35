import { chromium } from 'playwright-core';
import { CHROMIUM_FLAGS } from './playbackFigures.mjs';

const CATEGORIES = ['performance', 'accessibility', 'best-practices', 'seo'];
const PORT = 9555;
/** The aim of every category. */
const AIM = 95;

/** Scores of a page out of 100, and the audits that cost it points. */
export async function lighthouseScores(url, executablePath) {
  const { default: lighthouse, desktopConfig } = await import('lighthouse');
  const browser = await chromium.launch({ executablePath, args: [...CHROMIUM_FLAGS, `--remote-debugging-port=${PORT}`] });
  const table = {};
  const lost = [];
  try {
    for (const [name, config] of [['phone', undefined], ['desk', desktopConfig]]) {
      const result = await lighthouse(url, { port: PORT, output: 'json', logLevel: 'error', onlyCategories: CATEGORIES }, config);
      if (!result) throw new Error('Lighthouse gave no result.');
      const { categories, audits } = result.lhr;
      table[name] = Object.fromEntries(CATEGORIES.map((id) => [id, Math.round((categories[id]?.score ?? 0) * 100)]));
      table[name]['at least'] = AIM;
      for (const id of CATEGORIES) {
        for (const { id: audit, weight } of categories[id]?.auditRefs ?? []) {
          const { score, title, displayValue = '' } = audits[audit] ?? {};
          if (weight > 0 && score !== null && score < 0.9) lost.push(`${name}, ${id}: ${title} ${displayValue} (${Math.round(score * 100)})`);
        }
      }
    }
  } finally {
    await browser.close();
  }
  return { table, lost };
}
