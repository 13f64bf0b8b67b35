import { type H3Event, getRequestHeader, getRequestHost } from 'h3';
import { problem } from '../utils/problem';

const HARMLESS: ReadonlySet<string> = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Refuses what another site made a browser send. Beside the session cookie's SameSite=Lax: a browser says where a
 * request comes from in Sec-Fetch-Site, an older one in Origin; who says neither is no browser and has no cookie to abuse.
 */
export function expectSameSite(event: H3Event): void {
  if (HARMLESS.has(event.method)) return;
  const site = getRequestHeader(event, 'sec-fetch-site');
  const origin = getRequestHeader(event, 'origin');
  const ours = site !== undefined ? site === 'same-origin' || site === 'none' : origin === undefined || hostOf(origin) === getRequestHost(event);
  if (!ours) throw problem(403, 'This request comes from another site. Open Tallyrail itself and try there.');
}

function hostOf(origin: string): string | null {
  return URL.canParse(origin) ? new URL(origin).host : null;
}
