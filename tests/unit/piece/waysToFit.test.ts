import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type AssignRequest, assignCoins } from '#shared/piece/assign';
import { boardForCoins, railRooms } from '#shared/piece/boardForCoins';
import { coinPlaces } from '#shared/piece/places';
import { waysToFit } from '#shared/piece/waysToFit';
import { THIRTEEN, pieceOf } from './thirteenStripes';

const leftOut = (request: AssignRequest) => {
  const answer = assignCoins(request);
  return answer.ok ? answer.assignment.unplaced.reduce((sum, { count, toCome }) => sum + count + toCome, 0) : NaN;
};

const requests: fc.Arbitrary<AssignRequest> = fc.record({
  counts: fc.tuple(fc.nat(6), fc.nat(4)), lengths: fc.array(fc.integer({ min: 40, max: 200 }), { minLength: 1, maxLength: 3 }), gap: fc.integer({ min: 3, max: 12 }),
}).map(({ counts, lengths, gap }) => ({
  units: 'mm' as const, gap, pins: [], evenWithin: 0, rails: lengths.map((length, n) => ({ name: `r${n}`, length, takes: null })),
  kinds: [{ name: 'a', diameter: 23, count: counts[0], toCome: 0 }, { name: 'b', diameter: 31, count: counts[1], toCome: 0 }],
}));
const leeway = { leastGap: 3, stopMargin: 25, leastStopMargin: 6 };

describe('ways to make coins fit', () => {
  it('make them fit, and one mark less does not', () => {
    let met = 0;
    fc.assert(fc.property(requests, (request) => {
      const ways = waysToFit(request, leeway);
      if (leftOut(request) === 0) {
        expect(ways).toEqual([]);
        return;
      }
      for (const way of ways) {
        met++;
        expect(way.proved).toBe(true);
        const changed = (back: number): AssignRequest => {
          switch (way.change) {
            case 'gap': return { ...request, gap: way.to + back };
            case 'stopMargin': return { ...request, rails: request.rails.map((rail) => ({ ...rail, length: rail.length + 2 * (way.from - way.to - back) })) };
            case 'grooveLength': return { ...request, rails: request.rails.map((rail) => ({ ...rail, length: rail.length + way.by - back })) };
            case 'rails': return { ...request, rails: [...request.rails, ...Array.from({ length: way.more - back }, (_, n) => ({ name: `new${n}`, length: way.length, takes: null }))] };
          }
        };
        expect(leftOut(changed(0))).toBe(0);
        expect(leftOut(changed(1))).toBeGreaterThan(0);
      }
    }), { numRuns: 200 });
    expect(met).toBeGreaterThan(100);
  });

  it('stay within what may be changed', () => {
    fc.assert(fc.property(requests, (request) => {
      for (const way of waysToFit(request, leeway)) {
        if (way.change === 'gap') expect(way.to).toBeGreaterThanOrEqual(leeway.leastGap);
        if (way.change === 'stopMargin') expect(way.to).toBeGreaterThanOrEqual(leeway.leastStopMargin);
        if (way.change === 'rails') expect(request.rails.length + way.more).toBeLessThanOrEqual(12);
      }
    }));
  });

  it('change a gap of 1/4 in to 3/16 where that is what it takes', () => {
    // Own arithmetic: ten 1 1/2 coins want 15 + 11 gaps: 17 3/4 at 1/4, 17 1/16 at 3/16.
    const request: AssignRequest = { units: 'in', gap: 0.25, pins: [], evenWithin: 0, rails: [{ name: 'A', length: 17.5, takes: null }], kinds: [{ name: 'm', diameter: 1.5, count: 10, toCome: 0 }] };
    expect(waysToFit(request, { leastGap: 0.125, stopMargin: 0.875, leastStopMargin: 0.25 })).toEqual([
      { change: 'gap', from: 0.25, to: 0.1875, proved: true }, { change: 'stopMargin', from: 0.875, to: 0.75, proved: true },
      { change: 'grooveLength', by: 0.25, proved: true }, { change: 'rails', more: 1, length: 17.5, proved: true },
    ]);
  });
});

describe('places of coins in a groove', () => {
  it('leave one gap between all and at both ends, kinds together, coins to come last', () => {
    const contents = { name: 'A', spare: 0, kinds: [{ name: 'a', count: 2, toCome: 1 }, { name: 'b', count: 1, toCome: 0 }] };
    const { gap, places } = coinPlaces(100, contents, [{ name: 'a', diameter: 20 }, { name: 'b', diameter: 30 }]);
    expect(gap).toBe(2);
    expect(places.map(({ kind, middle, toCome }) => [kind, middle, toCome])).toEqual([['a', 12, false], ['a', 34, false], ['b', 61, false], ['a', 88, true]]);
  });
});

describe('a board for coins', () => {
  it('takes them, and one mark less wide does not', () => {
    const piece = pieceOf({ ...THIRTEEN, railLanes: [4, 8, 12] });
    fc.assert(fc.property(fc.integer({ min: 1, max: 60 }), fc.integer({ min: 0, max: 20 }), (first, second) => {
      const kinds = [{ name: 'a', diameter: 1.75, thickness: 0.125, count: first, mass: null, toCome: 0 }, { name: 'b', diameter: 1.5, thickness: 0.118, count: second, mass: null, toCome: 0 }];
      const board = boardForCoins(piece, kinds);
      if (!board) throw new Error('a board of 256 in takes them');
      const roomsAt = (width: number) => railRooms({ ...piece, width, height: (piece.height * width) / piece.width, unionWidth: (piece.unionWidth * width) / piece.width }, kinds);
      const out = (width: number) => leftOut({ units: 'in', gap: piece.gap, pins: [], evenWithin: 0, kinds, rails: roomsAt(width) });
      expect(board.width / board.height).toBeCloseTo(piece.width / piece.height, 9);
      expect(out(board.width)).toBe(0);
      const narrower = board.width - 1 / 16;
      expect(out(narrower) > 0 || roomsAt(narrower).some(({ length }) => length <= 0)).toBe(true);
    }), { numRuns: 40 });
  });
});
