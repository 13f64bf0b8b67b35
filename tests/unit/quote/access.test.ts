import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { LINK_ACTIONS, LINK_RULES, accessTo, isRemembered, linkState, needsCode, newLink, revoked } from '#shared/quote/access';
import { type AccessCode, codeDigits, codeState, mayMailCode, newCode, readCode, tryCode } from '#shared/quote/accessCode';

const NOW = 1_800_000_000_000;
const HOUR = 3_600_000;
const DAYS = 24 * HOUR;

/** Issue 6, "Proof and approval": expiring and revocable; piece and price by the link, the rest by a six-digit code remembered for 30 days. */
describe('a private link', () => {
  const link = newLink(NOW);

  it('is open until it runs out, and closed for good once it is revoked', () => {
    expect([0, 89 * DAYS, 90 * DAYS - 1, 90 * DAYS, NaN].map((later) => linkState(link, NOW + later))).toEqual(['open', 'open', 'open', 'expired', 'expired']);
    const closed = revoked(link, NOW + 5);
    expect([0, 5, 91 * DAYS].map((later) => linkState(closed, NOW + later))).toEqual(['revoked', 'revoked', 'revoked']);
    expect(revoked(closed, NOW + 9)).toEqual(closed);
    expect(linkState({ ...link, expiresAt: NaN }, NOW)).toBe('expired');
  });

  it('shows piece and price by itself, and asks for a code for anything else', () => {
    expect(LINK_ACTIONS.filter((action) => accessTo(action, link, null, NOW).ok)).toEqual(['see']);
    for (const action of ['approve', 'pay', 'contacts', 'export'] as const) expect(accessTo(action, link, null, NOW)).toMatchObject({ ok: false, ask: 'code' });
    expect(LINK_ACTIONS.filter(needsCode)).toHaveLength(LINK_ACTIONS.length - 1);
  });

  it('lets a remembered device do all for thirty days, and no longer for being used', () => {
    const device = { confirmedAt: NOW, forgottenAt: null };
    expect([-1, 0, 30 * DAYS - 1, 30 * DAYS, NaN].map((later) => isRemembered(device, NOW + later))).toEqual([false, true, true, false, false]);
    expect(LINK_ACTIONS.every((action) => accessTo(action, link, device, NOW + 1).ok)).toBe(true);
    expect(accessTo('pay', link, { ...device, forgottenAt: NOW }, NOW + 1)).toMatchObject({ ok: false, ask: 'code' });
  });

  it('lets nobody do anything once it is closed or has run out, remembered or not', () => {
    fc.assert(fc.property(fc.constantFrom(...LINK_ACTIONS), fc.boolean(), fc.integer({ min: 0, max: 200 * DAYS }), (action, known, later) => {
      const device = known ? { confirmedAt: NOW + later - 1, forgottenAt: null } : null;
      expect(accessTo(action, revoked(link, NOW), device, NOW + later)).toMatchObject({ ok: false, ask: 'newLink' });
      expect(accessTo(action, link, device, NOW + 90 * DAYS + later)).toMatchObject({ ok: false, ask: 'newLink' });
    }));
  });
});

describe('a code', () => {
  it('works once, within its time', () => {
    const right = tryCode(newCode(NOW), true, NOW + 1);
    expect(right.ok).toBe(true);
    expect(tryCode(right.code, true, NOW + 2)).toMatchObject({ ok: false, message: expect.stringMatching(/used already/) });
    expect([0, 15 * 60_000 - 1, 15 * 60_000, -1, NaN].map((later) => codeState(newCode(NOW), NOW + later))).toEqual(['open', 'open', 'expired', 'expired', 'expired']);
    expect(tryCode(newCode(NOW), true, NOW + HOUR)).toMatchObject({ ok: false, message: expect.stringMatching(/run out/) });
  });

  it('bears five wrong tries, after which the right one is refused too', () => {
    let code: AccessCode = newCode(NOW);
    const said: string[] = [];
    for (let n = 0; n < 5; n++) {
      const tried = tryCode(code, false, NOW + n);
      code = tried.code;
      said.push(tried.ok ? 'right' : tried.message);
    }
    expect(said).toEqual(['That is not the code. 4 tries are left.', 'That is not the code. 3 tries are left.', 'That is not the code. 2 tries are left.', 'That is not the code. 1 try is left.', 'That is not the code. Ask for a new one.']);
    expect(tryCode(code, true, NOW + 9)).toMatchObject({ ok: false, code, message: expect.stringMatching(/Too many wrong tries/) });
  });

  it('that is not open says nothing of its digits', () => {
    for (const code of [{ ...newCode(NOW), usedAt: NOW }, { ...newCode(NOW), wrongTries: 5 }, newCode(NOW - HOUR)]) expect(tryCode(code, true, NOW + 1)).toEqual(tryCode(code, false, NOW + 1));
  });

  it('is accepted once at most, however it is tried', () => {
    fc.assert(fc.property(fc.array(fc.tuple(fc.boolean(), fc.integer({ min: 0, max: HOUR })), { maxLength: 30 }), (tries) => {
      let code: AccessCode = newCode(NOW);
      let accepted = 0;
      for (const [matches, later] of tries) {
        const tried = tryCode(code, matches, NOW + later);
        code = tried.code;
        if (tried.ok) accepted++;
      }
      expect(accepted).toBeLessThanOrEqual(1);
      expect(code.wrongTries).toBeLessThanOrEqual(5);
    }));
  });

  it('leaves a guesser one chance in ten thousand in a day, at the most', () => {
    // Arithmetic: tries in a day over the number of codes.
    expect((LINK_RULES.codesSent * LINK_RULES.codeTries) / 10 ** LINK_RULES.codeDigits).toBeLessThanOrEqual(1e-4);
  });

  it('is mailed once a minute and ten times a day', () => {
    expect(mayMailCode([], NOW)).toEqual({ ok: true });
    expect(mayMailCode([NOW], NOW + 59_999)).toMatchObject({ ok: false, wait: 1 });
    expect(mayMailCode([NOW], NOW + 60_000)).toEqual({ ok: true });
    const ten = Array.from({ length: 10 }, (_, n) => NOW + n * HOUR);
    expect(mayMailCode(ten.slice(1), NOW + 10 * HOUR)).toEqual({ ok: true });
    expect(mayMailCode([...ten].reverse(), NOW + 10 * HOUR)).toMatchObject({ ok: false, wait: 14 * HOUR });
    expect(mayMailCode(ten, NOW + 24 * HOUR)).toEqual({ ok: true });
  });

  it('mailed as often as is let, is mailed no more than ten times in any day', () => {
    fc.assert(fc.property(fc.array(fc.integer({ min: 1, max: 3 * HOUR }), { maxLength: 80 }), (gaps) => {
      const sent: number[] = [];
      let at = NOW;
      for (const gap of gaps) {
        at += gap;
        if (mayMailCode(sent, at).ok) sent.push(at);
      }
      for (const start of sent) expect(sent.filter((time) => time >= start && time < start + 24 * HOUR).length).toBeLessThanOrEqual(10);
    }));
  });

  it('is read as people type it', () => {
    expect(['123456', ' 123 456 ', '123-456', '000000'].map(readCode)).toEqual(['123456', '123456', '123456', '000000']);
    expect(['12345', '1234567', '12345a', '', '１２３４５６', '12.456'].map(readCode)).toEqual([null, null, null, null, null, null]);
    expect([0, 42, 999_999].map(codeDigits)).toEqual(['000000', '000042', '999999']);
  });
});
