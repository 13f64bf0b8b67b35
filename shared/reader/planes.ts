import type { Point3 } from '../geometry/point';

/** A plane's axes in the order that turns counterclockwise seen from the positive end of its normal (NISTIR 6556 4.3.6.1). */
export interface Plane {
  readonly first: keyof Point3;
  readonly second: keyof Point3;
  readonly normal: keyof Point3;
  /** The words for the centre's offsets along `first` and `second`. */
  readonly offsets: readonly ['I' | 'K' | 'J', 'J' | 'I' | 'K'];
}

/** G17, G18 and G19 (3.5.6). */
export const PLANES: Readonly<Record<17 | 18 | 19, Plane>> = {
  17: { first: 'x', second: 'y', normal: 'z', offsets: ['I', 'J'] },
  18: { first: 'z', second: 'x', normal: 'y', offsets: ['K', 'I'] },
  19: { first: 'y', second: 'z', normal: 'x', offsets: ['J', 'K'] },
};
