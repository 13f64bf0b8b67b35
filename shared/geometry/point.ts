/** A point of the plane, in the units of whoever holds it. */
export interface Point2 {
  readonly x: number;
  readonly y: number;
}

/** A point in space: X along the rail, Y across it, Z up, zero on the rail's top. */
export interface Point3 extends Point2 {
  readonly z: number;
}
