import { methodsOf, routesAt } from '#server/access/table';
import { isApi } from '#server/utils/isApi';
import { problem } from '#server/utils/problem';

/**
 * Nothing under /api is reached that the table of routes does not have. Stands before the routes because Nuxt's page
 * route takes whatever they do not.
 */
export default defineEventHandler((event) => {
  if (!isApi(event.path)) return;
  const routes = routesAt(getRequestURL(event).pathname);
  if (routes.length === 0) throw problem(404, 'There is nothing at this address. The API is described at /api/openapi.json.');
  const allow = methodsOf(routes);
  if (!allow.includes(event.method)) throw problem(405, `Use ${allow.join(', ')} here, not ${event.method}.`, { headers: { allow: allow.join(', ') } });
  if (event.method === 'OPTIONS') {
    setResponseHeader(event, 'allow', allow.join(', '));
    return sendNoContent(event);
  }
  event.context.route = routes.find(({ method }) => method === event.method || (event.method === 'HEAD' && method === 'GET'));
});
