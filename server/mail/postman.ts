import { createTransport } from 'nodemailer';
import { dueMails, markRefused, markSent } from './queue';

/** How often the queue is looked at: a mail that somebody waits for goes out within this. */
const EVERY = 1000; // ms
const AT_ONCE = 20; // mails in one look: the rest wait for the next
const PATIENCE = 20_000; // ms a mail server may take to answer

/**
 * Sends what is queued through a mail server, until stopped. A server that is down, or refuses, costs nobody any time
 * and no mail: each stays queued and is tried again, ever less often.
 */
export function startPostman(smtpUrl: string, from: string): () => Promise<void> {
  const transport = createTransport({ url: smtpUrl, connectionTimeout: PATIENCE, greetingTimeout: PATIENCE, socketTimeout: PATIENCE });
  let stopped = false;
  let timer: NodeJS.Timeout | undefined;
  let round: Promise<void> = Promise.resolve();

  const sendDue = async (): Promise<void> => {
    for (const mail of await dueMails(AT_ONCE)) {
      if (stopped) return;
      try {
        await transport.sendMail({ from, to: mail.to, subject: mail.subject, text: mail.text, html: mail.html, messageId: `<${mail.id}@tallyrail>` });
        await markSent(mail);
      } catch (error) {
        await markRefused(mail, error instanceof Error ? error.message : String(error));
      }
    }
  };
  const next = () => {
    if (stopped) return;
    timer = setTimeout(() => {
      round = sendDue().catch((error: unknown) => console.error('The mail queue cannot be read:', error)).then(next);
    }, EVERY);
  };
  next();
  return async () => {
    stopped = true;
    clearTimeout(timer);
    await round;
    transport.close();
  };
}
