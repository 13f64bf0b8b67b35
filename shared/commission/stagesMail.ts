import type { Milestone } from './stages';

/** Stages that a customer may be told of, each as they choose; the rest they bring about themselves. */
export const PROGRESS_MAILS = ['wood bought', 'cutting', 'assembly', 'finishing', 'ready', 'delivered'] as const satisfies readonly Milestone[];
export type ProgressMail = (typeof PROGRESS_MAILS)[number];

/** What is told of each, in words for somebody who is no woodworker. */
export const PROGRESS_WORDS: Readonly<Record<ProgressMail, string>> = {
  'wood bought': 'The wood for your piece is in the shop.',
  'cutting': 'Your rails are on the machine.',
  'assembly': 'All rails are cut. Your piece is being put together.',
  'finishing': 'Your piece is put together. Now it gets its finish, which takes its time to dry.',
  'ready': 'Your piece is ready.',
  'delivered': 'Your piece is delivered. Its care sheet is on its page.',
};

/** Chosen before anybody chooses: what a customer waits for, and no more. */
export const USUAL_PROGRESS_MAILS: readonly ProgressMail[] = ['cutting', 'ready'];

export const wantsMail = (stage: Milestone, chosen: readonly ProgressMail[]): stage is ProgressMail => chosen.some((each) => each === stage);
