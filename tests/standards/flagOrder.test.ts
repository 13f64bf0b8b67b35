import { describe, expect, it } from 'vitest';
import { lanesOf, unionOf } from '#shared/piece/kinds';
import { boardForStripe } from '#shared/piece/spec';

/** Executive Order 10834 (21 August 1959), attachment, as printed (FACTS.md E1): shares of the hoist, to the digits printed there. */
const ORDER = { fly: 1.9, unionHoist: 0.5385, unionFly: 0.76, stripe: 0.0769 } as const;

describe('a flag board in the order\'s proportions', () => {
  const board = boardForStripe(1.5);
  const outline = { ...board, lanes: 13, unionWidth: ORDER.unionFly * board.height };

  it('of thirteen 1 1/2 in strips is 19.5 by 37.05 with a union of 10.5 by 14.82', () => {
    // FACTS.md E1, "Board of 13 rails of 1x2", worked out there.
    expect(board.height).toBeCloseTo(19.5, 9);
    expect(board.width).toBeCloseTo(37.05, 9);
    const union = unionOf('striped-flag', outline);
    expect(union?.height).toBeCloseTo(10.5, 9);
    expect(union?.width).toBeCloseTo(14.82, 9);
  });

  it('has the printed shares', () => {
    const union = unionOf('striped-flag', outline);
    expect(board.width / board.height).toBeCloseTo(ORDER.fly, 9);
    expect((union?.height ?? 0) / board.height).toBeCloseTo(ORDER.unionHoist, 4);
    expect(lanesOf('striped-flag', outline)[0]?.height).toBeCloseTo(ORDER.stripe * board.height, 2);
  });

  it('has thirteen stripes, seven of them beside the union and shorter by it', () => {
    const lanes = lanesOf('striped-flag', outline);
    expect(lanes).toHaveLength(13);
    expect(lanes.filter(({ left }) => left > 0).map(({ words }) => words)).toEqual(['stripe 1', 'stripe 2', 'stripe 3', 'stripe 4', 'stripe 5', 'stripe 6', 'stripe 7']);
    expect(lanes.reduce((sum, { height }) => sum + height, 0)).toBeCloseTo(board.height, 9);
  });
});
