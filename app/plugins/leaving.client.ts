import type { Account } from '~/composables/useAccount';

/** Ends the session of whoever signed out at the bench while there was no network. */
export default defineNuxtPlugin(async () => {
  if (!isLeaving()) return;
  try {
    await call('/api/account/sign-out', { method: 'POST' });
  } catch (error) {
    if (!(error instanceof Error)) throw error;
    return; // still no network: the next page tries again
  }
  noteLeaving(false);
  // The page may have been made for who was still signed in.
  if (useState<Account | null>('account').value?.person) reloadNuxtApp();
});
