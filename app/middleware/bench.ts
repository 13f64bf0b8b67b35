import { openStore } from '~/bench/store';

/**
 * Lets in who works in a shop. Without a network it is the person whose day this tablet keeps; where it keeps none the
 * page says so itself, since there is no page of signing in to go to.
 */
export default defineNuxtRouteMiddleware(async (to) => {
  if (import.meta.server) return;
  const { account, refresh } = useAccount();
  if (!account.value) {
    try {
      await refresh();
    } catch (error) {
      if (!isUnreachable(error)) throw error;
      const kept = isLeaving() ? null : await openStore().readDay();
      account.value = { person: kept && { ...kept.person, email: '' }, demo: kept?.person.demo ?? false, demoMail: false, sendsMail: false };
      return;
    }
  }
  const person = account.value?.person;
  if (!person) return navigateTo({ path: '/sign-in', query: { to: to.fullPath } });
  if (person.role === 'customer') return navigateTo(HOMES.customer);
});
