import type { H3Event } from 'h3';
import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible';
import { addressOf } from './addressOf';
import { problem } from './problem';
import { settings } from './settings';

const MINUTE = 60; // seconds

const LIMITS = {
  /** A whole minute's share may come at once, as from a script that makes a job's rails. */
  programs: { limiter: new RateLimiterMemory({ points: settings.TALLYRAIL_PROGRAMS_PER_MINUTE, duration: MINUTE }), words: 'programs' },
  signIn: { limiter: new RateLimiterMemory({ points: settings.TALLYRAIL_TRIES, duration: 15 * MINUTE }), words: 'tries to sign in' },
  mail: { limiter: new RateLimiterMemory({ points: settings.TALLYRAIL_TRIES, duration: 15 * MINUTE }), words: 'mails' },
} as const;

/**
 * Counts one try for whoever asks; past their share they are told when to come back.
 *
 * @param whom what is counted, where it is not the caller's network address.
 */
export async function limitRate(event: H3Event, what: keyof typeof LIMITS, whom = addressOf(event.node.req, settings.TALLYRAIL_TRUST_PROXY)): Promise<void> {
  const { limiter, words } = LIMITS[what];
  try {
    await limiter.consume(whom);
  } catch (refusal) {
    if (!(refusal instanceof RateLimiterRes)) throw refusal;
    const seconds = Math.max(1, Math.ceil(refusal.msBeforeNext / 1000));
    throw problem(429, `Too many ${words}. Try again in ${seconds} s.`, { headers: { 'retry-after': String(seconds) } });
  }
}
