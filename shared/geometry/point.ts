/** A point of the plane, in the units of whoever holds it. */
export interface Point2 {
  readonly x: number;
  readonly y: number;
}

/** A point in space: X along the rail, Y across it, Z up, zero on the rail's top. */
export interface Point3 extends Point2 {
  readonly z: number;
}

/** Length of a plane vector. Math.hypot also guards against sizes that no rail has, at several times the cost. */
export function norm(x: number, y: number): number {
  return Math.sqrt(x * x + y * y);
}
