import { LINK_RULES } from './access';

/** A code as it is kept: never its digits, which are kept hashed beside it. */
export interface AccessCode {
  readonly sentAt: number;
  readonly wrongTries: number;
  /** When it was given rightly: it works once. */
  readonly usedAt: number | null;
}

export const newCode = (now: number): AccessCode => ({ sentAt: now, wrongTries: 0, usedAt: null });

export const CODE_STATES = ['open', 'used', 'spent', 'expired'] as const;
export type CodeState = (typeof CODE_STATES)[number];

export function codeState({ sentAt, wrongTries, usedAt }: AccessCode, now: number): CodeState {
  if (usedAt !== null) return 'used';
  if (wrongTries >= LINK_RULES.codeTries) return 'spent';
  return now >= sentAt && now < sentAt + LINK_RULES.codeLifetime ? 'open' : 'expired';
}

/** The digits of a code as somebody typed them (`123 456`, `123-456`); null where they cannot be one. */
export function readCode(typed: string): string | null {
  const digits = typed.trim().replace(/[\s-]/g, '');
  return new RegExp(`^[0-9]{${LINK_RULES.codeDigits}}$`).test(digits) ? digits : null;
}

/** The digits of a code from a whole number that somebody drew evenly from 0 to 999 999. */
export const codeDigits = (drawn: number): string => String(drawn).padStart(LINK_RULES.codeDigits, '0');

export type Tried =
  | { readonly ok: true; readonly code: AccessCode }
  | { readonly ok: false; readonly code: AccessCode; readonly message: string };

/**
 * A try at a code. A code that is not open is refused before its digits are looked at, so that it says nothing about
 * them; a wrong try is counted, and what comes back has to be kept before it is answered.
 *
 * @param matches whether the typed digits are the code's, compared in constant time by who keeps the hash.
 */
export function tryCode(code: AccessCode, matches: boolean, now: number): Tried {
  const state = codeState(code, now);
  if (state === 'expired') return { ok: false, code, message: 'This code has run out. Ask for a new one.' };
  if (state === 'used') return { ok: false, code, message: 'This code was used already. Ask for a new one.' };
  if (state === 'spent') return { ok: false, code, message: 'Too many wrong tries. Ask for a new code.' };
  if (matches) return { ok: true, code: { ...code, usedAt: now } };
  const wrongTries = code.wrongTries + 1;
  const left = LINK_RULES.codeTries - wrongTries;
  return { ok: false, code: { ...code, wrongTries }, message: left > 0 ? `That is not the code. ${left} ${left === 1 ? 'try is' : 'tries are'} left.` : 'That is not the code. Ask for a new one.' };
}

/** Whether a code may be mailed now, given when this link's earlier ones were; if not, in how many milliseconds. */
export function mayMailCode(sentAt: readonly number[], now: number): { readonly ok: true } | { readonly ok: false; readonly wait: number; readonly message: string } {
  const recent = sentAt.filter((at) => at > now - LINK_RULES.codeWindow).sort((a, b) => a - b);
  const last = recent[recent.length - 1];
  if (last !== undefined && now < last + LINK_RULES.codePause) return { ok: false, wait: last + LINK_RULES.codePause - now, message: 'A code was mailed just now. Look at your mail, also among the unwanted.' };
  const first = recent[recent.length - LINK_RULES.codesSent];
  if (first !== undefined) return { ok: false, wait: first + LINK_RULES.codeWindow - now, message: 'Too many codes were asked for today. Try again tomorrow, or call the shop.' };
  return { ok: true };
}
