import { keptSecret } from '#server/utils/keptSecret';
import { settings } from '#server/utils/settings';

/** Sessions are sealed with a secret of this installation's own, unless one is given. */
export default defineNitroPlugin(() => {
  process.env.NUXT_SESSION_PASSWORD ||= keptSecret(settings.TALLYRAIL_DATA, 'session-secret');
});
