import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { makeProgram } from '#shared/makeProgram';
import { slotRequestSchema } from '#shared/slot/request';
import { CHECK_BARS, checkBarPath } from '../../../app/utils/checkBar';
import { FIRST_DRAFT, withPick } from '../../../app/utils/draft';
import { drawnRail } from '../../../app/utils/drawn';
import { rawRequestOf } from '../../../app/utils/rawRequest';
import { OVERLAP, TILE, type TemplateSizes, entryOf, joinsOn, template, toPx, windows } from '../../../app/utils/template';

const RAIL: TemplateSizes = {
  units: 'in', railLength: 26.25, railWidth: 1.25, length: 24.5, width: 0.375, stopMargin: 0.875, cornerRadius: 0.125, bitDiameter: 0.25, workZero: 'corner',
};

describe('the template at true size', () => {
  it('is 96 px to the inch, in either unit', () => {
    expect(toPx(1, 'in')).toBe(96);
    expect(toPx(25.4, 'mm')).toBe(96);
  });

  it('draws rail and slot at their sizes, the slot in the middle, zero at the front left corner', () => {
    const { rail, slot, zero } = template(RAIL, null);
    expect([rail.width, rail.height]).toEqual([26.25 * 96, 120]);
    expect([slot.width, slot.height, slot.radius]).toEqual([24.5 * 96, 36, 12]);
    expect(slot.x - rail.x).toBe(84);
    expect(rail.x + rail.width - slot.x - slot.width).toBe(84);
    expect(slot.y - rail.y).toBe(42);
    expect(zero).toEqual({ x: rail.x, y: rail.y + rail.height });
    expect(template({ ...RAIL, workZero: 'centre' }, null).zero).toEqual({ x: rail.x + rail.width / 2, y: rail.y + rail.height / 2 });
  });

  it('puts the bit where it goes in, Y up from the front edge', () => {
    const { rail, bit } = template(RAIL, { x: 1, y: 0.5 });
    expect(bit).toEqual({ x: rail.x + 96, y: rail.y + rail.height - 48, radius: 12 });
    expect(template(RAIL, null).bit).toBeNull();
  });

  it.each(['', 'centre'])('finds the entry in the program, work zero "%s": inside the slot, clear of its walls', (workZero) => {
    const draft = withPick(FIRST_DRAFT, 'workZero', workZero);
    const made = makeProgram(slotRequestSchema.parse(rawRequestOf(draft)));
    const rail = drawnRail(draft);
    const entry = entryOf(made.steps, made.spec);
    if (!rail || !entry) throw new Error('the first drawing has no entry');
    const { slot, bit } = template(rail, entry);
    if (!bit) throw new Error('no bit');
    for (const gap of [bit.x - slot.x, slot.x + slot.width - bit.x, bit.y - slot.y, slot.y + slot.height - bit.y]) expect(gap).toBeGreaterThanOrEqual(bit.radius - 1e-6);
    expect(entryOf([], made.spec)).toBeNull();
  });

  it('cuts any span into windows that cover it, overlap enough, and meet where both show it', () => {
    fc.assert(fc.property(fc.double({ min: 1, max: 30000, noNaN: true }), fc.double({ min: 200, max: 1000, noNaN: true }), fc.double({ min: 1, max: 100, noNaN: true }), (span, room, overlap) => {
      const { size, starts, joins } = windows(span, room, overlap);
      expect(size).toBeLessThanOrEqual(room);
      expect(starts[0]).toBe(0);
      expect((starts.at(-1) ?? 0) + size).toBeCloseTo(span, 6);
      expect(joins.length).toBe(starts.length - 1);
      joins.forEach((join, i) => {
        const [left = 0, right = 0] = starts.slice(i, i + 2);
        expect(left + size - right).toBeGreaterThanOrEqual(overlap - 1e-6);
        expect(join).toBeGreaterThan(right);
        expect(join).toBeLessThan(left + size);
      });
      // One window fewer would not reach.
      if (starts.length > 1) expect((starts.length - 1) * room - (starts.length - 2) * overlap).toBeLessThan(span);
    }));
  });

  it('puts every place of every rail on a paper no larger than a tile, numbered in order', () => {
    fc.assert(fc.property(fc.double({ min: 1, max: 120, noNaN: true }), fc.double({ min: 0.5, max: 20, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true }), (long, wide, share) => {
      const { rail, tiles } = template({ ...RAIL, railLength: long, railWidth: wide }, null);
      const [x, y] = [rail.x + share * rail.width, rail.y + share * rail.height];
      expect(tiles.some((tile) => x >= tile.x - 1e-6 && x <= tile.x + tile.width + 1e-6 && y >= tile.y - 1e-6 && y <= tile.y + tile.height + 1e-6)).toBe(true);
      for (const tile of tiles) {
        expect(tile.width).toBeLessThanOrEqual(TILE.width);
        expect(tile.height).toBeLessThanOrEqual(TILE.height);
      }
      expect(tiles.map(({ number }) => number)).toEqual(tiles.map((_, i) => i + 1));
    }));
  });

  it('names each join once, and shows it on exactly the two papers that meet there', () => {
    const whole = template(RAIL, null);
    expect(whole.tiles.length).toBe(3);
    expect(whole.upright.map(({ name }) => name)).toEqual(['join 1', 'join 2']);
    expect(whole.tiles.map((tile) => joinsOn(tile, whole).upright.map(({ name }) => name))).toEqual([['join 1'], ['join 1', 'join 2'], ['join 2']]);
    const wide = template({ ...RAIL, railLength: 8, railWidth: 9 }, null);
    expect(wide.level.map(({ name }) => name)).toEqual(['join 1', 'join 2'].slice(0, wide.tiles.length - 1));
    expect(wide.tiles.every((tile) => joinsOn(tile, wide).level.length > 0)).toBe(true);
    expect(OVERLAP).toBeGreaterThanOrEqual(48);
  });
});

describe('the check bars', () => {
  it('are 4 in and 100 mm at 96 px to the inch', () => {
    expect(CHECK_BARS.map(({ words, length }) => [words, (length / 96) * 25.4])).toEqual([['4 in', 101.6], ['100 mm', expect.closeTo(100, 9)]]);
  });

  it('are a line with a tick at every part, the ends included', () => {
    expect(checkBarPath({ length: 384, parts: 4 }, 2, 10)).toBe('M2 10H386M2 2v16M98 6v8M194 6v8M290 6v8M386 2v16');
  });
});
