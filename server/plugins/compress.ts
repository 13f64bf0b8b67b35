import { gzipSync } from 'node:zlib';

/** Below this the headers outweigh what is saved. */
const LEAST = 1024; // bytes

/** Pages go out compressed to whoever takes gzip; files are compressed at build. */
export default defineNitroPlugin((nitro) => {
  if (import.meta.dev) return;
  nitro.hooks.hook('render:response', (response, { event }) => {
    if (typeof response.body !== 'string' || response.body.length < LEAST) return;
    // The error page is rendered by a request of the server's own, which copies it as text.
    if (event.path.startsWith('/__nuxt_error')) return;
    appendResponseHeader(event, 'vary', 'accept-encoding');
    if (!/\bgzip\b(?!\s*;\s*q=0(?:\.0*)?(?:\s|,|$))/.test(getRequestHeader(event, 'accept-encoding') ?? '')) return;
    setResponseHeader(event, 'content-encoding', 'gzip');
    response.body = gzipSync(response.body);
  });
});
