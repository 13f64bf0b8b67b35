import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { contrast, luminance } from '../../../app/utils/contrast';
import { ROOT } from '../../support/server';

const css = readFileSync(join(ROOT, 'app/assets/css/tokens.css'), 'utf8');
/** The tokens of one block of the style sheet. */
const tokensIn = (selector: string) => Object.fromEntries(
  [...css.slice(css.indexOf(selector)).split('}')[0]?.matchAll(/--([\w-]+):\s*(#[0-9A-Fa-f]{6})/g) ?? []].map(([, name = '', value = '']) => [name, value]),
);
const day = tokensIn(':root');
const night = { ...day, ...tokensIn('[data-theme="night"]') };

describe('contrast', () => {
  it('is 21 between black and white, 1 between equals, the same both ways, and unknown for what is no colour', () => {
    expect(contrast('#000000', '#FFFFFF')).toBeCloseTo(21, 9);
    expect(contrast('#1B5FA8', '#1B5FA8')).toBe(1);
    expect(contrast('#1B5FA8', '#FFFFFF')).toBe(contrast('#FFFFFF', '#1B5FA8'));
    expect(contrast('#FFFFFF', '#111E2B')).toBeCloseTo(16.88, 2); // worked out by hand in the table of tokens
    expect(luminance('red')).toBeNaN();
  });

  it.each([['day', day], ['night', night]] as const)('%s: words 4.5 to 1 on sheet and ground, lines 3 to 1', (_, tokens) => {
    for (const below of ['sheet', 'ground']) {
      for (const words of ['ink', 'ink-2', 'ink-3', 'crayon-ink', 'tape', 'brass-ink']) expect(contrast(tokens[words] ?? '', tokens[below] ?? ''), `${words} on ${below}`).toBeGreaterThanOrEqual(4.5);
      expect(contrast(tokens.crayon ?? '', tokens[below] ?? ''), `crayon on ${below}`).toBeGreaterThanOrEqual(3);
    }
    expect(contrast(tokens.rule ?? '', tokens.sheet ?? '')).toBeGreaterThanOrEqual(3);
    expect(contrast(tokens['crayon-ink'] ?? '', tokens['crayon-wash'] ?? '')).toBeGreaterThanOrEqual(4.5);
    expect(contrast(tokens.ink ?? '', tokens['tape-wash'] ?? '')).toBeGreaterThanOrEqual(4.5);
  });
});
