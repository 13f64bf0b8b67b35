import { and, asc, eq, lte } from 'drizzle-orm';
import { mails } from '../db/schema';
import { useDatabase } from '../db/shop';
import { newId } from '../utils/newId';
import { settings } from '../utils/settings';
import type { Letter } from './letters';

/** Pauses until the next try after each that failed, in units of the first; after the last the mail is given up and stays to be seen. */
const PAUSES = [1, 5, 15, 60, 240, 720, 1440] as const;

/** The write that queues a letter: it goes with whatever it tells of, all or nothing. */
export function queued(shopId: string | null, to: string, { subject, text, html }: Letter) {
  const now = new Date();
  return useDatabase().insert(mails).values({ id: newId(), shopId, to, subject, text, html, createdAt: now, nextAt: now });
}

export type QueuedMail = typeof mails.$inferSelect;

/** Mail whose time has come, the oldest first. */
export async function dueMails(limit: number): Promise<QueuedMail[]> {
  return await useDatabase().select().from(mails).where(and(lte(mails.nextAt, new Date()))).orderBy(asc(mails.createdAt)).limit(limit);
}

export async function markSent(mail: QueuedMail): Promise<void> {
  await useDatabase().update(mails).set({ sentAt: new Date(), nextAt: null, attempts: mail.attempts + 1, refusal: null }).where(eq(mails.id, mail.id));
}

export async function markRefused(mail: QueuedMail, refusal: string): Promise<void> {
  const pause = PAUSES[mail.attempts];
  const nextAt = pause === undefined ? null : new Date(Date.now() + pause * settings.TALLYRAIL_MAIL_PAUSE * 1000);
  await useDatabase().update(mails).set({ attempts: mail.attempts + 1, nextAt, refusal: refusal.slice(0, 500) }).where(eq(mails.id, mail.id));
}
