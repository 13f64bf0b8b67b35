import { type Point2, norm } from '../geometry/point';
import type { Piece } from './cut';

/** A part of the line that the bit's centre must follow so that the cutter makes a wall: straight, or round a centre. */
export type EdgePart = (t: number) => Point2;

/** The edge of a rounded rectangle in its four sides and four corners, each over t = 0 … 1; without a radius the sides meet. */
export function edgeParts(middle: Point2, halfLength: number, halfWidth: number, corner: number): EdgePart[] {
  const [a, b] = [halfLength - corner, halfWidth - corner];
  const straight = (x0: number, y0: number, x1: number, y1: number): EdgePart => (t) =>
    ({ x: middle.x + x0 + t * (x1 - x0), y: middle.y + y0 + t * (y1 - y0) });
  const round = (x: number, y: number, start: number): EdgePart => (t) => {
    const angle = start + (t * Math.PI) / 2;
    return { x: middle.x + x + corner * Math.cos(angle), y: middle.y + y + corner * Math.sin(angle) };
  };
  const parts: readonly (readonly [EdgePart, EdgePart])[] = [
    [straight(-a, -halfWidth, a, -halfWidth), round(a, -b, -Math.PI / 2)], [straight(halfLength, -b, halfLength, b), round(a, b, 0)],
    [straight(a, halfWidth, -a, halfWidth), round(-a, b, Math.PI / 2)], [straight(-halfLength, b, -halfLength, -b), round(-a, -b, Math.PI)],
  ];
  return parts.flatMap(([side, bend]) => (corner > 0 ? [side, bend] : [side]));
}

/**
 * True where every point of an edge part is within a distance of the way that some pieces run.
 *
 * A stretch is proved by one piece near both its ends, since the distance to a piece is convex, less what the stretch
 * bulges from its chord; else it is halved, until it is shorter than the distance itself.
 */
export function follows(part: EdgePart, pieces: readonly Piece[], within: number): boolean {
  const search = (t0: number, t1: number, near: readonly Piece[]): boolean => {
    const [p, q, middle] = [part(t0), part(t1), part((t0 + t1) / 2)];
    const half = Math.max(distance(p, middle), distance(q, middle));
    const reaching = near.filter((piece) => distanceTo(piece, middle) <= within + half);
    // Over a quarter circle the greatest bulge is in the middle; twice it is above any other point's for sure.
    const bulge = 2 * distance(middle, { x: (p.x + q.x) / 2, y: (p.y + q.y) / 2 });
    if (reaching.some((piece) => Math.max(distanceTo(piece, p), distanceTo(piece, q)) + bulge <= within)) return true;
    if (half < within / 4 || reaching.every((piece) => distanceTo(piece, middle) > within)) return false;
    return search(t0, (t0 + t1) / 2, reaching) && search((t0 + t1) / 2, t1, reaching);
  };
  return search(0, 1, pieces);
}

function distance(a: Point2, b: Point2): number {
  return norm(a.x - b.x, a.y - b.y);
}

function distanceTo({ x0, y0, x1, y1 }: Piece, { x, y }: Point2): number {
  const [dx, dy] = [x1 - x0, y1 - y0];
  const square = dx * dx + dy * dy;
  const t = square === 0 ? 0 : Math.min(1, Math.max(0, ((x - x0) * dx + (y - y0) * dy) / square));
  return norm(x0 + t * dx - x, y0 + t * dy - y);
}
