import type { H3Event } from 'h3';
import { problem } from '../utils/problem';

/** A passkey's challenge is answered within this, or asked for again. */
const LIFETIME = 5 * 60_000; // ms
const MOST = 10_000; // attempts at once: beyond it the oldest go
const challenges = new Map<string, { readonly challenge: string; readonly until: number }>();

/** Keeps what a passkey is asked to sign until its answer comes: in memory, since a restart only means asking again. */
export function storeChallenge(_event: H3Event, challenge: string, attemptId: string): void {
  const now = Date.now();
  for (const [id, { until }] of challenges) {
    if (until > now && challenges.size < MOST) break;
    challenges.delete(id);
  }
  challenges.set(attemptId, { challenge, until: now + LIFETIME });
}

/** The challenge of an attempt, once. */
export function takeChallenge(_event: H3Event, attemptId: string): string {
  const kept = challenges.get(attemptId);
  challenges.delete(attemptId);
  if (!kept || kept.until < Date.now()) throw problem(410, 'That took too long. Try the passkey again.');
  return kept.challenge;
}
