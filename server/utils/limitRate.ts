import type { H3Event } from 'h3';
import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible';
import { addressOf } from './addressOf';
import { problem } from './problem';
import { settings } from './settings';

const WINDOW = 60; // seconds; a whole minute's share may come at once, as from a script that makes a job's rails

const programs = new RateLimiterMemory({ points: settings.TALLYRAIL_PROGRAMS_PER_MINUTE, duration: WINDOW });

/** Counts one program for whoever asks; past their share they are told when to come back. */
export async function limitRate(event: H3Event): Promise<void> {
  try {
    await programs.consume(addressOf(event.node.req, settings.TALLYRAIL_TRUST_PROXY));
  } catch (refusal) {
    if (!(refusal instanceof RateLimiterRes)) throw refusal;
    const seconds = Math.max(1, Math.ceil(refusal.msBeforeNext / 1000));
    throw problem(429, `Too many programs from this address. Try again in ${seconds} s.`, { headers: { 'retry-after': String(seconds) } });
  }
}
