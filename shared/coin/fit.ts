import type { Units } from '../measure/units';
import { type Rest, restOf, tippingAngle } from './rest';
import type { CoinKind } from './tally';

/** The two ways in which a piece holds its coins. */
export const STYLES = ['upright', 'leaning'] as const;
export type Style = (typeof STYLES)[number];

/** A groove as its coins meet it. `boardDistance` runs from its back wall to the board's face; null: no board. */
export interface Groove {
  readonly units: Units;
  readonly style: Style;
  readonly width: number;
  readonly depth: number;
  readonly boardDistance: number | null;
}

export type Disc = Pick<CoinKind, 'diameter' | 'thickness'>;

/** What a groove does with one kind of coin; lengths in the drawing's units, angles in degrees, shares of one. */
export interface Fit {
  /** Groove width less thickness: below zero the coin does not go in. */
  readonly clearance: number;
  readonly rest: Rest;
  /** Where it comes to rest: 0 upright. NaN where it does not stand at all. */
  readonly lean: number;
  /** Height of the front lip above the coin's lowest front edge: what keeps its foot from sliding out. */
  readonly lip: number;
  /** Of the face at the front: how much the groove hides, along the face, and as shares of its height and area. */
  readonly hidden: { readonly height: number; readonly heightShare: number; readonly areaShare: number };
  /** How far inside its footing the mass centre stands, level: below zero it would tip forward. */
  readonly footing: number;
  /** How far the wall may tip the rail forward before the coin tips too. */
  readonly tiltKept: number;
  /** Highest point above the rail's top. */
  readonly rise: number;
  /** How far the highest point of the back stands behind the groove's front wall. */
  readonly back: number;
}

/**
 * Share of a disc's area cut off by a chord at height `h`: circular segment, R² acos((R − h)/R) − (R − h)√(2Rh − h²)
 * over πR² (standard mensuration).
 */
export function segmentShare(diameter: number, h: number): number {
  const r = diameter / 2;
  const height = Math.min(Math.max(h, 0), diameter);
  return (r * r * Math.acos((r - height) / r) - (r - height) * Math.sqrt(height * (diameter - height))) / (Math.PI * r * r);
}

/**
 * How a kind of coin stands in a groove.
 *
 * Leaning back by a, its foot turns on the back edge A on the floor, t cos a from the front wall; its front edge B is
 * t sin a up that wall. Hidden along the face: (h − t sin a) / cos a. Its mass centre is D/2 sin a − t/2 cos a behind A.
 * Upright the mass centre stands t/2 inside either edge. Own derivation (tests/standards/coinFit.test.ts).
 */
export function fitOf(coin: Disc, groove: Groove): Fit {
  const { thickness: t, diameter: d } = coin;
  const rest = restOf({ ...coin, ...groove });
  const lean = rest.how === 'leans' ? rest.lean : rest.how === 'upright' ? 0 : NaN;
  const a = (lean * Math.PI) / 180;
  const [sin, cos] = [Math.sin(a), Math.cos(a)];
  const lip = groove.depth - t * sin;
  const height = lip / cos;
  const leans = rest.how === 'leans';
  return {
    clearance: groove.width - t,
    rest,
    lean,
    lip,
    hidden: { height, heightShare: height / d, areaShare: segmentShare(d, height) },
    footing: leans ? (d * sin - t * cos) / 2 : t / 2,
    tiltKept: leans ? lean - tippingAngle(coin) : tippingAngle(coin),
    rise: t * sin + d * cos - groove.depth,
    back: t * cos + d * sin,
  };
}
