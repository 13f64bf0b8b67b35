import { callerOf } from '#server/access/person';
import { removePasskey } from '#server/services/passkeys';
import { problem } from '#server/utils/problem';

/** Takes one of the caller's passkeys away. */
export default defineEventHandler(async (event) => {
  const id = decodeURIComponent(getRouterParam(event, 'id') ?? '');
  if (!(await removePasskey(callerOf(event), id))) throw problem(404, 'You have no such passkey.');
  return { removed: id };
});
