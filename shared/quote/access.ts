/** Times here are milliseconds from 1970, as `now` is; lives are given in them too. */
const MINUTE = 60_000;
const DAY = 24 * 60 * MINUTE;

/** The rules of a customer's private link and its code, each with its reason. */
export const LINK_RULES = {
  /** Random bytes of the link's token: 256 bits, beyond guessing. */
  tokenBytes: 32,
  /** A commission seldom takes a season; the shop sends a new link where it does. */
  lifetime: 90 * DAY,
  codeDigits: 6,
  /** Long enough to fetch a mail, short enough that an open mailbox is of little use later. */
  codeLifetime: 15 * MINUTE,
  /** Wrong tries that a code bears. */
  codeTries: 5,
  /** Codes that are mailed within `codeWindow`: with their tries, a guesser's chance in a day is 50 in a million. */
  codesSent: 10,
  codeWindow: DAY,
  /** Between two codes, so that a second press mails nothing. */
  codePause: MINUTE,
  /** How long a device that gave a right code is remembered. */
  remembered: 30 * DAY,
} as const;

/** What is done through a private link. */
export const LINK_ACTIONS = ['see', 'comment', 'approve', 'pay', 'contacts', 'export', 'erase'] as const;
export type LinkAction = (typeof LINK_ACTIONS)[number];

/** What the link alone is enough for: piece and price, which a forwarded mail gives away at most. */
const BY_LINK_ALONE: readonly LinkAction[] = ['see'];
export const needsCode = (action: LinkAction): boolean => !BY_LINK_ALONE.includes(action);

export interface PrivateLink {
  readonly createdAt: number;
  readonly expiresAt: number;
  readonly revokedAt: number | null;
}

export const newLink = (now: number): PrivateLink => ({ createdAt: now, expiresAt: now + LINK_RULES.lifetime, revokedAt: null });
export const revoked = (link: PrivateLink, now: number): PrivateLink => ({ ...link, revokedAt: link.revokedAt ?? now });

export const LINK_STATES = ['open', 'expired', 'revoked'] as const;
export type LinkState = (typeof LINK_STATES)[number];

/** Revoked wins over expired. A time that is none opens nothing. */
export function linkState({ expiresAt, revokedAt }: PrivateLink, now: number): LinkState {
  if (revokedAt !== null) return 'revoked';
  return now < expiresAt ? 'open' : 'expired';
}

/** A device that gave a right code, through this link. */
export interface RememberedDevice {
  readonly confirmedAt: number;
  readonly forgottenAt: number | null;
}

/** A device is remembered for its time from the code on; being used does not make it longer. */
export const isRemembered = ({ confirmedAt, forgottenAt }: RememberedDevice, now: number): boolean =>
  forgottenAt === null && now >= confirmedAt && now < confirmedAt + LINK_RULES.remembered;

/** What somebody with a link may do; if not, what would let them. */
export type Access = { readonly ok: true } | { readonly ok: false; readonly ask: 'newLink' | 'code'; readonly message: string };

const GONE: Readonly<Record<Exclude<LinkState, 'open'>, string>> = {
  expired: 'This link has run out. Ask the shop for a new one.',
  revoked: 'This link is closed. Ask the shop for a new one.',
};

/** Whether an action goes through: the link has to be open, whatever device asks. */
export function accessTo(action: LinkAction, link: PrivateLink, device: RememberedDevice | null, now: number): Access {
  const state = linkState(link, now);
  if (state !== 'open') return { ok: false, ask: 'newLink', message: GONE[state] };
  if (!needsCode(action) || (device !== null && isRemembered(device, now))) return { ok: true };
  return { ok: false, ask: 'code', message: 'This takes the six-digit code that we mail to your address.' };
}
