// NISTIR 6556 Table 12 (B.3.1, Figure 3) and Table 13 (B.4, Figure 5): the 3-4-5 triangle grown by 1 and by 1.5.
import { describe, expect, it } from 'vitest';
import type { Motion } from '#shared/reader/motion';
import { accepted, degrees, lengthOf, motions, refusal, total } from './reading';

const TABLE_12 = `N0010 G1 X1 Y5 (make first pre-entry move to C)
N0020 G41 G1 Y4 (turn compensation on and make second pre-entry move to point B)
N0030 G3 X2 Y3 I1 (make entry move to point A)
N0040 G2 X3 Y2 J-1 (cut along arc at top)
N0050 G1 Y-1 (cut along right side)
N0060 G2 X2 Y-2 I-1 (cut along arc at bottom right)
N0070 G1 X-2 (cut along bottom side)
N0080 G2 X-2.6 Y-0.2 J1 (cut along arc at bottom left)
N0090 G1 X1.4 Y2.8 (cut along third side)
N0100 G2 X2 Y3 I0.6 J-0.8 (cut along arc at top of tool path)
N0110 G40 (turn compensation off)
`;

const TABLE_13 = `N0010 G1 X1.5 Y5 (make first pre-entry move to C)
N0020 G41 G1 Y4 (turn compensation on and make second pre-entry move to point B)
N0030 G3 X2 Y3.5 I0.5 (make entry move to point A)
N0040 G2 X3.5 Y2 J-1.5 (cut along arc at top)
N0050 G1 Y-1 (cut along right side)
N0060 G2 X2 Y-2.5 I-1.5 (cut along arc at bottom right)
N0070 G1 X-2 (cut along bottom side)
N0080 G2 X-2.9 Y0.2 J1.5 (cut along arc at bottom left)
N0090 G1 X1.1 Y3.2 (cut along third side)
N0100 G2 X2 Y3.5 I0.9 J-1.2 (cut along arc at top of tool path)
N0110 G40 (turn compensation off)
`;

/** C says of both that they need a line at the end (M2). Without G41 the path is read as it is programmed. */
const whole = (table: string) => `${table}M2\n`;
const contour = (table: string) => motions(accepted(whole(table.replace('G41 ', '')))).slice(3); // after C, B and A

/** Signed area by the boundary integral: chord terms, and a segment beyond each arc's chord. */
const areaOf = (path: readonly Motion[]) =>
  total(
    path.map(({ from, to, arc }) => {
      const segment = arc === null ? 0 : (arc.turn * arc.radius ** 2 * (arc.sweep - Math.sin(arc.sweep))) / 2;
      return (from.x * to.y - to.x * from.y) / 2 + segment;
    }),
  );

describe.each([
  ['Table 12', TABLE_12, 1, 18.283185, 21.141593],
  ['Table 13', TABLE_13, 1.5, 21.424778, 31.068583],
])('%s', (_, table, radius, length, area) => {
  const path = contour(table);
  const arcs = path.flatMap(({ arc }) => arc ?? []);

  it('is refused by name with its G41', () => expect(refusal(whole(table))).toBe('codeNotRead 2:7'));

  it('closes where the entry arc touched it', () => expect(path.at(-1)?.to).toEqual(path[0]?.from));

  it('has the length of the triangle’s sides and one circle', () => {
    expect(total(path.map(lengthOf))).toBeCloseTo(12 + 2 * Math.PI * radius, 9);
    expect(total(path.map(lengthOf))).toBeCloseTo(length, 6);
  });

  it('has the area of the grown triangle, clockwise', () => {
    expect(-areaOf(path)).toBeCloseTo(6 + 12 * radius + Math.PI * radius ** 2, 9);
    expect(-areaOf(path)).toBeCloseTo(area, 6);
  });

  it('turns through one circle at the corners (2,2), (2,-1), (-2,-1) and (2,2)', () => {
    const corners = [[2, 2], [2, -1], [-2, -1], [2, 2]];
    const sweeps = [90, 90, 143.1301, 36.8699];
    expect(arcs).toHaveLength(4);
    arcs.forEach(({ centre, radius: measured, sweep, turn }, n) => {
      expect(centre.x).toBeCloseTo(corners[n]?.[0] ?? NaN, 12);
      expect(centre.y).toBeCloseTo(corners[n]?.[1] ?? NaN, 12);
      expect(measured).toBeCloseTo(radius, 12);
      expect(degrees(sweep)).toBeCloseTo(sweeps[n] ?? NaN, 4);
      expect(turn).toBe(-1);
    });
    expect(degrees(total(arcs.map(({ sweep }) => sweep)))).toBeCloseTo(360, 9);
  });
});

it('Table 13 is Table 12 moved outward by 0.5, the radius of the cutter', () => {
  const [inner, outer] = [contour(TABLE_12), contour(TABLE_13)];
  const corner = (path: readonly Motion[], n: number) => path[n]?.arc?.centre ?? path[n - 1]?.arc?.centre ?? path[n + 1]?.arc?.centre ?? { x: NaN, y: NaN };
  inner.forEach(({ from }, n) => {
    // A vertex lies on the circle around its corner: 1 out in Table 12, 1.5 out in the same direction in Table 13.
    const centre = corner(inner, n);
    expect(outer[n]?.from.x).toBeCloseTo(centre.x + (from.x - centre.x) * 1.5, 12);
    expect(outer[n]?.from.y).toBeCloseTo(centre.y + (from.y - centre.y) * 1.5, 12);
  });
});
