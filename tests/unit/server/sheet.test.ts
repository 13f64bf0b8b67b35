import { describe, expect, it } from 'vitest';
import { piecesOf, printable } from '#server/papers/paper';
import { sheetPdf } from '#server/papers/sheet';
import { benchProgramOf } from '../../support/benchProgram';
import { checkBars, pagesOf } from '../../support/pdf';

const rail = { name: 'Day room, rail A', revision: 1, quantity: 1, due: '2026-12-10' };
const sheet = (paper: 'letter' | 'a4', number = 0, held = 2) =>
  sheetPdf({ rail, shop: 'Marrow Creek Joinery', program: benchProgramOf(number, held), link: 'https://shop.example.com/bench?rail=abcdefghijklmnop&mark=K74-QDM' }, paper);

describe('the setup sheet as a PDF', () => {
  it.each([['letter', 215.9, 279.4], ['a4', 210, 297]] as const)('%s: one page, with bars of 4 in and 100 mm', async (paper, width, height) => {
    const pdf = await sheet(paper);
    const pages = pagesOf(pdf);
    expect(pages).toHaveLength(1);
    const [page] = pages;
    expect(page?.width).toBeCloseTo(width, 0);
    expect(page?.height).toBeCloseTo(height, 0);
    expect(page && checkBars(page, 5)).toEqual([expect.closeTo(101.6, 2)]);
    expect(page && checkBars(page, 11)).toEqual([expect.closeTo(100, 2)]);
  });

  it.each([[0, 0], [3, 0], [3, 1], [1, 2]])('rail %i held in way %i: nothing is drawn off the paper', async (number, held) => {
    const pdf = await sheet('letter', number, held);
    const [page] = pagesOf(pdf);
    const points = page?.paths.flatMap(({ lines }) => lines.flatMap(({ from, to }) => [from, to])) ?? [];
    expect(points.length).toBeGreaterThan(200);
    expect(Math.min(...points.map(([x]) => x))).toBeGreaterThan(9);
    expect(Math.max(...points.map(([x]) => x))).toBeLessThan(216 - 9);
    expect(Math.max(...points.map(([, y]) => y))).toBeLessThan(279.4 - 9);
  });
});

describe('letters of the page', () => {
  it.each([['Café, 3 × 4 – “x”', 'Café, 3 × 4 – “x”'], ['−0.125', '-0.125'], ['Őri', 'Ori'], ['木 rail', '? rail'], ['ﬁn', 'fin']])('%s becomes %s', (typed, shown) => {
    expect(printable(typed)).toBe(shown);
  });
  it('keep a whole number with its fraction, and take no path for one', () => {
    expect(piecesOf('hold 26 1/4 in, 3/8 deep, 100 in/min')).toEqual([
      { text: 'hold', fraction: null, after: '' }, { text: '26', fraction: ['1', '4'], after: '' }, { text: 'in,', fraction: null, after: '' },
      { text: '', fraction: ['3', '8'], after: '' }, { text: 'deep,', fraction: null, after: '' }, { text: '100', fraction: null, after: '' }, { text: 'in/min', fraction: null, after: '' },
    ]);
  });
});
