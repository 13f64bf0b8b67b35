import type { Role } from '#shared/types/people';

declare module '#app' {
  interface PageMeta {
    /** Who may see the page; everyone with an account where it is left out. */
    roles?: readonly Role[];
    /** The page goes from edge to edge, as a drawing does. */
    wide?: boolean;
  }
}

/** Where each begins the day. */
export const HOMES: Readonly<Record<Role, string>> = { owner: '/rails', hand: '/bench', customer: '/account' };

/** A place inside this site to go on to; anything else (another host, a scheme, `//`) becomes the fallback. */
export function placeWithin(to: unknown, fallback: string): string {
  return typeof to === 'string' && /^\/(?![/\\])[^\s\\]*$/.test(to) ? to : fallback;
}
