import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { prepareCompiler } from './compiler.mjs';
import { ROOT, Stop, mustRun, say } from './run.mjs';

const OLDEST = [20, 19]; // package.json's engines

const lockedPackages = (file) => JSON.parse(readFileSync(join(ROOT, file), 'utf8')).packages;

/** Whether node_modules holds what package-lock.json asks for; npm writes its own account there when it is done. */
function areInstalled() {
  if (!existsSync(join(ROOT, 'node_modules/.package-lock.json'))) return false;
  const installed = lockedPackages('node_modules/.package-lock.json');
  return Object.entries(lockedPackages('package-lock.json')).every(([path, { version, optional, devOptional, link }]) =>
    path === '' || link || (installed[path]?.version === version) || ((optional || devOptional) && !installed[path]));
}

/** Whether the database driver's binary is there and fits this Node.js. */
function driverLoads() {
  const check = "new (require('better-sqlite3'))(':memory:').close()";
  return spawnSync(process.execPath, ['-e', check], { cwd: ROOT, stdio: 'ignore' }).status === 0;
}

/** npm as it called us, or the one on the path. */
async function npm(args, env) {
  const { npm_execpath: script } = process.env;
  const [command, first] = script?.endsWith('.js') ? [process.execPath, [script]] : ['npm', []];
  await mustRun(`npm ${args[0]}`, command, [...first, ...args], { env, shell: command === 'npm' && process.platform === 'win32' });
}

/** Brings node_modules to package-lock.json, and does nothing where it is there already. */
export async function installDependencies() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major < OLDEST[0] || (major === OLDEST[0] && minor < OLDEST[1])) {
    throw new Stop(`Tallyrail needs Node.js ${OLDEST.join('.')} or later; this is ${process.versions.node}.`);
  }
  const fits = areInstalled();
  if (fits && driverLoads()) return;
  const env = await prepareCompiler();
  if (fits) {
    say('Building the database driver for this Node.js.');
    await npm(['rebuild', 'better-sqlite3'], env);
  } else {
    say('Installing packages with npm ci; the first time takes some minutes.');
    await npm(['ci', '--no-audit', '--no-fund', '--loglevel=error'], env);
  }
  if (!driverLoads()) throw new Stop('better-sqlite3 is installed but does not load. Delete node_modules and try again; the messages above say more.');
}
