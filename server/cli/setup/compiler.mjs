import { existsSync, readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { installPackages } from './debian.mjs';
import { answers } from './run.mjs';

/** Where Node.js may have its headers: beside itself (a tarball, NodeSource) or where Debian puts them. */
const PREFIXES = () => [process.env.npm_config_nodedir, dirname(dirname(process.execPath)), '/usr'].filter(Boolean);

/** The prefix whose headers are those of the Node.js that runs this, or null. */
function headersPrefix() {
  const [major, minor] = process.versions.node.split('.');
  return PREFIXES().find((prefix) => {
    const file = join(prefix, 'include/node/node_version.h');
    if (!existsSync(file)) return false;
    const text = readFileSync(file, 'utf8');
    const defined = (name) => new RegExp(`#define ${name} (\\d+)`).exec(text)?.[1];
    return defined('NODE_MAJOR_VERSION') === major && defined('NODE_MINOR_VERSION') === minor;
  }) ?? null;
}

/**
 * What better-sqlite3 is compiled with where no prebuilt binary can be had: checked, and installed where we may,
 * before npm finds out. Windows and macOS have prebuilt binaries, and other ways to install a compiler.
 *
 * @returns the environment npm needs to find Node.js's headers without a download
 */
export async function prepareCompiler() {
  if (process.platform !== 'linux') return {};
  const missing = [
    ...(answers('g++') || answers('c++') ? [] : ['g++']),
    ...(answers('make') ? [] : ['make']),
    ...(answers('python3') ? [] : ['python3']),
    ...(headersPrefix() ? [] : ['libnode-dev']),
  ];
  if (missing.length > 0) await installPackages('The database driver may have to be compiled, and that needs more than is here', missing);
  const prefix = headersPrefix();
  return prefix ? { npm_config_nodedir: prefix } : {};
}
