import { startPostman } from '#server/mail/postman';
import { settings } from '#server/utils/settings';

/** Mail goes out while the server runs: in the demo to a fake on this computer, whatever keys there are. */
export default defineNitroPlugin(async (nitro) => {
  // The fake and what it reads mails with are loaded where they are used.
  const postbox = settings.TALLYRAIL_DEMO ? await (await import('#server/demo/postbox')).startPostbox() : null;
  const url = postbox?.url ?? settings.TALLYRAIL_SMTP_URL;
  if (url === undefined) return;
  const stop = startPostman(url, settings.TALLYRAIL_MAIL_FROM);
  nitro.hooks.hook('close', async () => {
    await stop();
    await postbox?.stop();
  });
});
