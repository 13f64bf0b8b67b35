import type { Day } from '../assembly/calendar';
import { type Milestone, MILESTONES, type Reached, aheadOf, stageOf } from './stages';
import type { StageDates } from './stagesDates';

/** A commission as its dates and its news stand now: no contact and no price is in it, so that the shop hand may see it too. */
export interface CommissionNow {
  readonly id: string;
  readonly name: string;
  readonly cameOn: Day;
  readonly reached: Reached;
  readonly dates: StageDates;
  /** Rails that are still to be cut well. */
  readonly railsLeft: number;
  /** Cuts of it that were spoiled. */
  readonly spoiled: number;
  /** Changes that the customer asked for and nobody has answered. */
  readonly changesAsked: number;
  /** Whether something is still to pay, and whether it was asked for. */
  readonly balance: 'none' | 'toAsk' | 'asked';
  /** Given up or put away: nothing is to be done about it. */
  readonly closed: boolean;
}

/** The milestone that comes next; null once it is delivered. */
export const nextOf = ({ reached }: Pick<CommissionNow, 'reached'>): Milestone | null => MILESTONES.find((milestone) => !reached.has(milestone)) ?? null;

export const count = (n: number, one: string, more = `${one}s`) => `${n} ${n === 1 ? one : more}`;

/** What was done, as a sentence about the past ends. */
const DONE: Readonly<Record<Milestone, string>> = {
  'quoted': 'the quote was sent', 'approved': 'the customer approved', 'deposit paid': 'the deposit was paid', 'wood bought': 'the wood was bought', 'cutting': 'cutting began',
  'assembly': 'the last rail was cut', 'finishing': 'the piece was assembled', 'ready': 'the finish was done', 'delivered': 'the piece was delivered',
};

/** Work that went ahead of what ought to come before it, each in a sentence. */
export function aheadWords({ reached }: Pick<CommissionNow, 'reached'>): string[] {
  const next = nextOf({ reached });
  if (next === null) return [];
  const [first] = aheadOf(reached);
  return first ? [`${DONE[first].charAt(0).toUpperCase()}${DONE[first].slice(1)} before ${DONE[next]}: it stays at "${stageOf(reached)}".`] : [];
}
