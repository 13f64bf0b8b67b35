import { isApi } from '#server/utils/isApi';
import { methodsAt } from '#server/openapi/methodsAt';
import { problem } from '#server/utils/problem';

/**
 * Nothing under /api is reached that the API does not say it has. Stands before the routes because Nuxt's page route
 * takes whatever they do not.
 */
export default defineEventHandler((event) => {
  if (!isApi(event.path)) return;
  const methods = methodsAt(getRequestURL(event).pathname);
  if (methods.length === 0) throw problem(404, 'There is nothing at this address. The API is described at /api/openapi.json.');
  const allow = methods.join(', ');
  if (!methods.includes(event.method)) throw problem(405, `Use ${allow} here, not ${event.method}.`, { headers: { allow } });
  if (event.method !== 'OPTIONS') return;
  setResponseHeader(event, 'allow', allow);
  return sendNoContent(event);
});
