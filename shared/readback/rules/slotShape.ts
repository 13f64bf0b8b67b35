import { norm } from '../../geometry/point';
import { type SlotSpec, isOneBit } from '../../slot/spec';
import type { Cut } from '../cut';

/** A slot no wider than its bit is as wide as the bit cuts. */
export function cutWidth(spec: SlotSpec): number {
  return isOneBit(spec) ? spec.bitDiameter : spec.width;
}

/** The middle of the slot, half its size, and whether its ends are half circles. */
export function slotShape({ spec, railLength }: Cut) {
  const wide = cutWidth(spec);
  return {
    x: railLength / 2,
    y: spec.railWidth / 2,
    halfLength: spec.length / 2,
    halfWidth: wide / 2,
    // A corner keeps the bit's radius; a round end has the slot's own.
    corner: spec.ends === 'round' ? wide / 2 : spec.bitDiameter / 2,
  };
}

/**
 * How far a place on the rail lies past an edge `inset` inside the slot's; negative inside. Both shapes are rounded
 * rectangles: inset, a round end is concentric, and a corner keeps the bit's radius, since no less can be cut.
 */
export function pastSlot(cut: Cut, x: number, y: number, inset = 0): number {
  const shape = slotShape(cut);
  const corner = cut.spec.ends === 'round' ? shape.corner - inset : shape.corner;
  const dx = Math.abs(x - shape.x) - (shape.halfLength - inset - corner);
  const dy = Math.abs(y - shape.y) - (shape.halfWidth - inset - corner);
  return (dx > 0 && dy > 0 ? norm(dx, dy) : Math.max(dx, dy)) - corner;
}
