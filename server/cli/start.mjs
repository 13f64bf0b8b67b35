import { spawn } from 'node:child_process';
import { readFileSync } from 'node:fs';
import http from 'node:http';
import https from 'node:https';
import { createServer } from 'node:net';
import { join } from 'node:path';
import { networkAddresses } from './setup/certificate.mjs';
import { buildIfChanged } from './setup/build.mjs';
import { installDependencies } from './setup/packages.mjs';
import { ROOT, Stop, main, say } from './setup/run.mjs';

const HTTPS = process.argv.includes('--https');
const HOST = HTTPS ? '0.0.0.0' : '127.0.0.1'; // the demo is for the person at this computer, unless they ask for the shop's network
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

/** Whether the server answers. Its certificate is our own, made a moment ago: this one question needs no proof of it. */
function asks(port) {
  return new Promise((resolve, reject) => {
    const { get } = HTTPS ? https : http;
    get({ host: '127.0.0.1', port, path: '/api/account', rejectUnauthorized: false }, (answer) => {
      answer.resume();
      answer.once('end', () => resolve(true));
    }).once('error', (error) => (error.code === 'ECONNREFUSED' ? resolve(false) : reject(error)));
  });
}

/** Waits until the server answers, or ends. */
async function untilItAnswers(port, server) {
  while (server.exitCode === null && server.signalCode === null) {
    if (await asks(port)) return true;
    await new Promise((resolve) => setTimeout(resolve, 50));
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
  const certificate = HTTPS ? await (await import('./setup/certificate.mjs')).shopCertificate(DATA) : null;
  const [network = '127.0.0.1'] = HTTPS ? networkAddresses() : [];
  const address = `${HTTPS ? 'https' : 'http'}://${network}:${port}`;
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
      ...(certificate && { NITRO_SSL_CERT: certificate.cert, NITRO_SSL_KEY: certificate.key }),
    },
  });
  const ended = new Promise((resolve, reject) => {
    server.once('error', reject);
    server.once('exit', (code, signal) => resolve(code ?? (signal === 'SIGTERM' || signal === 'SIGINT' ? 0 : 1)));
  });
  for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => server.kill(signal));
  if (await untilItAnswers(port, server)) {
    console.log(`\nTallyrail is at ${address}`);
    for (const { role, email, password } of demoSignIns()) console.log(`  ${ROLE_WORDS[role]}: ${email}  ${password}`);
    if (certificate) {
      console.log(`\nThis certificate is the shop's own: ${certificate.certFile}`);
      console.log('Copy it to each tablet and install it there as a trusted authority, then open the address above.');
      console.log('Only do so on a network you trust: whoever can reach this address can try to sign in.');
    }
    console.log('Stop it with Ctrl+C.\n');
  }
  return ended;
});
