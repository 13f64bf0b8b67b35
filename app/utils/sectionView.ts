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

/** Lays the section out centred at `middle`, as large as `span` allows. */
export function sectionView(sizes: SectionSizes, room: { readonly middle: number; readonly span: number; readonly top: number }): SectionView {
  const { railWidth, railThickness, width, depth } = sizes;
  const scale = Math.min(room.span / railWidth, MOST_HEIGHT / railThickness);
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
