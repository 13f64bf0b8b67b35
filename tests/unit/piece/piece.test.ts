import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { CoinKind } from '#shared/coin/tally';
import { PIECE_RULES, pieceFindings } from '#shared/piece/findings';
import { PIECE_KINDS, factsOf, lanesOf } from '#shared/piece/kinds';
import { grooveOf, kindsForRail, placeRails } from '#shared/piece/rails';
import { shareSeen } from '#shared/piece/sight';
import { type PieceInput, boardForWall, pieceSchema } from '#shared/piece/spec';
import { THIRTEEN, pieceOf } from './thirteenStripes';

const squad: CoinKind = { name: 'Squad', diameter: 1.75, thickness: 0.125, count: 8, mass: null };
const tall: CoinKind = { name: 'Tall', diameter: 4, thickness: 0.15, count: 1, mass: null };
/** Coins leaning on the rim of a shelf's groove: 3/8 wide and 1/2 deep, the squad coin leans by about 26 degrees. */
const SHELF: Partial<PieceInput> = { kind: 'shelf', lanes: 2, railLanes: [1, 2], grooveDepth: '1/2' };
const everywhere = { A: ['Squad', 'Tall'], B: ['Squad', 'Tall'], C: ['Squad', 'Tall'] };
const bad = (raw: Partial<PieceInput>, kinds: readonly CoinKind[] = [squad], standing: Readonly<Record<string, readonly string[]>> = everywhere) =>
  pieceFindings(pieceOf({ ...THIRTEEN, ...raw }), kinds, standing).filter(({ severity }) => severity !== 'agrees').map(({ rule, about, severity, reason }) => `${rule} ${about} ${severity}: ${reason}`);

describe('rails on a piece', () => {
  it('beside the union are shorter by it; each is shorter than its stripe by the margins', () => {
    const [a, b, c] = placeRails(pieceOf(THIRTEEN));
    // Own arithmetic: union 0.4 of 37 wide (0.76 / 1.9), stripes 1 1/2 high, rail 3/4 thick in the middle.
    expect(a).toMatchObject({ name: 'A', top: 3 * 1.5 + 0.375, underRail: false });
    expect(a?.left).toBeCloseTo(14.8 + 0.875, 9);
    expect(a?.length).toBeCloseTo(37 - 14.8 - 1.75, 9);
    expect(b).toMatchObject({ left: 0.875, length: 35.25, grooveLength: 33.5, clearAbove: 4 * 1.5 - 0.75 });
    expect(c?.clearAbove).toBe(5.25);
  });

  it('stay on the board and off the union, whatever the board', () => {
    const raw = fc.record({ width: fc.integer({ min: 12, max: 60 }), height: fc.integer({ min: 10, max: 40 }), unionWidth: fc.integer({ min: 0, max: 12 }), lanes: fc.uniqueArray(fc.integer({ min: 1, max: 13 }), { minLength: 1, maxLength: 6 }), laneMargin: fc.integer({ min: 0, max: 3 }) });
    fc.assert(fc.property(raw, ({ lanes, ...sizes }) => {
      const piece = pieceOf({ ...THIRTEEN, ...sizes, railLanes: lanes });
      for (const rail of placeRails(piece)) {
        expect(rail.left + rail.length + sizes.laneMargin).toBeCloseTo(sizes.width, 9);
        if (rail.top < (sizes.height * 7) / 13 - 1) expect(rail.left).toBeGreaterThanOrEqual(sizes.unionWidth);
        expect(rail.length - rail.grooveLength).toBeCloseTo(1.75, 9);
      }
    }));
  });

  it('take the kinds that have room under what is above', () => {
    const piece = pieceOf({ ...THIRTEEN, railLanes: [4, 6] });
    const [a, b] = placeRails(piece);
    if (!a || !b) throw new Error('two rails were placed');
    expect(kindsForRail([squad, tall], a, grooveOf(piece))).toEqual(['Squad', 'Tall']);
    expect(kindsForRail([squad, tall], b, grooveOf(piece))).toEqual(['Squad']);
  });
});

describe('what is said of a piece', () => {
  it('is nothing bad where rails, coins and sight have room', () => {
    expect(bad({ railLanes: [4, 10, 13] })).toEqual([]);
  });

  it.each<[string, Partial<PieceInput>, readonly CoinKind[], string]>([
    ['a board of its own proportion', { width: 28 }, [squad], 'proportion  caution: ownProportion'],
    ['a rail with no length left', { width: 12, unionWidth: 9 }, [squad], 'railOnBoard A disagrees: tooShort'],
    ['a rail thicker than its stripe', { height: 9 }, [], 'railInLane A caution: thickerThanLane'],
    ['rails that meet', { height: 9, railLanes: [8, 9] }, [], 'railsApart A B disagrees: railsMeet'],
    ['coins that meet the rail above', { railLanes: [8, 10] }, [tall], 'coinsClear B: Tall disagrees: meetsRailAbove'],
    ['coins with no room to lift', { railLanes: [8, 9], height: 29 }, [squad], 'liftOut B: Squad caution: noRoomToLift'],
    ['coins higher than the board', { railLanes: [1, 12], unionWidth: 0 }, [squad], 'coinsBacked A: Squad disagrees: aboveBoard'],
    ['coins before the union', { railLanes: [8] }, [tall], 'clearOfUnion A: Tall caution: coinsBeforeUnion'],
    ['faces behind the rail above', { kind: 'plank-board', lanes: 32, railLanes: [31, 32], height: 80 }, [squad], 'sight B: Squad caution: partHidden'],
    ['shelf rows without room for a finger', { ...SHELF, height: 2.7 }, [squad], 'rowsApart A caution: noRoomForFinger'],
    ['shelf rows that meet', { ...SHELF, height: 1.7 }, [squad], 'rowsApart A disagrees: touch'],
  ])('speaks of %s', (_what, raw, kinds, expected) => {
    expect(bad(raw, kinds)).toContain(expected);
  });

  it('is that a coin has no board behind its top exactly where the board ends below it', () => {
    // Own arithmetic: 1 3/4 in at 23.5 degrees (FACTS.md D2) rests 1.75 cos a − 3/16 = 1.417 above the rail's top;
    // in four lanes of 12 in the rail's top is 1 1/8 below the board's edge, in three 1 5/8.
    const planks = (lanes: number) => bad({ kind: 'plank-board', lanes, railLanes: [1], height: 12 }).filter((line) => line.startsWith('coinsBacked'));
    expect(planks(4)).toEqual(['coinsBacked A: Squad disagrees: aboveBoard']);
    expect(planks(3)).toEqual([]);
  });

  it('is nothing of shelf rows that stand apart', () => {
    expect(bad({ ...SHELF, height: 6 }).filter((line) => line.startsWith('rowsApart'))).toEqual([]);
  });

  it('has a case above for every rule', () => {
    const cases = ['proportion', 'railOnBoard', 'railInLane', 'clearOfUnion', 'railsApart', 'coinsClear', 'liftOut', 'coinsBacked', 'sight', 'rowsApart'];
    expect([...PIECE_RULES].sort()).toEqual(cases.sort());
  });

  it('sees a face from straight before it whole, and under an edge the part that a ray test sees', () => {
    const face = { foot: { out: 0.8, up: -0.1 }, top: { out: 0.1, up: 1.5 } };
    const lip = { out: 0.8, up: 0 };
    fc.assert(fc.property(fc.double({ min: -40, max: 40, noNaN: true }), fc.double({ min: 10, max: 100, noNaN: true }), fc.double({ min: 0.2, max: 3, noNaN: true }), (above, out, up) => {
      const edge = { out: 1.25, up };
      const [n, eye] = [2000, { above, out }];
      let open = 0;
      for (let i = 0; i < n; i++) {
        const k = (i + 0.5) / n;
        const at = { out: face.foot.out + k * (face.top.out - face.foot.out), up: face.foot.up + k * (face.top.up - face.foot.up) };
        const rayAt = (x: number) => at.up + ((eye.above - at.up) * (x - at.out)) / (eye.out - at.out);
        if (rayAt(edge.out) <= edge.up && rayAt(lip.out) >= lip.up) open++;
      }
      expect(shareSeen(face, eye, edge, lip)).toBeCloseTo(open / n, 2);
    }));
  });
});

describe('a piece as a form gives it', () => {
  const refused = (raw: object) => {
    const parsed = pieceSchema.safeParse({ ...THIRTEEN, ...raw });
    return parsed.success ? [] : parsed.error.issues.map(({ path }) => path.join('.'));
  };

  it.each([
    [{ width: 'wide' }, ['width']], [{ width: undefined }, ['width']], [{ height: 1000 }, ['height']], [{ lanes: 12 }, ['lanes']], [{ kind: 'plank-board' }, ['lanes']],
    [{ railLanes: [] }, ['railLanes']], [{ railLanes: [14] }, ['railLanes']], [{ railLanes: [3, 3] }, ['railLanes']], [{ grooveWidth: 2 }, ['grooveWidth']], [{ grooveDepth: 1 }, ['grooveDepth']],
    [{ unionWidth: 40 }, ['unionWidth']], [{ units: 'ft' }, ['units']], [{ gap: -1 }, ['gap']], [{ colour: 'red' }, ['']],
  ])('refuses %j at %j', (raw, fields) => {
    expect(refused(raw)).toEqual(fields);
  });

  it('knows every kind of the table', () => {
    for (const kind of PIECE_KINDS) expect(lanesOf(kind, { width: 30, height: 26, lanes: factsOf(kind).lanes ?? 4, unionWidth: 12 })).toHaveLength(factsOf(kind).lanes ?? 4);
  });

  it('makes the largest board that a wall takes', () => {
    expect(boardForWall({ width: 40, height: 30 }, 1, 1.9)).toEqual({ width: 38, height: 20 });
    expect(boardForWall({ width: 80, height: 12 }, 1, 1.9)).toEqual({ width: 19, height: 10 });
    expect(boardForWall({ width: 40, height: 30 }, 0, null)).toEqual({ width: 40, height: 30 });
    expect(boardForWall({ width: 4, height: 30 }, 2, 1.9)).toBeNull();
  });
});
