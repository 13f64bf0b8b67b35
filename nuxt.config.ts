import { fileURLToPath } from 'node:url';
import { readMigrationFiles } from 'drizzle-orm/migrator';
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
  modules: ['@pinia/nuxt', '@nuxtjs/tailwindcss', 'nuxt-auth-utils', '@nuxt/eslint'],
  css: ['~/assets/css/main.css'],
  dir: { public: 'app/public' },
  devtools: { enabled: false },
  telemetry: { enabled: false },
  compatibilityDate: '2026-11-01',

  app: { head: { htmlAttrs: { lang: 'en' } } },

  // No page needs an account yet, so no visitor is given a session cookie by looking at one.
  auth: { loadStrategy: 'none' },
  runtimeConfig: { session: { name: 'tallyrail' } },

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
  },

  nitro: {
    typescript: { tsConfig: { compilerOptions: exact } },
    // Part of the built server, which runs from any folder.
    virtual: {
      '#migrations': () => `export default ${JSON.stringify(readMigrationFiles({ migrationsFolder: here('./server/db/migrations') }))};`,
    },
  },

  hooks: {
    // Ours answers for /api; Nuxt's own then answers for pages.
    'nitro:config'(config) {
      config.errorHandler = [here('./server/error.ts'), ...[config.errorHandler ?? []].flat()];
    },
  },
});
