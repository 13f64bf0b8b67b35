import { isApi } from '#server/utils/isApi';

/**
 * HEAD under /api is GET without the body, which Node.js leaves out by itself (RFC 9110, 9.3.2). Said before anything
 * else asks for the method: h3 remembers its first answer.
 */
export default defineNitroPlugin((nitro) => {
  nitro.hooks.hook('request', ({ path, node: { req } }) => {
    if (req.method === 'HEAD' && isApi(path)) req.method = 'GET';
  });
});
