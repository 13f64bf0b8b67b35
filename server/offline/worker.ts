import type { ModuleOptions } from '@vite-pwa/nuxt';

// The service worker of the bench: what a tablet keeps so that the bench opens without a network.

/** One file of the built page, as the build lists it. */
interface BuiltPart {
  readonly file: string;
  readonly src?: string | undefined;
  readonly isEntry?: boolean | undefined;
  readonly imports?: readonly string[] | undefined;
  readonly dynamicImports?: readonly string[] | undefined;
  readonly css?: readonly string[] | undefined;
  readonly assets?: readonly string[] | undefined;
}
export type BuiltParts = Readonly<Record<string, BuiltPart>>;

/** Roots of what the bench needs: its pages, its layout and middleware, and what every page begins with. */
const ROOTS = /(?:^|\/)(?:app\/)?(?:pages\/bench\/|layouts\/bench\.vue|middleware\/bench\.ts|bench\/)/;
/** Started by address and so no import of any file; named after its source. */
const WORKER = /^_nuxt\/watchWorker-[\w-]+\.js$/;
/** Which routes the page knows: fetched by the router when it moves on. */
const ROUTES = /^_nuxt\/builds\/meta\//;

/** Files that the bench loads, from the build's own list: entry, bench pages, and all that these import. */
export function benchFiles(parts: BuiltParts): ReadonlySet<string> {
  const files = new Set<string>();
  const seen = new Set<string>();
  const isRoot = (key: string, part: BuiltPart) => part.isEntry === true || ROOTS.test(part.src ?? key);
  const take = (key: string, lazy: boolean) => {
    const part = parts[key];
    if (!part || seen.has(key)) return;
    seen.add(key);
    for (const file of [part.file, ...(part.css ?? []), ...(part.assets ?? [])]) files.add(`_nuxt/${file}`);
    for (const next of part.imports ?? []) take(next, false);
    // The entry imports every page lazily: only a bench part's own lazy parts are the bench's.
    if (lazy) for (const next of part.dynamicImports ?? []) take(next, true);
  };
  for (const [key, part] of Object.entries(parts)) if (isRoot(key, part)) take(key, part.isEntry !== true);
  return files;
}

let files: ReadonlySet<string> = new Set();

const revision = String(Date.now()); // of the bench's page, which the server renders: each build has its own

const options: Partial<ModuleOptions> = {
  strategies: 'generateSW',
  filename: 'bench-worker.js',
  scope: '/bench',
  injectRegister: false,
  client: { registerPlugin: false },
  manifestFilename: 'bench.webmanifest',
  manifest: {
    name: 'Tallyrail bench', short_name: 'Bench', description: 'Today at the router', start_url: '/bench', scope: '/bench', display: 'standalone',
    background_color: '#D6DCE0', theme_color: '#D6DCE0', icons: [{ src: '/favicon.svg', sizes: 'any', type: 'image/svg+xml' }],
  },
  workbox: {
    globPatterns: ['_nuxt/**/*.{js,css,woff2,json}', 'favicon.svg'],
    additionalManifestEntries: [{ url: '/bench', revision }],
    navigateFallback: '/bench',
    navigateFallbackAllowlist: [/^\/bench(?:[/?]|$)/],
    skipWaiting: true, // a tablet whose bench is never closed would keep an old page for ever
    clientsClaim: true,
    cleanupOutdatedCaches: true,
    inlineWorkboxRuntime: true,
    sourcemap: false,
    manifestTransforms: [(entries) => {
      const wanted = entries.filter(({ url }) => files.has(url) || WORKER.test(url) || ROUTES.test(url) || !url.startsWith('_nuxt/'));
      const kept = wanted.filter(({ url }, i) => wanted.findIndex((other) => other.url === url) === i); // the web manifest is listed twice
      return { manifest: kept, warnings: kept.length < 10 ? ['The bench has hardly any files: is the list of the build empty?'] : [] };
    }],
  },
};

/** For nuxt.config.ts: the module's options, and the hook that tells which files are the bench's. */
export const offline = {
  options,
  note(parts: BuiltParts): void {
    files = benchFiles(parts);
  },
};
