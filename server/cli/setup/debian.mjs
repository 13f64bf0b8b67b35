import { existsSync } from 'node:fs';
import { Stop, answers, mustRun, say } from './run.mjs';

const asRoot = () => process.getuid?.() === 0;
const onDebian = () => existsSync('/etc/debian_version') && answers('apt-get');

let listed = false;

/** Installs Debian packages where we may; otherwise stops with the one line that does. */
export async function installPackages(why, packages) {
  const line = `apt-get update && apt-get install -y --no-install-recommends ${packages.join(' ')}`;
  if (!onDebian()) throw new Stop(`${why}. Install what your system calls: ${packages.join(', ')}. On Debian, as root:\n\n  ${line}\n`);
  if (!asRoot()) throw new Stop(`${why}. Run this once, as root:\n\n  ${line}\n`);
  say(`${why}: installing ${packages.join(', ')}.`);
  const env = { DEBIAN_FRONTEND: 'noninteractive' };
  if (!listed) await mustRun('apt-get update', 'apt-get', ['update', '-qq'], { env });
  listed = true;
  await mustRun('apt-get install', 'apt-get', ['install', '-y', '-qq', '--no-install-recommends', ...packages], { env });
}
