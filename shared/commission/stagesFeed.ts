import type { Day } from '../assembly/calendar';
import type { Milestone } from './stages';
import type { CommissionNow } from './stagesNow';

/** A day of the shop's calendar feed. It has no room for a contact or a price: whoever has the feed's address reads it. */
export interface FeedDay {
  /** Stays while the commission and its stage do, so that a calendar moves the day in place of adding another. */
  readonly uid: string;
  readonly day: Day;
  readonly summary: string;
}

/** What of a commission stands in the calendar: the shop's own work. */
const IN_FEED: readonly (readonly [Milestone, string])[] = [['wood bought', 'buy the wood'], ['cutting', 'begin cutting'], ['assembly', 'begin assembly'], ['finishing', 'begin finishing'], ['ready', 'ready'], ['delivered', 'due']];

/** The days of all open commissions that are still to come about, in order. */
export const feedDays = (commissions: readonly CommissionNow[]): FeedDay[] => commissions
  .filter(({ closed }) => !closed)
  .flatMap(({ id, name, reached, dates: { by } }) => IN_FEED.filter(([milestone]) => !reached.has(milestone)).map(([milestone, words]) => ({ uid: `${id}-${milestone.replace(' ', '-')}@tallyrail`, day: by[milestone], summary: `${name}: ${words}` })))
  .sort((a, b) => a.day - b.day || (a.uid < b.uid ? -1 : 1));
