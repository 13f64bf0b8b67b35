import { type CoinInGroove, largestLean, standingOf } from './lean';

/** A groove with a board behind it: `boardDistance` runs from the groove's back wall to the board's face; null: no board. */
export interface CoinBeforeBoard extends CoinInGroove {
  readonly boardDistance: number | null;
}

/** How a coin comes to rest. Angles in degrees from upright. */
export type Rest =
  | { readonly how: 'tooThick' | 'sinks' }
  /** Its foot comes over the front lip before its back is held. */
  | { readonly how: 'slips'; readonly lean: number }
  /** It comes back upright by itself and only rattles, up to `most` either way. */
  | { readonly how: 'upright'; readonly most: number }
  /** It leans; `keeps` is false where it would climb over the rim but for friction. */
  | { readonly how: 'leans'; readonly against: 'board' | 'rim'; readonly lean: number; readonly keeps: boolean };

const DEGREES = 180 / Math.PI;

/**
 * The lean at which the coin's back meets the board, in degrees: t cos a + D sin a = w + s, exact.
 *
 * The foot's front edge stands against the front wall and its back edge on the floor, so the back's top edge is
 * t cos a + D sin a from the front wall. With R = √(t² + D²) and tan φ = t / D that is R sin (a + φ), hence
 * a = asin((w + s) / R) − φ. NaN where the coin is too small to reach the board, or there is none.
 */
export function leanOnBoard({ thickness: t, diameter: d, width: w, boardDistance: s }: CoinBeforeBoard): number {
  if (s === null) return NaN;
  return (Math.asin((w + s) / Math.hypot(t, d)) - Math.atan2(t, d)) * DEGREES;
}

/** Lean in degrees beyond which a coin no longer comes back upright: its mass centre stands over the edge it turns about, tan a = t / D. */
export function tippingAngle({ thickness, diameter }: Pick<CoinInGroove, 'thickness' | 'diameter'>): number {
  return Math.atan2(thickness, diameter) * DEGREES;
}

/** How the coin comes to rest, leaning back: on the board where it meets that before the groove's back rim, else on the rim. */
export function restOf(coin: CoinBeforeBoard): Rest {
  const { thickness: t, diameter: d, width: w, depth: h } = coin;
  if (!(t <= w)) return { how: 'tooThick' };
  const onBoard = leanOnBoard(coin);
  const onRim = largestLean(coin);
  if (Number.isNaN(onBoard) || onRim <= onBoard) {
    const standing = standingOf(coin);
    if (standing.how === 'falls') return { how: 'slips', lean: onRim };
    return standing.how === 'leans' ? { ...standing, against: 'rim' } : standing;
  }
  const a = onBoard / DEGREES;
  if (h >= d * Math.cos(a)) return { how: 'sinks' };
  if (onBoard < tippingAngle(coin)) return { how: 'upright', most: onBoard };
  if (t * Math.sin(a) > h) return { how: 'slips', lean: onBoard };
  // The board and the front wall hold it between them at the only lean that fills the room: it cannot rise without leaning less.
  return { how: 'leans', against: 'board', lean: onBoard, keeps: true };
}
