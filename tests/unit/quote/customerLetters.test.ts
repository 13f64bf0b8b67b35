import fc from 'fast-check';
import { createTransport } from 'nodemailer';
import { simpleParser } from 'mailparser';
import { describe, expect, it } from 'vitest';
import { type About, customerLetters } from '#server/mail/customerLetters';
import type { Letter } from '#server/mail/letters';
import { PROGRESS_MAILS, PROGRESS_WORDS, USUAL_PROGRESS_MAILS, wantsMail } from '#shared/commission/stagesMail';

const about: About = { shop: 'Marrow Creek Joinery', to: 'Halvard Prewitt', commission: '42 coins for the day room' };
const LINK = 'https://shop.example.com/c/abc?x=1&y=2';

/** Every letter there is, with whatever people typed. */
const allLetters = (who: About, typed = 'Q-0042'): Letter[] => [
  customerLetters.quoteReady(who, { number: typed, revision: 1, total: '$715.08', until: '31 December 2026', link: LINK }),
  customerLetters.quoteReady(who, { number: typed, revision: 2, total: '$715.08', until: '31 December 2026', link: LINK }),
  customerLetters.code(who, { code: '012345' }),
  ...(['card', 'cash', 'transfer'] as const).map((method) => customerLetters.paymentReceived(who, { amount: '$357.54', method, open: '$357.54', link: LINK })),
  customerLetters.paymentReceived(who, { amount: '$357.54', method: 'card', open: null, link: LINK }),
  ...PROGRESS_MAILS.map((stage) => customerLetters.progress(who, { stage, due: '18 December 2026', link: LINK })),
  customerLetters.reminder(who, { what: 'approval', number: typed, until: '31 December 2026' }, { link: LINK }),
  ...(['deposit', 'balance'] as const).map((what) => customerLetters.reminder(who, { what, amount: '$357.54' }, { link: LINK })),
];

/** What the letter's own tags are: anything else in angle brackets came from outside. */
const TAGS = /<\/?(html|body|p|a|span|br)(\s(lang|style|href)="[^"<>]*")*>|<!doctype html>/g;

/** What a browser would show of the HTML: character references back to characters. */
const shown = (html: string) => html.replace(TAGS, '\n').replace(/&#(\d+);/g, (_, code: string) => String.fromCharCode(Number(code)));

describe('a letter to a customer', () => {
  it('says one thing in the shop\'s name, with its link and how to answer', () => {
    const { subject, text, html } = customerLetters.quoteReady(about, { number: 'Q-0042', revision: 1, total: '$715.08', until: '31 December 2026', link: LINK });
    expect(subject).toBe('Quote Q-0042 from Marrow Creek Joinery');
    expect(text.split('\n\n').slice(0, 2)).toEqual(['Halvard Prewitt,', 'Here is quote Q-0042 for "42 coins for the day room": $715.08, open until 31 December 2026.']);
    expect(text).toContain(`\n\n${LINK}\n\n`);
    expect(text.trimEnd().split('\n\n').at(-1)).toBe('You get this because Marrow Creek Joinery works on "42 coins for the day room" for you. Answer this mail to reach the shop.');
    expect(html).toContain('href="https://shop.example.com/c/abc?x=1&#38;y=2"');
    expect(customerLetters.quoteReady(about, { number: 'Q-0042', revision: 3, total: '$1', until: 'x', link: LINK }).subject).toBe('Changed quote Q-0042 from Marrow Creek Joinery');
  });

  it('says what is paid and what is open', () => {
    const said = (method: 'cash' | 'transfer', open: string | null) => customerLetters.paymentReceived(about, { amount: '$10.00', method, open, link: LINK }).text.split('\n\n').slice(1, 3);
    expect(said('cash', null)).toEqual(['Thank you. We have received $10.00 in cash.', 'Everything is paid.']);
    expect(said('transfer', '$5.00')).toEqual(['Thank you. We have received $10.00 by transfer.', '$5.00 is still to be paid; we will ask for it when it is due.']);
  });

  it('with a code has no link, and no code in its subject', () => {
    const { subject, text, html } = customerLetters.code(about, { code: '012345' });
    expect(`${subject}${text}${html}`).not.toMatch(/http/);
    expect(subject).not.toMatch(/\d/);
    expect(text).toContain('\n\n012345\n\n');
    expect(text).toMatch(/works once, for 15 minutes/);
  });

  it('tells of a stage that the customer chose', () => {
    expect(customerLetters.progress(about, { stage: 'ready', due: '18 December 2026', link: LINK }).subject).toBe('42 coins for the day room: Your piece is ready');
    expect(wantsMail('ready', USUAL_PROGRESS_MAILS)).toBe(true);
    expect(wantsMail('finishing', USUAL_PROGRESS_MAILS)).toBe(false);
    expect(wantsMail('approved', PROGRESS_MAILS)).toBe(false);
    expect(Object.values(PROGRESS_WORDS).every((words) => words.endsWith('.'))).toBe(true);
  });

  it('has no picture, script, form or counter in it', () => {
    for (const { html } of allLetters(about)) {
      expect(html).not.toMatch(/<(img|script|form|iframe|link|object)|url\(|@import/i);
      expect([...html.matchAll(/https?:[^"<\s]*/g)].every(([address]) => address.replaceAll('&#38;', '&') === LINK)).toBe(true);
    }
  });

  it.each([
    '<script>alert(1)</script>', '"><img src=x onerror=alert(1)>', '\'onmouseover=\'x', '&lt;b&gt; & co', '</p></body><h1>', 'a\r\nBcc: everyone@example.com', 'x\u2028y', 'safe\u202Egpj.exe',
  ])('quotes %j as words', (typed) => {
    for (const { subject, text, html } of allLetters({ shop: typed, to: typed, commission: typed }, typed)) {
      expect(html.replace(TAGS, '')).not.toMatch(/[<>"']/);
      expect(subject).not.toMatch(/[\p{Cc}\u2028\u202e]/u);
      expect(text.replaceAll('\n', '')).not.toMatch(/[\p{Cc}\u2028\u202e]/u);
      expect(text.split('\n').some((line) => line.startsWith('Bcc:'))).toBe(false);
    }
  });

  it('says the same as text and as HTML, whatever was typed', () => {
    const typed = fc.string({ maxLength: 60 });
    const words = (text: string) => text.split(/\s+/).filter((word) => word !== '');
    fc.assert(fc.property(typed, typed, typed, (shop, to, commission) => {
      for (const { subject, text, html } of allLetters({ shop, to, commission })) {
        expect(html.replace(TAGS, '')).not.toMatch(/[<>"']/);
        expect(subject.length).toBeLessThanOrEqual(120);
        const seen = new Set(words(shown(html)));
        expect(words(text).every((word) => seen.has(word))).toBe(true);
      }
    }), { numRuns: 100, seed: 61 });
  });

  it('comes out of the mail as it went in: one subject, no header of its own', async () => {
    const transport = createTransport({ streamTransport: true, buffer: true });
    for (const { subject, text, html } of allLetters({ shop: 'Täfler & Söhne\r\nBcc: everyone@example.com', to: 'Ines', commission: '<b>42</b>' })) {
      const { message } = await transport.sendMail({ from: 'shop@example.com', to: 'customer@example.com', subject, text, html });
      const read = await simpleParser(message);
      expect(read.subject).toBe(subject);
      expect(read.headers.has('bcc')).toBe(false);
      expect(read.text?.trim()).toBe(text.trim());
    }
  });
});
