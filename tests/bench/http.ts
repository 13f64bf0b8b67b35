import autocannon from 'autocannon';
import { startServer } from '../support/server';

const SPEC = {
  units: 'in', length: 24.5, width: 0.375, depth: 0.1875, stopMargin: 0.875, bitDiameter: 0.25, stepdown: 3 / 32,
  railWidth: 1.25, spindleSpeed: 16000, feed: 100, plungeFeed: 25, wood: 'white-oak',
};

const SECONDS = 6;

/** Requests per second for a whole program, readback and all, as a share of those for a route that does nothing. */
export async function benchHttp(): Promise<Record<string, number>> {
  const server = await startServer({ TALLYRAIL_BENCH: '1', TALLYRAIL_PROGRAMS_PER_MINUTE: '100000000' });
  const perSecond = async (path: string, body: unknown): Promise<number> => {
    const run = await autocannon({
      url: server.url + path, method: 'POST', body: JSON.stringify(body), headers: { 'content-type': 'application/json' }, connections: 8, duration: SECONDS,
    });
    if (run.non2xx > 0 || run.errors > 0) throw new Error(`${path}: ${run.non2xx} answers were no success, ${run.errors} failed`);
    return run.requests.average;
  };
  try {
    await perSecond('/api/programs', SPEC); // warm-up
    const empty = await perSecond('/api/bench/empty', {});
    const programs = await perSecond('/api/programs', SPEC);
    return { 'empty route, per second': Math.round(empty), 'programs, per second': Math.round(programs), 'ratio': Math.round((programs / empty) * 1000) / 1000, 'at least': 0.1 };
  } finally {
    await server.stop();
  }
}
