import { type ChildProcess, spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

export const ROOT = fileURLToPath(new URL('../..', import.meta.url));
const ENTRY = join(ROOT, '.output/server/index.mjs');

/** Long enough for a busy machine; a server that is not up by then will not come up. */
const START_TIMEOUT = 30_000; // ms

export interface RunningServer {
  readonly url: string;
  /** Its data: a new folder, deleted when it stops. */
  readonly folder: string;
  readonly process: ChildProcess;
  /** What it wrote to stderr so far. */
  readonly complaints: () => string;
  readonly stop: () => Promise<void>;
}

export const newDataFolder = (): string => mkdtempSync(join(tmpdir(), 'tallyrail-data-'));

/**
 * Starts the built server on a free port, from a folder that is not the project's.
 *
 * @param kept a data folder that outlives the server; without one it gets an empty folder of its own.
 */
export async function startServer(env: Readonly<Record<string, string>> = {}, kept?: string): Promise<RunningServer> {
  const folder = kept ?? newDataFolder();
  const server = spawn(process.execPath, [ENTRY], {
    cwd: folder,
    stdio: ['ignore', 'pipe', 'pipe'],
    env: { ...process.env, NODE_ENV: 'production', NITRO_HOST: '127.0.0.1', NITRO_PORT: '0', TALLYRAIL_DATA: folder, ...env },
  });
  let complaints = '';
  server.stderr.setEncoding('utf8').on('data', (text: string) => (complaints += text));
  const ended = new Promise<void>((resolve) => server.once('exit', () => resolve()));
  const url = await addressOf(server, () => complaints);
  await (await fetch(`${url}/api/account`)).arrayBuffer(); // it listens before the demo is filled, and answers after
  const stop = async () => {
    server.kill('SIGTERM');
    await ended;
    if (kept === undefined) rmSync(folder, { recursive: true, force: true });
  };
  return { url, folder, process: server, complaints: () => complaints, stop };
}

/** The address the server says it listens on. */
function addressOf(server: ChildProcess, complaints: () => string): Promise<string> {
  return new Promise((resolve, reject) => {
    let said = '';
    const timer = setTimeout(() => {
      server.kill('SIGKILL');
      reject(new Error(`The server did not say where it listens. It said: ${said}${complaints()}`));
    }, START_TIMEOUT);
    server.once('error', reject);
    server.once('exit', (code) => {
      clearTimeout(timer);
      reject(new Error(`The server ended with exit code ${code}: ${complaints()}`));
    });
    server.stdout?.setEncoding('utf8').on('data', (text: string) => {
      said += text;
      const address = /Listening on (\S+)/.exec(said)?.[1];
      if (!address) return;
      clearTimeout(timer);
      resolve(address);
    });
  });
}
