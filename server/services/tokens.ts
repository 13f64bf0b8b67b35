import { and, eq, gt, lte } from 'drizzle-orm';
import { type TOKEN_KINDS, tokens } from '../db/schema';
import { useDatabase } from '../db/shop';
import { hashOf, newSecret } from '../utils/newId';

type TokenKind = (typeof TOKEN_KINDS)[number];

/** How long a link works, in minutes. */
const LIFETIMES: Readonly<Record<TokenKind, number>> = { 'sign-up': 24 * 60, 'reset': 60, 'invite': 7 * 24 * 60 };

/** A link's secret, and the writes that keep its hash and drop all that are too old: nothing typed for them stays longer than it is of use. */
export function newToken(kind: TokenKind, of: { readonly shopId?: string; readonly personId?: string; readonly payload?: Readonly<Record<string, string>> }) {
  const secret = newSecret();
  const now = Date.now();
  const database = useDatabase();
  const write = database.insert(tokens).values({
    hash: hashOf(secret), kind, shopId: of.shopId ?? null, personId: of.personId ?? null, payload: of.payload ?? {},
    createdAt: new Date(now), expiresAt: new Date(now + LIFETIMES[kind] * 60_000),
  });
  return { secret, writes: [database.delete(tokens).where(lte(tokens.expiresAt, new Date(now))), write] };
}

/** What a secret stands for, or null where it is used, too old or made up. */
export async function findToken(kind: TokenKind, secret: string) {
  const [token] = await useDatabase().select().from(tokens)
    .where(and(eq(tokens.hash, hashOf(secret)), eq(tokens.kind, kind), gt(tokens.expiresAt, new Date())));
  return token ?? null;
}

/** Takes a secret out of use: true for the one caller who was first. */
export async function useToken(kind: TokenKind, secret: string): Promise<boolean> {
  const gone = await useDatabase().delete(tokens).where(and(eq(tokens.hash, hashOf(secret)), eq(tokens.kind, kind))).returning({ hash: tokens.hash });
  return gone.length === 1;
}

/** The write that drops a person's other links of a kind. */
export const dropTokens = (kind: TokenKind, personId: string) =>
  useDatabase().delete(tokens).where(and(eq(tokens.kind, kind), eq(tokens.personId, personId)));
