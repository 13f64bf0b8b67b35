import { type H3Event, getRequestURL } from 'h3';
import { problem } from './problem';
import { settings } from './settings';

export const sendsMail = settings.TALLYRAIL_DEMO || (settings.TALLYRAIL_SMTP_URL !== undefined && settings.TALLYRAIL_ORIGIN !== undefined);

/**
 * Where links in mails lead. Never what a request says in live mode: a made-up Host header would send somebody's
 * secret to its maker.
 */
export function siteOf(event: H3Event): { readonly origin: string } {
  if (!sendsMail) throw problem(503, 'This installation sends no mail yet, and this needs it. Whoever runs it sets TALLYRAIL_SMTP_URL and TALLYRAIL_ORIGIN.');
  return { origin: settings.TALLYRAIL_ORIGIN ?? getRequestURL(event).origin };
}
