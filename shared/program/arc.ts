import type { Point2 } from '../geometry/point';

/**
 * The centre nearest to `centre` that is equally far from both ends of an arc.
 *
 * Ends written to the last decimal have moved by up to half a step each; a centre that has not moved with them would
 * give the two radii that NISTIR 6556 3.5.3 compares.
 */
export function evenCentre(from: Point2, to: Point2, centre: Point2): Point2 {
  const [dx, dy] = [to.x - from.x, to.y - from.y];
  const off = ((centre.x - (from.x + to.x) / 2) * dx + (centre.y - (from.y + to.y) / 2) * dy) / (dx * dx + dy * dy);
  return { x: centre.x - off * dx, y: centre.y - off * dy };
}

/**
 * Points of a quarter arc or less, the last being its end, such that chords between them stray from it by at most
 * `tolerance`: N = ceil(sweep / (2 acos(1 - e/R))) (plane geometry).
 */
export function chordPoints(from: Point2, to: Point2, centre: Point2, turn: 1 | -1, tolerance: number): Point2[] {
  const radius = Math.hypot(from.x - centre.x, from.y - centre.y);
  const start = Math.atan2(from.y - centre.y, from.x - centre.x);
  const end = Math.atan2(to.y - centre.y, to.x - centre.x);
  const full = 2 * Math.PI;
  const sweep = (((end - start) * turn) % full + full) % full;
  const count = Math.max(1, Math.ceil(sweep / (2 * Math.acos(1 - Math.min(1, tolerance / radius)))));
  return Array.from({ length: count }, (_, i) => {
    if (i === count - 1) return to;
    const angle = start + (turn * sweep * (i + 1)) / count;
    return { x: centre.x + radius * Math.cos(angle), y: centre.y + radius * Math.sin(angle) };
  });
}
