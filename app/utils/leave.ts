import type { Account } from '~/composables/useAccount';
import { noteLeaving } from './benchKept';
import { call } from './call';

/** Ends the session of whoever signed out at the bench while there was no network; without one still, the next page tries again. */
export async function leave(account: Account | null): Promise<void> {
  try {
    await call('/api/account/sign-out', { method: 'POST' });
  } catch (error) {
    if (!(error instanceof Error)) throw error;
    return;
  }
  noteLeaving(false);
  // The page may have been made for who was still signed in.
  if (account?.person) window.location.reload();
}
