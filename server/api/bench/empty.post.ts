import { problem } from '#server/utils/problem';
import { settings } from '#server/utils/settings';

/** What a request costs before any work is done: the benches compare with it. Not there otherwise. */
export default defineEventHandler(() => {
  if (!settings.TALLYRAIL_BENCH) throw problem(404, 'There is nothing at this address.');
  return {};
});
