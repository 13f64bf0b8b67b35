import type { Point2, Point3 } from '../geometry/point';
import type { Turn } from './lap';

/** What a cutting move is for; the feed follows from it. */
export const MOVE_ROLES = ['plunge', 'ramp', 'pass', 'finish'] as const;
export type MoveRole = (typeof MOVE_ROLES)[number];

/** One cutting move to a point: straight, or round a centre by a quarter turn at most. */
export interface CutMove {
  readonly to: Point3;
  readonly arc: { readonly centre: Point2; readonly turn: Turn } | null;
  readonly role: MoveRole;
}

/** One slot's continuous cut, in the spec's units, measured from the work zero. */
export interface SlotPath {
  /** Where the bit comes down, and the height above the wood where the cut begins. */
  readonly start: Point3;
  readonly moves: readonly CutMove[];
  /** Depth reached by each pass, the last one the slot's. */
  readonly levels: readonly number[];
}
