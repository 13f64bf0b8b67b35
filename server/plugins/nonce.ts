import { randomBytes } from 'node:crypto';
import { DEVELOPMENT_POLICY, pagePolicy } from '#server/security/headers';

/**
 * Gives the scripts Nuxt writes into a page (import map, payload, config) a nonce, and the page a policy that names it.
 * What a component renders stands in `html.body` and gets none, so that no user text can become a script.
 */
export default defineNitroPlugin((nitro) => {
  if (import.meta.dev) {
    // The development server writes scripts of its own into the page after this hook.
    nitro.hooks.hook('render:html', (_html, { event }) => setResponseHeader(event, 'content-security-policy', DEVELOPMENT_POLICY));
    return;
  }
  nitro.hooks.hook('render:html', (html, { event }) => {
    const nonce = randomBytes(16).toString('base64');
    const signed = (parts: string[]) => parts.map((part) => part.replaceAll('<script', `<script nonce="${nonce}"`));
    html.head = signed(html.head);
    html.bodyPrepend = signed(html.bodyPrepend);
    html.bodyAppend = signed(html.bodyAppend);
    setResponseHeader(event, 'content-security-policy', pagePolicy(nonce));
  });
});
