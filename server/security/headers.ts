/**
 * Headers of every answer, files and errors included. Left out on purpose: HSTS and upgrade-insecure-requests (a shop
 * may serve its own network over plain HTTP) and access-control-allow-origin (no other site has business here).
 */
export const SECURITY_HEADERS = {
  'x-content-type-options': 'nosniff',
  'referrer-policy': 'same-origin',
  'cross-origin-resource-policy': 'same-origin',
  'permissions-policy': 'camera=(), geolocation=(), microphone=(), payment=(), usb=()',
  'x-frame-options': 'DENY', // frame-ancestors for browsers that do not know it
} as const;

/** What a page may load: its own files, pictures and workers it makes itself, styles set by its own components. */
const DIRECTIVES = [
  "default-src 'self'",
  "base-uri 'none'",
  "object-src 'none'",
  "frame-ancestors 'none'",
  "form-action 'self'",
  "img-src 'self' data: blob:",
  "font-src 'self'",
  "connect-src 'self'",
  "worker-src 'self' blob:",
  "style-src 'self' 'unsafe-inline'", // style attributes written by Vue
];

/** For everything that runs no inline script. */
export const CONTENT_SECURITY_POLICY = [...DIRECTIVES, "script-src 'self'"].join('; ');

/** For the development server, whose scripts are written into the page, reloaded and evaluated. */
export const DEVELOPMENT_POLICY = [...DIRECTIVES, "script-src 'self' 'unsafe-inline' 'unsafe-eval'"].join('; ').replace("connect-src 'self'", "connect-src 'self' ws: wss:");

/** For a page: its inline scripts carry the nonce made for this one answer. */
export function pagePolicy(nonce: string): string {
  return [...DIRECTIVES, `script-src 'self' 'nonce-${nonce}'`].join('; ');
}
