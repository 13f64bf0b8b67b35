import { simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';

/** A mail as the fake server received it. */
export interface ReceivedMail {
  readonly at: Date;
  readonly to: string;
  readonly subject: string;
  readonly text: string;
}

const MOST_KEPT = 200;
const received: ReceivedMail[] = [];

/** A mail server on this computer that keeps what it gets and sends nothing on. Demo and tests only. */
export async function startPostbox(): Promise<{ readonly url: string; readonly stop: () => Promise<void> }> {
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    onData(stream, session, done) {
      simpleParser(stream).then((mail) => {
        received.unshift({
          at: new Date(), subject: mail.subject ?? '', text: mail.text ?? '',
          to: session.envelope.rcptTo.map(({ address }) => address).join(', '),
        });
        received.length = Math.min(received.length, MOST_KEPT);
        done();
      }, done);
    },
  });
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(0, '127.0.0.1', resolve);
  });
  const address = server.server.address();
  const port = typeof address === 'object' && address ? address.port : 0;
  return { url: `smtp://127.0.0.1:${port}`, stop: () => new Promise((resolve) => server.close(() => resolve())) };
}

/** Everything received since the start, the newest first. */
export const receivedMails = (): readonly ReceivedMail[] => received;
