/** What the cross-section is drawn from. */
export interface SectionSizes {
  readonly railWidth: number;
  readonly railThickness: number;
  readonly width: number;
  readonly depth: number;
  /** Depth reached by each pass; none before a program is made. */
  readonly passes: readonly number[];
}

export interface SectionView {
  readonly scale: number;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
  readonly grooveLeft: number;
  readonly grooveRight: number;
  readonly floor: number;
  /** The cut face: a rectangle with the groove taken out. */
  readonly outline: string;
  /** Growth rings as arcs about a pith below the rail; clipped to the outline. */
  readonly rings: readonly number[];
  readonly pith: { readonly x: number; readonly y: number };
  /** Height of each pass's floor, in pixels. */
  readonly passFloors: readonly number[];
}

const MOST_HEIGHT = 104; // px: leaves room for the sizes above and below in the drawing's 330 px
const RING_GAP = 9; // px between growth rings

/** Lays the section out centred at `middle`, as large as `span` and `most` pixels to the unit allow. */
export function sectionView(sizes: SectionSizes, room: { readonly middle: number; readonly span: number; readonly top: number; readonly most?: number }): SectionView {
  const { railWidth, railThickness, width, depth } = sizes;
  const scale = Math.min(room.span / railWidth, MOST_HEIGHT / railThickness, room.most ?? Infinity);
  const half = (railWidth * scale) / 2;
  const [left, right, top] = [room.middle - half, room.middle + half, room.top];
  const bottom = top + railThickness * scale;
  const grooveHalf = (width * scale) / 2;
  const [grooveLeft, grooveRight, floor] = [room.middle - grooveHalf, room.middle + grooveHalf, top + depth * scale];
  const pith = { x: left + (right - left) * 0.36, y: bottom + 34 };
  const reach = Math.hypot(right - pith.x, pith.y - top);
  const rings = Array.from({ length: Math.ceil(reach / RING_GAP) }, (_, i) => (i + 1) * RING_GAP + ((i * 7) % 4)).filter((r) => r > pith.y - bottom);
  const floors = sizes.passes.map((reached) => top + Math.abs(reached) * scale);
  return {
    scale, left, right, top, bottom, grooveLeft, grooveRight, floor, rings, pith, passFloors: floors,
    outline: `M${left} ${top}H${grooveLeft}V${floor}H${grooveRight}V${top}H${right}V${bottom}H${left}Z`,
  };
}

/** Room for the coin above the rail and to the right of the groove's middle, in pixels. */
export interface CoinRoom {
  readonly above: number;
  readonly beside: number;
}

/** The scale at which the coin has room. A coin many times the rail's size is cut off rather than shrinking the rail away. */
export function scaleForCoin(sizes: SectionSizes, coin: { readonly high: number; readonly reach: number }, room: CoinRoom): number {
  const least = (0.45 * MOST_HEIGHT) / sizes.railThickness;
  return Math.max(least, Math.min(room.above / Math.max(coin.high, 1e-6), room.beside / Math.max(coin.reach, 1e-6)));
}

/** The coin's corners on the drawing, as an SVG polygon's points. */
export function coinPoints(view: SectionView, corners: readonly (readonly [number, number])[]): string {
  return corners.map(([x, y]) => `${(view.grooveLeft + x * view.scale).toFixed(1)},${(view.floor - y * view.scale).toFixed(1)}`).join(' ');
}
