import { spawn } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { join } from 'node:path';
import { buildIfChanged } from './setup/build.mjs';
import { installDependencies } from './setup/packages.mjs';
import { ROOT, Stop, main, say } from './setup/run.mjs';

const HOST = '127.0.0.1'; // the demo is for the person at this computer
const PORTS_TRIED = 20;
const DATA = process.env.TALLYRAIL_DATA || join(ROOT, '.data', 'demo');
const ROLE_WORDS = { owner: 'Owner', hand: 'Shop hand', customer: 'Customer' };

/** Made by the server when it first filled this folder. */
const demoSignIns = () => JSON.parse(readFileSync(join(DATA, 'demo-sign-ins.json'), 'utf8'));

/** Whether a port can be listened on. */
function isFree(port) {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once('error', (error) => (error.code === 'EADDRINUSE' ? resolve(false) : reject(error)));
    server.listen({ port, host: HOST }, () => server.close(() => resolve(true)));
  });
}

async function freePort(wanted) {
  for (let port = wanted; port < wanted + PORTS_TRIED; port++) {
    if (await isFree(port)) return port;
    say(`Port ${port} is taken; trying ${port + 1}.`);
  }
  throw new Stop(`No port from ${wanted} to ${wanted + PORTS_TRIED - 1} is free. Name another: PORT=8080 npm start`);
}

/** Waits until the server answers, or ends. */
async function untilItAnswers(address, server) {
  while (server.exitCode === null && server.signalCode === null) {
    try {
      await fetch(`${address}/api/openapi.json`);
      return true;
    } catch (error) {
      if (error.cause?.code !== 'ECONNREFUSED') throw error;
      await new Promise((resolve) => setTimeout(resolve, 50));
    }
  }
  return false;
}

// npm start: the demo on this computer, from a clone with nothing installed to a page that works.
await main(async () => {
  const wanted = Number(process.env.PORT || 3000);
  if (!Number.isInteger(wanted) || wanted < 1 || wanted > 65535) throw new Stop(`PORT is ${process.env.PORT}. Use a number from 1 to 65535.`);
  await installDependencies();
  await buildIfChanged();
  const port = await freePort(wanted);
  const address = `http://${HOST}:${port}`;
  const server = spawn(process.execPath, [join(ROOT, '.output/server/index.mjs')], {
    cwd: ROOT,
    stdio: ['ignore', 'ignore', 'inherit'],
    env: {
      ...process.env,
      NODE_ENV: 'production',
      NITRO_HOST: HOST,
      NITRO_PORT: String(port),
      TALLYRAIL_DEMO: '1',
      TALLYRAIL_DATA: DATA,
      TALLYRAIL_ORIGIN: address,
    },
  });
  const ended = new Promise((resolve, reject) => {
    server.once('error', reject);
    server.once('exit', (code, signal) => resolve(code ?? (signal === 'SIGTERM' || signal === 'SIGINT' ? 0 : 1)));
  });
  for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => server.kill(signal));
  if (await untilItAnswers(address, server)) {
    console.log(`\nTallyrail is at ${address}`);
    for (const { role, email, password } of demoSignIns()) console.log(`  ${ROLE_WORDS[role]}: ${email}  ${password}`);
    console.log('Stop it with Ctrl+C.\n');
  }
  return ended;
});
