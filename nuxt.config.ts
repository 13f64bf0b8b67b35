import { fileURLToPath } from 'node:url';
import { readMigrationFiles } from 'drizzle-orm/migrator';
import { THEME_SCRIPT } from './app/utils/themeScript';
import { offline } from './server/offline/worker';
import { CONTENT_SECURITY_POLICY, SECURITY_HEADERS } from './server/security/headers';

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url));

/** Beyond `strict`, everywhere. */
const compilerOptions = {
  noUncheckedIndexedAccess: true,
  noImplicitOverride: true,
  noFallthroughCasesInSwitch: true,
};
/** Also outside the app, where templates pass `undefined` for a prop that is left out. */
const exact = { ...compilerOptions, exactOptionalPropertyTypes: true };

export default defineNuxtConfig({
  modules: ['@pinia/nuxt', '@nuxtjs/tailwindcss', 'nuxt-auth-utils', '@nuxt/eslint', '@vite-pwa/nuxt'],
  css: ['~/assets/css/main.css'],
  dir: { public: 'app/public' },
  devtools: { enabled: false },
  telemetry: { enabled: false },
  compatibilityDate: '2026-11-01',

  app: { head: { htmlAttrs: { lang: 'en' }, script: [{ innerHTML: THEME_SCRIPT }] } },

  // Our own /api/account says who is signed in; a visitor is given no session cookie by looking at a page.
  auth: { loadStrategy: 'none', webAuthn: true },
  // Whether the cookie may travel without https is decided for each session (server/access/person.ts).
  runtimeConfig: { session: { name: 'tallyrail', maxAge: 60 * 60 * 24 * 30, cookie: { sameSite: 'lax', httpOnly: true, secure: false } } },

  // Pages behind a link are fetched by whoever reaches for it, not by everyone who sees it.
  // No page is made ahead of being asked for and no route has rules that a browser must know, so it carries no code for either.
  experimental: { appManifest: false, checkOutdatedBuildInterval: false, navigationRepaint: false, payloadExtraction: false, defaults: { nuxtLink: { prefetchOn: { visibility: false, interaction: true } } } },

  // TresJS draws its own elements; only its canvas is a component.
  vue: {
    compilerOptions: {
      isCustomElement: (tag) => (tag.startsWith('Tres') && tag !== 'TresCanvas') || tag === 'primitive',
    },
  },

  typescript: {
    strict: true,
    tsConfig: { compilerOptions },
    sharedTsConfig: { compilerOptions: exact },
    nodeTsConfig: { compilerOptions: exact },
  },

  eslint: { config: { stylistic: false } },

  routeRules: {
    '/**': { headers: { ...SECURITY_HEADERS, 'content-security-policy': CONTENT_SECURITY_POLICY } },
    '/api/**': { headers: { 'cache-control': 'no-store' } },
    // The bench is the same page for everyone until its scripts run, so that a tablet can keep it without keeping anybody's day in it.
    '/bench': { ssr: false },
    '/bench/**': { ssr: false },
    '/bench-worker.js': { headers: { 'cache-control': 'no-cache' } },
  },

  pwa: offline.options,

  // Nuxt's own data fetching is made at load by calls that look as if they did something: without use, without weight.
  vite: {
    define: { __VUE_OPTIONS_API__: 'false' }, // no component here, or in a package of ours, is written that way
    build: { rollupOptions: { treeshake: { moduleSideEffects: (id) => !/nuxt\/dist\/app\/composables\/(asyncData|fetch|component|preview)\.js/.test(id) } } } ,
  },

  nitro: {
    // Scripts and styles lie compressed beside the plain ones; pages are compressed by server/plugins/compress.ts.
    compressPublicAssets: { gzip: true, brotli: true },
    // pdfkit has an older one of its own: beside it as packages the two would be mixed up in the built server.
    externals: { inline: ['@noble/hashes'] },
    typescript: { tsConfig: { compilerOptions: exact } },
    // Part of the built server, which runs from any folder.
    virtual: {
      '#migrations': () => `export default ${JSON.stringify(readMigrationFiles({ migrationsFolder: here('./server/db/migrations') }))};`,
    },
  },

  hooks: {
    // What a page only fetches when it is asked for is not fetched before: most visitors ask for little of it.
    'build:manifest'(manifest) {
      offline.note(manifest);
      for (const chunk of Object.values(manifest)) chunk.prefetch = false;
      // These stand in the page as it comes; their code is fetched by the first touch (useTouched), or never.
      const part = (path: string) => Object.values(manifest).find(({ src }) => src?.endsWith(path));
      const needed = new Set(['pages/index.vue', 'Rail/RailSheets.vue'].flatMap((path) => part(path)?.imports ?? []));
      for (const path of ['Program/ProgramSetupSheet.vue', 'Program/ProgramPanel.vue', 'Readback/ReadbackPanel.vue', 'Settings/SettingsPanel.vue', 'Readback/ReadbackShort.vue', 'Page/PageCautions.vue']) {
        const late = part(path);
        if (!late) continue;
        late.preload = false;
        for (const id of late.imports ?? []) {
          const chunk = manifest[id];
          if (chunk && !chunk.isEntry && !needed.has(id)) chunk.preload = false;
        }
      }
    },
    // Ours answers for /api; Nuxt's own then answers for pages.
    'nitro:config'(config) {
      config.errorHandler = [here('./server/error.ts'), ...[config.errorHandler ?? []].flat()];
    },
  },
});
