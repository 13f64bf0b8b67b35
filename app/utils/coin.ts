import { type Rest, restOf } from '#shared/coin/rest';
import { LENGTH_HELP, formatSize, parseLength } from '#shared/measure/length';
import { type Units, byUnits } from '#shared/measure/units';
import { COIN_KEYS, type CoinKey, type Draft, unitsOf } from './draft';
import { sizesOf } from './sizes';

export interface Coin {
  readonly diameter: number;
  readonly thickness: number;
}

/** What stands in the section until a coin is measured: 1 3/4 in across, 1/8 in thick. */
export const coinDefault = (units: Units, key: CoinKey): number =>
  key === 'coinDiameter' ? byUnits(units, 1.75, 44.45) : byUnits(units, 0.125, 3.175);

/** The coin in the drawing's units, or null while one of its sizes cannot be read or is none of a coin's. */
export function coinOf(draft: Draft): Coin | null {
  const units = unitsOf(draft);
  const sizes = sizesOf(draft);
  const read = (key: CoinKey) => (draft.texts[key].text.trim() === '' ? coinDefault(units, key) : sizes[key]);
  const [diameter, thickness] = [read('coinDiameter'), read('coinThickness')];
  if (diameter === null || thickness === null) return null;
  return thickness > 0 && thickness < diameter && diameter <= byUnits(units, 12, 300) ? { diameter, thickness } : null;
}

/** Sentences for the two boxes of the coin. They hold back no program: the coin is not part of it. */
export function coinProblems(draft: Draft): Readonly<Record<string, readonly string[]>> {
  const unreadable = COIN_KEYS.filter((key) => draft.texts[key].text.trim() !== '' && parseLength(draft.texts[key].text) === null);
  if (unreadable.length > 0) return Object.fromEntries(unreadable.map((key) => [key, [`That is not a size we can read. ${LENGTH_HELP}`]]));
  return coinOf(draft) ? {} : { coinDiameter: ['That is no coin. Give the size across, then the smaller thickness.'] };
}

/** The next rule mark above a thickness: a groove that wide takes the coin with a little play. */
function widthAbove(thickness: number, units: Units): number {
  const step = byUnits(units, 1 / 64, 0.1);
  return Number(((Math.floor(thickness / step + 1e-6) + 1) * step).toFixed(6));
}

/** How the coin stands, in one sentence. */
export function standingWords(standing: Rest, coin: Coin, units: Units): string {
  switch (standing.how) {
    case 'tooThick': return `Too thick for this groove: make it ${formatSize(widthAbove(coin.thickness, units), units)} or wider.`;
    case 'upright': return standing.most === 0 ? 'A press fit: stands upright without play.' : 'Stands upright by itself and only rattles.';
    case 'sinks': return 'Sinks into this groove: make it shallower.';
    case 'slips': return 'Slips over the front lip: make the groove deeper or narrower.';
    case 'leans': return standing.against === 'board' ? `Leans ${standing.lean.toFixed(1)}° on the board behind it.` : standing.keeps
      ? `Leans ${standing.lean.toFixed(1)}°.`
      : `Leans ${standing.lean.toFixed(1)}° and can slip over the rim: stand a board behind it, or make the groove narrower or deeper.`;
  }
}

/** The coin as the section draws it: from the groove's floor and its wall at the open side, Y up, in the drawing's units. */
export interface CoinShape {
  readonly corners: readonly (readonly [number, number])[];
  /** False where it does not stand in the groove: it is drawn on the rim, dashed. */
  readonly stands: boolean;
  readonly high: number;
  /** How far it goes to each side of the groove's middle. */
  readonly reach: number;
}

export function coinShape(coin: Coin, groove: { readonly width: number; readonly depth: number; readonly boardDistance: number | null }): CoinShape & { readonly standing: Rest } {
  const standing = restOf({ ...coin, width: groove.width, depth: groove.depth, boardDistance: groove.boardDistance });
  const { diameter: d, thickness: t } = coin;
  const stands = standing.how === 'leans' || standing.how === 'upright';
  const a = standing.how === 'leans' ? (standing.lean * Math.PI) / 180 : 0;
  const [sin, cos] = [Math.sin(a), Math.cos(a)];
  const [x, y] = standing.how === 'leans' ? [0, 0] : [(groove.width - t) / 2, stands ? 0 : groove.depth];
  const corners = ([[t * cos, 0], [t * cos + d * sin, d * cos], [d * sin, t * sin + d * cos], [0, t * sin]] as const)
    .map(([px, py]) => [px + x, py + y] as const);
  return {
    corners, stands, standing,
    high: Math.max(...corners.map(([, py]) => py)) - groove.depth,
    reach: Math.max(...corners.map(([px]) => Math.abs(px - groove.width / 2))),
  };
}
