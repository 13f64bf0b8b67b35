import { describe, expect, it } from 'vitest';
import { makeProgram } from '#shared/makeProgram';
import { finishSteps, pathSegments } from '#shared/playback/index';
import { isMotion } from '#shared/time/index';
import { slotRequestSchema } from '#shared/slot/request';

const SLOT = { units: 'in', length: 24.5, width: 0.375, depth: 0.1875, stopMargin: 0.875, stepdown: 3 / 32, railWidth: 1.25, bitDiameter: 0.25 } as const;
const ALLOWANCE = 0.02;

/** Half the room of the bit's centre, from the slot alone. */
const HALF = { x: (SLOT.length - SLOT.bitDiameter) / 2, y: (SLOT.width - SLOT.bitDiameter) / 2 };
const MIDDLE = { x: SLOT.stopMargin + SLOT.length / 2, y: SLOT.railWidth / 2 };

function laps(more: object) {
  const { timeline } = makeProgram(slotRequestSchema.parse({ ...SLOT, ...more }));
  const finish = finishSteps(timeline, 'finishAllowance' in more ? ALLOWANCE : 0);
  const of = (kind: number) => timeline.steps.flatMap((step, i) => (isMotion(step) && finish[i] === kind ? [step] : []));
  return { timeline, finish, finishing: of(1), others: of(0) };
}

describe('finishSteps', () => {
  it('finds none where nothing is left on the walls', () => {
    expect(laps({}).finishing).toEqual([]);
  });

  it.each([
    ['cornered ends', {}],
    ['round ends', { ends: 'round' }],
    ['round ends as chords', { ends: 'round', options: { chordTolerance: 0.0002 } }],
    ['a wide slot', { width: 0.625 }],
  ])('finds one lap along the walls, at full depth: %s', (_, more) => {
    const { finishing, others } = laps({ finishAllowance: ALLOWANCE, ...more });
    const half = { ...HALF, y: 'width' in more ? (0.625 - SLOT.bitDiameter) / 2 : HALF.y };
    expect(new Set(finishing.map(({ to }) => to.z))).toEqual(new Set([-SLOT.depth]));
    const reach = (axis: 'x' | 'y') => finishing.map(({ to }) => Math.abs(to[axis] - MIDDLE[axis]));
    expect(Math.max(...reach('x'))).toBeCloseTo(half.x, 3);
    expect(Math.max(...reach('y'))).toBeCloseTo(half.y, 3);
    const length = finishing.reduce((sum, { from, to, arc }) => sum + (arc ? arc.radius * arc.sweep : Math.hypot(to.x - from.x, to.y - from.y)), 0);
    const round = 'ends' in more ? 2 * Math.PI * half.y + 4 * (half.x - half.y) : 4 * (half.x + half.y);
    expect(length).toBeGreaterThan(round * 0.99);
    expect(length).toBeLessThan(round * 1.1);
    // Nothing else comes that near the front and back walls.
    const wall = others.filter(({ kind, from, to }) => kind !== 'rapid' && Math.min(...[from, to].map(({ y }) => Math.abs(y - MIDDLE.y))) > half.y - ALLOWANCE / 2);
    expect(wall).toEqual([]);
  });

  it('reaches the pieces that are drawn', () => {
    const { timeline, finish } = laps({ finishAllowance: ALLOWANCE });
    const { finish: drawn } = pathSegments(timeline, 0.001, finish);
    expect(drawn?.includes(1)).toBe(true);
    expect(drawn?.includes(0)).toBe(true);
  });
});
