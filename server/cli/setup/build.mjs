import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { ROOT, Stop, runTool, say } from './run.mjs';

/** What the built server is made of. */
const SOURCES = ['app', 'server', 'shared', 'nuxt.config.ts', 'tailwind.config.ts', 'package-lock.json'];
/** Not part of it: it runs the build. */
const APART = join('server', 'cli');

const STAMP = join(ROOT, '.output', 'sources.sha256');

function* filesIn(path) {
  if (path === APART) return;
  const entries = readdirSync(join(ROOT, path), { withFileTypes: true }).sort((a, b) => (a.name < b.name ? -1 : 1));
  for (const entry of entries) {
    if (entry.isDirectory()) yield* filesIn(join(path, entry.name));
    else yield join(path, entry.name);
  }
}

/** One hash of every source's name and content. */
export function sourcesHash() {
  const hash = createHash('sha256').update(process.version);
  for (const source of SOURCES) {
    const files = /\.\w+$/.test(source) ? [source] : filesIn(source);
    for (const file of files) hash.update(`\n${file}\n`).update(readFileSync(join(ROOT, file)));
  }
  return hash.digest('hex');
}

/** Whether .output is made of today's sources. */
export function isBuilt() {
  return existsSync(STAMP) && readFileSync(STAMP, 'utf8') === sourcesHash();
}

/** Builds the server where its sources have changed. */
export async function buildIfChanged() {
  if (isBuilt()) return;
  say('Building; this takes about a minute.');
  const hash = sourcesHash();
  rmSync(STAMP, { force: true });
  const code = await runTool('nuxt/bin/nuxt.mjs', ['build']);
  if (code !== 0) throw new Stop(`The build failed (exit code ${code}); what it said stands above.`);
  writeFileSync(STAMP, hash);
}
