import type { Config } from 'tailwindcss';

/** Every colour is a material (DESIGN 1.3): the names here are those of app/assets/css/tokens.css and there are no others. */
const materials = [
  'ground', 'ground-hi', 'sheet', 'ink', 'ink-2', 'ink-3', 'rule', 'hair', 'crayon', 'crayon-ink', 'crayon-wash',
  'brass', 'brass-hi', 'brass-ink', 'tape', 'tape-mid', 'tape-wash', 'strip', 'steel', 'steel-hi', 'steel-lo',
] as const;

export default {
  content: ['./app/**/*.{vue,ts}'],
  darkMode: ['selector', '[data-theme="night"]'],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      ...Object.fromEntries(materials.map((name) => [name, `var(--${name})`])),
    },
    fontFamily: { ui: 'var(--ui)', mono: 'var(--mono)' },
    fontSize: {
      cap: ['13px', '1.3'],
      note: ['14px', '1.35'],
      body: ['16px', '1.4'],
      lead: ['20px', '1.4'],
      dim: ['20px', '1'],
      head: ['30px', '1.15'],
      mark: ['42px', '1'],
    },
    borderRadius: { none: '0', DEFAULT: '2px' },
    screens: { sm: '640px', tablet: '800px', desk: '1200px' },
    extend: {
      // A sixteenth of an inch at 96 px/in is 6 px: s1 is one sixteenth, s4 a quarter.
      spacing: { shalf: '3px', s1: '6px', s2: '12px', s3: '18px', s4: '24px', s6: '36px', s8: '48px', s12: '72px', target: '44px' },
      borderWidth: { 3: '3px' }, maxWidth: { read: '66ch', page: '1392px' },
    },
  },
} satisfies Config;
