// What each room of the house may not do (see DEVELOPERS.md). ESLint replaces a rule's options where two blocks match
// a file and does not merge them, so each block below repeats what holds for the room around it.

const OUTSIDE = {
  regex: '^(vue|vue-router|nuxt|nitropack|h3|pinia|three|drizzle-orm|better-sqlite3|ofetch|#app|#build|#imports|#server|#components)(/|$)|^(@vue|@vueuse|@nuxt|@nuxtjs|@pinia|@tresjs)/|^node:|^(fs|path|os|crypto|url|util|events|stream|buffer|http|https|net|child_process|process|worker_threads)$',
  message: 'shared/ is pure: no framework, no driver, no Node.js.',
};
const APP_OR_SERVER = { regex: '(^|/)(\\.\\./)+(app|server|tests)/', message: 'shared/ knows neither app nor server nor tests.' };

const MEANT = {
  regex: '(^|/)slot/(plan|entry|lap|layout|path)$|^#shared/program(/|$)|^(\\.\\./)+(shared/)?program(/|$)',
  message: 'The readback reads the file alone: nothing of the plan or the writer may reach it.',
};

const IMPURE = [
  ...['console', 'process', 'window', 'document', 'navigator', 'localStorage', 'sessionStorage', 'fetch', 'crypto', 'performance', 'Buffer', 'global', 'setTimeout', 'setInterval', 'setImmediate', 'queueMicrotask', 'requestAnimationFrame', 'Date'],
].map((name) => ({ name, message: 'shared/ is pure: no clock, no chance, no input or output.' }));

const NO_DEFAULT = { selector: 'ExportDefaultDeclaration', message: 'Name what is exported.' };
const NO_THROW = { selector: 'ThrowStatement', message: 'Bad input becomes a finding or a problem; a broken invariant an assert (shared/assert.ts).' };

const lines = (max) => ['error', { max, skipBlankLines: true, skipComments: true }];

export const restrictions = [
  {
    name: 'tallyrail/shared',
    files: ['shared/**/*.ts'],
    rules: {
      'max-lines': lines(250),
      'no-console': 'error',
      'no-restricted-globals': ['error', ...IMPURE],
      'no-restricted-properties': ['error', { object: 'Math', property: 'random', message: 'shared/ is pure: take a generator.' }],
      'no-restricted-imports': ['error', { patterns: [OUTSIDE, APP_OR_SERVER] }],
      'no-restricted-syntax': ['error', NO_DEFAULT, NO_THROW],
    },
  },
  {
    name: 'tallyrail/shared-assert',
    files: ['shared/assert.ts'],
    rules: { 'no-restricted-syntax': ['error', NO_DEFAULT] },
  },
  {
    name: 'tallyrail/shared-right-half',
    files: ['shared/reader/**/*.ts', 'shared/readback/**/*.ts'],
    rules: { 'no-restricted-imports': ['error', { patterns: [OUTSIDE, APP_OR_SERVER, MEANT] }] },
  },
  { name: 'tallyrail/server', files: ['server/**/*.{ts,mjs}'], rules: { 'max-lines': lines(250) } },
  { name: 'tallyrail/routes', files: ['server/api/**/*.ts'], rules: { 'max-lines': lines(20) } },
  { name: 'tallyrail/pages', files: ['app/pages/**/*.vue'], rules: { 'max-lines': lines(200) } },
  {
    name: 'tallyrail/driver',
    files: ['server/**/*.ts', 'app/**/*.{ts,vue}'],
    ignores: ['server/db/client.ts'],
    rules: {
      'no-restricted-imports': ['error', { patterns: [{ regex: '^better-sqlite3$|^drizzle-orm/better-sqlite3', message: 'Only server/db/client.ts names the driver.' }] }],
    },
  },
];
