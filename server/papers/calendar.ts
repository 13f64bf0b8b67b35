import { ICalCalendar, ICalCalendarMethod, ICalEventTransparency } from 'ical-generator';
import { dateOf } from '#shared/assembly/calendar';
import type { FeedDay } from '#shared/commission/stagesFeed';

/** How often a calendar may ask again: stages move a few times a day. */
const EVERY = 3600; // seconds

export interface Feed {
  /** The shop's name, as the calendar is called. */
  readonly name: string;
  readonly days: readonly FeedDay[];
  /** When it was made, milliseconds from 1970: the stamp that RFC 5545 asks of every event. */
  readonly madeAt: number;
}

// eslint-disable-next-line no-control-regex -- RFC 5545, 3.1 and 3.3.11: a text holds no control character but the tab
const CONTROL = /[\u0000-\u0008\u000b-\u001f\u007f]/g;

/** One line of text as a calendar may hold it. */
const plain = (text: string) => text.replace(/[\r\n\t\u2028\u2029]+/g, ' ').replace(CONTROL, '');

/**
 * A shop's calendar feed (RFC 5545): one event a day that takes no time of it. Days are dates without a clock, so that
 * no time zone moves them.
 */
export function calendarText({ name, days, madeAt }: Feed): string {
  const stamp = new Date(madeAt);
  const calendar = new ICalCalendar({ name: plain(name), prodId: { company: 'Tallyrail', product: 'Shop calendar', language: 'EN' }, method: ICalCalendarMethod.PUBLISH, ttl: EVERY });
  for (const { uid, day, summary } of days) {
    calendar.createEvent({
      id: uid, stamp, allDay: true, summary: plain(summary), transparency: ICalEventTransparency.TRANSPARENT,
      start: new Date(`${dateOf(day)}T00:00:00Z`), end: new Date(`${dateOf(day + 1)}T00:00:00Z`), // the end of a date is the day after, RFC 5545, 3.6.1
    });
  }
  return `${calendar.toString()}\r\n`; // every line ends so, the last too: RFC 5545, 3.4
}
