/** A coin on edge in a groove, seen along the groove; all lengths in one unit. */
export interface CoinInGroove {
  readonly thickness: number;
  readonly diameter: number;
  readonly width: number;
  readonly depth: number;
}

/** How a coin stands in a groove with no board behind it. Angles in degrees from upright. */
export type Standing =
  | { readonly how: 'tooThick' }
  /** Its largest lean is less than what it takes to tip: it comes back upright and only rattles. */
  | { readonly how: 'upright'; readonly most: number }
  /** It rests on the rim; `keeps` is false where it would climb over the rim but for friction. */
  | { readonly how: 'leans'; readonly lean: number; readonly keeps: boolean }
  /** The groove is deeper than the coin reaches, or too shallow to hold its foot. */
  | { readonly how: 'sinks' }
  | { readonly how: 'falls' };

const DEGREES = 180 / Math.PI;
const MOST_STEPS = 200;

/**
 * Width of the groove in which a coin leans by `lean` degrees at most: w = t cos a + h tan a, exact.
 *
 * The lowest edge of the leaning coin stands on the floor, the other meets one wall, and its face lies on the other
 * wall's rim. Since the coin is parallel to the groove, this section through its centre is the whole of it (own
 * derivation; checked against a search without assumed contacts, tests/standards/coinLean.test.ts).
 */
export function widthForLean(coin: Pick<CoinInGroove, 'thickness' | 'depth'>, lean: number): number {
  const a = lean / DEGREES;
  return coin.thickness * Math.cos(a) + coin.depth * Math.tan(a);
}

/**
 * The largest lean in degrees: the least root of t cos a + h tan a = w. NaN where the coin is thicker than the groove
 * is wide.
 *
 * a ← atan((w − t cos a) / h) climbs to the least root from below; Newton's method then doubles its digits.
 */
export function largestLean({ thickness: t, width: w, depth: h }: CoinInGroove): number {
  if (!(t <= w)) return NaN;
  let a = 0;
  for (let n = 0; n < MOST_STEPS; n++) {
    const slope = h / Math.cos(a) ** 2 - t * Math.sin(a);
    const climbed = Math.atan((w - t * Math.cos(a)) / h);
    const newton = a + (w - t * Math.cos(a) - h * Math.tan(a)) / slope;
    const near = n > 8 && slope > 0 && Math.abs(newton - a) < 1e-3;
    const next = near ? newton : climbed;
    if (Math.abs(next - a) <= 1e-15) break;
    a = next;
  }
  return a * DEGREES;
}

/**
 * How the coin comes to rest. It falls back upright while tan a < t / D. Leaning, it keeps to the rim without friction
 * where h > ½ sin a cos a (t cos a + D sin a), from the slope of its mass centre's height as it rises off the floor.
 */
export function standingOf(coin: CoinInGroove): Standing {
  const { thickness: t, diameter: d, depth: h } = coin;
  const lean = largestLean(coin);
  if (Number.isNaN(lean)) return { how: 'tooThick' };
  const a = lean / DEGREES;
  const [sin, cos] = [Math.sin(a), Math.cos(a)];
  if (h >= d * cos) return { how: 'sinks' };
  if (t * sin > h) return { how: 'falls' };
  if (sin * d < t * cos) return { how: 'upright', most: lean };
  return { how: 'leans', lean, keeps: h > 0.5 * sin * cos * (t * cos + d * sin) };
}
