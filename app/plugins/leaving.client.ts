import { isLeaving } from '~/utils/leaving';

/** Somebody signed out at the bench while there was no network: their session ends now. Nearly nobody did, so the code for it comes only then. */
export default defineNuxtPlugin(async () => {
  if (!isLeaving()) return;
  const { leave } = await import('~/utils/leave');
  await leave(useAccount().account.value);
});
