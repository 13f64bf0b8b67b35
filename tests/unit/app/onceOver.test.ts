import { describe, expect, test } from 'vitest';
import { onceOver } from '../../../app/utils/onceOver';

/** A way as its points' x and y in turn. */
const once = (...points: readonly (readonly [number, number])[]) => onceOver(points.map(([x]) => x), points.map(([, y]) => y));

describe('a way drawn once', () => {
  test('one that never meets itself is drawn as it runs', () => {
    expect(once([0, 0], [10, 0], [10, 5], [0, 5])).toBe('M0.0 0.0L10.0 0.0L10.0 5.0L0.0 5.0');
  });

  test('going back over a stretch adds nothing; going past it adds what is new', () => {
    expect(once([0, 0], [10, 0], [4, 0])).toBe('M0.0 0.0L10.0 0.0');
    expect(once([2, 0], [6, 0], [0, 0])).toBe('M2.0 0.0L6.0 0.0M2.0 0.0L0.0 0.0');
    expect(once([2, 0], [4, 0], [4, 5], [6, 5], [6, 0], [0, 0])).toContain('M2.0 0.0L0.0 0.0');
  });

  test('a stretch that bridges two is drawn between them, and then all three are one', () => {
    const way = once([0, 0], [2, 0], [2, 9], [5, 9], [5, 0], [8, 0], [0, 0], [8, 0]);
    expect(way.match(/M2\.0 0\.0L5\.0 0\.0|M5\.0 0\.0L2\.0 0\.0/g)).toHaveLength(1);
    expect(way.endsWith('2.0 0.0')).toBe(true);
  });

  test('two laps round an end draw its pieces once, in either direction', () => {
    const lap = [[0, 0], [1, 1], [0, 2]] as const;
    expect(once(...lap, [1, 1], [0, 0], ...lap)).toBe('M0.0 0.0L1.0 1.0L0.0 2.0');
  });

  test('nothing is drawn of a single place', () => {
    expect(once([3, 3])).toBe('');
    expect(once([3, 3], [3, 3])).toBe('');
  });
});
