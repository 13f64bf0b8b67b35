import fc from 'fast-check';
import ICAL from 'ical.js';
import { describe, expect, it } from 'vitest';
import { calendarText } from '#server/papers/calendar';
import { dateOf, dayOf } from '#shared/assembly/calendar';
import type { FeedDay } from '#shared/commission/stagesFeed';

const MADE = Date.UTC(2026, 11, 1, 13, 5, 9);
const feed = (days: readonly FeedDay[], name = 'Marrow Creek Joinery') => calendarText({ name, days, madeAt: MADE });
const due: FeedDay = { uid: 'c1-delivered@tallyrail', day: dayOf('2026-12-18') ?? NaN, summary: '42 coins for the day room: due' };

/** Read back by a reader of its own (ical.js): what a calendar would show. */
function readEvents(text: string) {
  return new ICAL.Component(ICAL.parse(text)).getAllSubcomponents('vevent').map((component) => {
    const event = new ICAL.Event(component);
    return { uid: event.uid, summary: event.summary, start: event.startDate.toString(), end: event.endDate.toString(), isDate: event.startDate.isDate, stamp: String(component.getFirstPropertyValue('dtstamp')) };
  });
}

/** RFC 5545, 3.1: a fold is a line break and one blank or tab. */
const unfolded = (text: string) => text.replace(/\r\n[ \t]/g, '').split('\r\n');

describe('the calendar feed', () => {
  it('has what RFC 5545 asks of a calendar and of an event', () => {
    const lines = unfolded(feed([due]));
    // 3.4 and 3.6: one calendar object with VERSION and PRODID; 3.6.1: UID and DTSTAMP, in UTC, in every event; VALUE=DATE for a day.
    expect(lines[0]).toBe('BEGIN:VCALENDAR');
    expect(lines.slice(-2)).toEqual(['END:VCALENDAR', '']);
    for (const line of ['VERSION:2.0', 'UID:c1-delivered@tallyrail', 'DTSTAMP:20261201T130509Z', 'DTSTART;VALUE=DATE:20261218', 'DTEND;VALUE=DATE:20261219', 'TRANSP:TRANSPARENT', 'SUMMARY:42 coins for the day room: due']) expect(lines).toContain(line);
    expect(lines.filter((line) => line.startsWith('PRODID:'))).toHaveLength(1);
  });

  it('is a calendar without an event where nothing is to come', () => {
    // 3.6 asks for one component at least; readers take none for an empty calendar, and an invented event would be shown.
    expect(readEvents(feed([]))).toEqual([]);
    expect(feed([])).toMatch(/^BEGIN:VCALENDAR\r\n/);
  });

  it('escapes as RFC 5545, 3.3.11, has it', () => {
    // The rule: backslash, semicolon and comma behind a backslash; a colon and quotes as they are.
    const line = unfolded(feed([{ ...due, summary: 'oak; ash, elm \\ "pine": due' }])).find((each) => each.startsWith('SUMMARY'));
    expect(line).toBe('SUMMARY:oak\\; ash\\, elm \\\\ "pine": due');
  });

  it('holds no line of its own making: breaks and control characters in a name do not end it', () => {
    const text = feed([{ ...due, summary: 'a\r\nEND:VEVENT\r\nBEGIN:VALARM\nb\u0000\u2028c' }], 'Shop\r\nX-EVIL:1');
    expect(unfolded(text).filter((line) => /^(END:VEVENT|BEGIN:VALARM|X-EVIL)/.test(line))).toEqual(['END:VEVENT']);
    expect(readEvents(text)[0]?.summary).toBe('a END:VEVENT BEGIN:VALARM b c');
  });

  it('is read back as it was meant, whatever the words, in lines of 75 octets that end in CRLF', () => {
    const words = fc.string({ unit: 'grapheme', maxLength: 200 }).map((text) => text.replace(/[\p{Cc}\u2028\u2029]/gu, '').trim()).filter((text) => text !== '');
    const day = fc.integer({ min: 15_000, max: 40_000 });
    fc.assert(fc.property(fc.uniqueArray(fc.tuple(words, day), { maxLength: 5 }), words, (list, name) => {
      const days = list.map(([summary, at], n) => ({ uid: `c${n}@tallyrail`, day: at, summary }));
      const text = feed(days, name);
      expect(text.replaceAll('\r\n', '')).not.toMatch(/[\r\n]/);
      for (const line of text.split('\r\n')) expect(new TextEncoder().encode(line).length, line).toBeLessThanOrEqual(75); // 3.1, without the break
      expect(readEvents(text)).toEqual(days.map(({ uid, day: at, summary }) => ({ uid, summary, start: dateOf(at), end: dateOf(at + 1), isDate: true, stamp: '2026-12-01T13:05:09Z' })));
    }), { numRuns: 300, seed: 51 });
  });

  it('is the same text from the same days', () => {
    expect(feed([due])).toBe(feed([due]));
  });

  it('keeps a date in any time zone of the server', () => {
    const zone = process.env.TZ;
    try {
      for (const [other, minutes] of [['Pacific/Kiritimati', -840], ['Pacific/Pago_Pago', 660], ['UTC', 0]] as const) {
        process.env.TZ = other;
        expect(new Date(MADE).getTimezoneOffset(), other).toBe(minutes); // the runtime did follow
        expect(unfolded(feed([due])), other).toContain('DTSTART;VALUE=DATE:20261218');
      }
    } finally {
      if (zone === undefined) delete process.env.TZ;
      else process.env.TZ = zone;
    }
  });
});
