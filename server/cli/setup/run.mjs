import { spawn, spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';

/** The project's folder. */
export const ROOT = fileURLToPath(new URL('../../..', import.meta.url));

/** What a person can put right: printed as it is, without a stack. */
export class Stop extends Error {}

/** One line of progress. */
export function say(line) {
  console.log(`· ${line}`);
}

/** Runs a program in the project's folder, its output shown; resolves to its exit code. */
export function run(command, args, { env = {}, ...options } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { cwd: ROOT, stdio: 'inherit', ...options, env: { ...process.env, NUXT_TELEMETRY_DISABLED: '1', ...env } });
    child.once('error', reject);
    child.once('exit', (code, signal) => resolve(code ?? (signal ? 1 : 0)));
  });
}

/** Runs a program that has to succeed. */
export async function mustRun(what, command, args, options) {
  const code = await run(command, args, options);
  if (code !== 0) throw new Stop(`${what} failed (exit code ${code}); what it said stands above.`);
}

/** Runs a JavaScript program that a package in node_modules brings. */
export function runTool(script, args, options) {
  return run(process.execPath, [`node_modules/${script}`, ...args], options);
}

/** Whether a program is there and answers. */
export function answers(command, args = ['--version']) {
  return spawnSync(command, args, { stdio: 'ignore' }).status === 0;
}

/** Runs a command of ours: a Stop is told in words, anything else with its stack. */
export async function main(work) {
  try {
    process.exitCode = await work();
  } catch (error) {
    if (error instanceof Stop) console.error(`\n${error.message}`);
    else console.error(error);
    process.exitCode = 1;
  }
}
