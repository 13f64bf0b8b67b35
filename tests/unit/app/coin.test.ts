import { describe, expect, test } from 'vitest';
import { coinOf, coinProblems, coinShape, standingWords } from '../../../app/utils/coin';
import { type Draft, FIRST_DRAFT, hasBoard, withPick, withText } from '../../../app/utils/draft';
import { draftFrom, linkOf } from '../../../app/utils/link';
import { problemsOf } from '../../../app/utils/problems';
import { rawRequestOf } from '../../../app/utils/rawRequest';
import { coinPoints, scaleForCoin, sectionView } from '../../../app/utils/sectionView';

const BARE = withText(withText(FIRST_DRAFT, 'coinDiameter', ''), 'coinThickness', '');
const MM: Draft = { ...BARE, figures: 'mm' };
const words = (coin: { diameter: number; thickness: number }, width: number, depth: number, units: 'in' | 'mm' = 'mm') =>
  standingWords(coinShape(coin, { width, depth, boardDistance: null }).standing, coin, units);

describe('the coin in the section', () => {
  test('is the squad coin until another is typed, in either unit', () => {
    expect(coinOf(FIRST_DRAFT)).toEqual({ diameter: 1.75, thickness: 0.125 });
    expect(coinOf(BARE)).toEqual(coinOf(FIRST_DRAFT));
    expect(coinOf(MM)).toEqual({ diameter: 44.45, thickness: 3.175 });
    expect(coinOf(withText(MM, 'coinDiameter', '38.1'))).toEqual({ diameter: 38.1, thickness: 3.175 });
  });

  test('is in the link and not in the request', () => {
    const draft = withText(withText(FIRST_DRAFT, 'coinDiameter', '1 1/2'), 'coinThickness', '0.118');
    expect(rawRequestOf(draft)).toEqual(rawRequestOf(FIRST_DRAFT));
    expect(draftFrom(linkOf(draft))?.texts).toEqual(draft.texts);
    expect(linkOf(draft)).not.toBe(linkOf(FIRST_DRAFT));
  });

  test('a coin that cannot be read is said beside its box and holds nothing back', () => {
    const draft = withText(FIRST_DRAFT, 'coinThickness', 'thin');
    expect(coinOf(draft)).toBeNull();
    expect(coinProblems(draft).coinThickness?.[0]).toContain('not a size we can read');
    expect(problemsOf(draft, [])).toEqual({});
    expect(coinProblems(withText(FIRST_DRAFT, 'coinDiameter', '1/16')).coinDiameter?.[0]).toContain('That is no coin.');
    expect(coinProblems(FIRST_DRAFT)).toEqual({});
  });

  test('says how it stands', () => {
    expect(words({ diameter: 44.45, thickness: 3 }, 4, 8)).toBe('Leans 7.3°.');
    expect(words({ diameter: 38.1, thickness: 3 }, 3.5, 8)).toBe('Stands upright by itself and only rattles.');
    expect(words({ diameter: 38.1, thickness: 3 }, 3, 8)).toBe('A press fit: stands upright without play.');
    expect(words({ diameter: 44.45, thickness: 4.03 }, 4, 8)).toBe('Too thick for this groove: make it 4.1 mm or wider.');
    expect(words({ diameter: 1.75, thickness: 0.125 }, 0.12, 0.25, 'in')).toBe('Too thick for this groove: make it 9/64 in or wider.');
    expect(words({ diameter: 1.75, thickness: 0.125 }, 0.375, 0.1875, 'in')).toContain('stand a board behind it');
  });

  test("leans on the board at the rail's back edge, as on a piece, until the board is taken away", () => {
    // FACTS.md D2 and DESIGN.md 5: 3/8 + 7/16 in to the board; Founders' 19.4, Squad 23.5, Mutual-aid 28.2, Cadet 34.9 degrees.
    const before = { width: 0.375, depth: 0.1875, boardDistance: 0.4375 };
    const leans = [[2, 0.157], [1.75, 0.125], [1.5, 0.118], [1.25, 0.118]].map(([diameter = 0, thickness = 0]) => standingWords(coinShape({ diameter, thickness }, before).standing, { diameter, thickness }, 'in'));
    expect(leans).toEqual([19.4, 23.5, 28.2, 34.9].map((lean) => `Leans ${lean}° on the board behind it.`));
    const without = withPick(FIRST_DRAFT, 'coinBoard', 'none');
    expect([hasBoard(FIRST_DRAFT), hasBoard(without)]).toEqual([true, false]);
    expect(draftFrom(linkOf(without))?.picks.coinBoard).toBe('none');
    expect(rawRequestOf(without)).toEqual(rawRequestOf(FIRST_DRAFT));
  });

  test('is drawn with its low edge on the floor, its other edge at one wall and its face on the other rim', () => {
    const { corners, stands } = coinShape({ diameter: 44.45, thickness: 3 }, { width: 4, depth: 8, boardDistance: null });
    expect(stands).toBe(true);
    const [low, high, , wall] = corners;
    expect(low?.[1]).toBe(0);
    expect(wall?.[0]).toBe(0);
    const [x0, y0, x1, y1] = [low?.[0] ?? NaN, low?.[1] ?? NaN, high?.[0] ?? NaN, high?.[1] ?? NaN];
    expect(x0 + ((8 - y0) / (y1 - y0)) * (x1 - x0)).toBeCloseTo(4, 9); // on the rim at w, h
    expect(Math.hypot(x1 - x0, y1 - y0)).toBeCloseTo(44.45, 9);
  });

  test('one too thick stands on the rim', () => {
    const shape = coinShape({ diameter: 40, thickness: 5 }, { width: 4, depth: 8, boardDistance: null });
    expect(shape.stands).toBe(false);
    expect(Math.min(...shape.corners.map(([, y]) => y))).toBe(8);
  });

  test('finds room above the rail, to scale with it', () => {
    const sizes = { railWidth: 1.25, railThickness: 0.75, width: 0.15, depth: 0.25, passes: [], boardDistance: null };
    const shape = coinShape({ diameter: 1.75, thickness: 0.125 }, sizes);
    const scale = scaleForCoin(sizes, shape, { above: 160, beside: 170 });
    const view = sectionView(sizes, { middle: 180, span: 160, top: 180, most: scale });
    const ys = coinPoints(view, shape.corners).split(' ').map((pair) => Number(pair.split(',')[1]));
    expect(Math.min(...ys)).toBeGreaterThanOrEqual(19.9);
    expect(Math.max(...ys)).toBeCloseTo(view.floor, 1);
  });
});
