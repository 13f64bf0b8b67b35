// NISTIR 6556 3.5.3: both worked examples, sweeps in both formats, all three planes.
import { describe, expect, it } from 'vitest';
import { accepted, degrees, motions } from './reading';
import type { Motion } from '#shared/reader/motion';

const arcOf = (text: string): Motion => {
  const arc = motions(accepted(`${text}\nM2`)).at(-1);
  return arc ?? expect.fail('no motion');
};

describe('the centre format’s worked example (3.5.3.2)', () => {
  const arc = arcOf('G0 x7 y7 z9\nG17 G2 x 10 y 16 i 3 j 4 z 9');

  it('has its centre at (10, 11), radius 5, clockwise', () => {
    expect(arc).toMatchObject({ kind: 'arc', to: { x: 10, y: 16, z: 9 }, arc: { centre: { x: 10, y: 11, z: 9 }, radius: 5, turn: -1 } });
  });

  it('turns from the lower left of its centre clockwise to straight above: 180 - atan(3/4) degrees', () => {
    expect(degrees(arc.arc?.sweep ?? NaN)).toBeCloseTo(180 - degrees(Math.atan(3 / 4)), 10);
  });

  it('is a helix where the start is not at Z9', () => {
    expect(arcOf('G0 x7 y7 z5\nG17 G2 x 10 y 16 i 3 j 4 z 9')).toMatchObject({ from: { z: 5 }, to: { z: 9 }, arc: { centre: { x: 10, y: 11, z: 5 } } });
  });
});

describe('the radius format’s worked example (3.5.3.1)', () => {
  it('ends at (10, 15, 5) on a circle of radius 20, clockwise, through 180 degrees or less', () => {
    const { from, to, arc } = arcOf('G17 G2 x 10 y 15 r 20 z 5');
    if (arc === null) return expect.fail('no arc');
    expect(to).toEqual({ x: 10, y: 15, z: 5 });
    expect(arc.radius).toBe(20);
    expect(arc.turn).toBe(-1);
    const chord = Math.hypot(10, 15);
    expect(arc.sweep).toBeCloseTo(2 * Math.asin(chord / 40), 12);
    for (const point of [from, to]) expect(Math.hypot(point.x - arc.centre.x, point.y - arc.centre.y)).toBeCloseTo(20, 12);
    // Clockwise and less than half a turn: the centre is to the right of the way from start to end.
    expect(10 * arc.centre.y - 15 * arc.centre.x).toBeLessThan(0);
  });
});

describe('sweeps', () => {
  it.each([
    ['a quarter, clockwise', 'G2 X1 Y1 I1', 90],
    ['three quarters, counterclockwise', 'G3 X1 Y1 I1', 270],
    ['a full circle', 'G3 X0 I1', 360],
    ['a full circle in the XZ plane', 'G18 G2 X0 K3', 360],
    ['R at most 180', 'G3 X1 Y1 R1', 90],
    ['R negative, at least 180', 'G3 X1 Y1 R-1', 270],
    ['half a turn by R', 'G2 X2 R1', 180],
    ['half a turn by negative R', 'G2 X2 R-1', 180],
  ])('%s', (_, text, sweep) => {
    expect(degrees(arcOf(text).arc?.sweep ?? NaN)).toBeCloseTo(sweep, 9);
  });

  it('sees each plane from the positive end of its normal (4.3.6.1)', () => {
    // A quarter turn counterclockwise carries the plane's first axis to its second: X to Y, Z to X, Y to Z.
    expect(arcOf('G0 X1\nG17 G3 X0 Y1 I-1').arc).toMatchObject({ sweep: Math.PI / 2, turn: 1 });
    expect(arcOf('G0 Z1\nG18 G3 Z0 X1 K-1').arc).toMatchObject({ sweep: Math.PI / 2, turn: 1 });
    expect(arcOf('G0 Y1\nG19 G3 Y0 Z1 J-1').arc).toMatchObject({ sweep: Math.PI / 2, turn: 1 });
  });
});
