import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type ShopHours, dateOf, dayOf, weekdayOf } from '#shared/assembly/calendar';
import { CAUTIONS } from '#shared/assembly/cautions';
import { type FinishStep, coatsOf, scheduleBack } from '#shared/assembly/finish';
import { GLUE, gluePlan } from '#shared/assembly/gluing';
import { benchSteps } from '#shared/assembly/steps';
import type { Build } from '#shared/wood/cutList';
import { THIRTEEN, pieceOf } from '../piece/thirteenStripes';

const shop: ShopHours = { weekdays: [0, 1, 2, 3, 4], opens: 8, closes: 17, closed: [] };
const coat = (name: string, workHours: number, dryHours: number, recoatWithin: number | null = null): FinishStep => ({ name, workHours, dryHours, recoatWithin, from: 'product label' });
const day = (iso: string) => {
  const found = dayOf(iso);
  if (found === null) throw new Error(`${iso} is no date`);
  return found;
};
const at = (hours: number) => `${dateOf(Math.floor(hours / 24))} ${hours % 24}`;

describe('days', () => {
  it('are those of the runtime\'s own calendar', () => {
    fc.assert(fc.property(fc.integer({ min: -200_000, max: 200_000 }), (n) => {
      const date = new Date(n * 86_400_000);
      expect(dateOf(n)).toBe(date.toISOString().slice(0, 10));
      expect(dayOf(dateOf(n))).toBe(n);
      expect(weekdayOf(n)).toBe((date.getUTCDay() + 6) % 7);
    }), { numRuns: 500 });
  });

  it.each(['2026-02-29', '2026-13-01', '2026-00-10', '2026-04-31', '26-1-1', 'soon', '1900-02-29'])('%s is no date', (text) => {
    expect(dayOf(text)).toBeNull();
  });
});

describe('a schedule counted back', () => {
  it('ends when the shop opens on the due day, works in open hours and dries through the weekend', () => {
    // Own reckoning: due Friday 18 December 2026 at 8. Coat 2: 72 h before is Tuesday 8, so worked on Monday 16 to 17.
    // Coat 1: 24 h before Monday 16 is Sunday 16; worked on Friday 11 December, 16 to 17.
    const { steps, findings } = scheduleBack([coat('one', 1, 24), coat('two', 1, 72)], day('2026-12-18'), day('2026-12-01'), shop, []);
    expect(steps.map(({ work }) => at(work.from))).toEqual(['2026-12-11 16', '2026-12-14 16']);
    expect(findings).toMatchObject([{ rule: 'start', severity: 'agrees', measured: 10 }]);
  });

  it('makes room for other work and holidays', () => {
    const busy = [{ from: day('2026-12-14') * 24 + 12, to: day('2026-12-14') * 24 + 17 }];
    const { steps } = scheduleBack([coat('one', 1, 72)], day('2026-12-18'), day('2026-12-01'), { ...shop, closed: [day('2026-12-11')] }, busy);
    expect(at(steps[0]?.work.from ?? NaN)).toBe('2026-12-14 11');
    const full = [{ from: day('2026-12-14') * 24, to: day('2026-12-15') * 24 }];
    const earlier = scheduleBack([coat('one', 1, 72)], day('2026-12-18'), day('2026-12-01'), { ...shop, closed: [day('2026-12-11')] }, full);
    expect(at(earlier.steps[0]?.work.from ?? NaN)).toBe('2026-12-10 16');
  });

  it.each([
    ['too little time', [coat('one', 1, 240)], 'start disagrees: tooLate'],
    ['work longer than a day', [coat('one', 10, 1)], 'fits disagrees: longerThanDay'],
    ['a coat that waits past its window', [coat('one', 1, 1, 2), coat('two', 1, 72)], 'recoat caution: sandFirst'],
  ])('says %s', (_what, steps, expected) => {
    const { findings } = scheduleBack(steps, day('2026-12-18'), day('2026-12-10'), { ...shop, closed: [day('2026-12-14')] }, [{ from: day('2026-12-11') * 24 + 10, to: day('2026-12-11') * 24 + 16 }]);
    expect(findings.map(({ rule, severity, reason }) => `${rule} ${severity}: ${reason}`)).toContain(expected);
  });

  it('says of a shop that is never open that nothing fits', () => {
    expect(scheduleBack([coat('one', 1, 1)], 20_000, 19_000, { ...shop, weekdays: [] }, []).findings).toMatchObject([{ rule: 'fits', reason: 'neverOpen' }]);
  });

  it('keeps every step in open hours, apart from other work, in order and dry in time', () => {
    const steps = fc.array(fc.record({ workHours: fc.double({ min: 0.25, max: 8, noNaN: true }), dryHours: fc.double({ min: 0, max: 100, noNaN: true }) }), { minLength: 1, maxLength: 6 });
    const spans = fc.array(fc.record({ from: fc.integer({ min: 480_000 - 900, max: 480_000 }), hours: fc.integer({ min: 1, max: 40 }) }), { maxLength: 6 });
    fc.assert(fc.property(steps, spans, (list, taken) => {
      const busy = taken.map(({ from, hours }) => ({ from, to: from + hours }));
      const { steps: found } = scheduleBack(list.map(({ workHours, dryHours }, n) => coat(`s${n}`, workHours, dryHours)), 20_000, 0, shop, busy);
      expect(found).toHaveLength(list.length);
      found.forEach(({ work, readyAt, workHours, dryHours }, n) => {
        expect(work.to - work.from).toBeCloseTo(workHours, 6);
        expect(readyAt).toBeCloseTo(work.to + dryHours, 6);
        expect(readyAt).toBeLessThanOrEqual((found[n + 1]?.work.from ?? 20_000 * 24 + 8) + 1e-6);
        expect((work.from % 24) + 1e-6).toBeGreaterThanOrEqual(8);
        expect((work.from % 24) + workHours).toBeLessThanOrEqual(17 + 1e-6);
        expect(weekdayOf(Math.floor(work.from / 24))).toBeLessThan(5);
        for (const span of busy) expect(work.to <= span.from + 1e-6 || work.from >= span.to - 1e-6).toBe(true);
      });
    }));
  });
});

describe('glue and bench', () => {
  const build: Build = { boardThickness: 0.75, odd: 'walnut', even: 'cherry', union: 'walnut', rails: 'white-oak', battens: 'poplar', batten: { count: 4, width: 1.5, thickness: 0.75, inset: 1 } };
  const piece = pieceOf(THIRTEEN);

  it('glues no more strips at one time than the glue stays open for', () => {
    const { panels, clamps, poundsEach, steps } = gluePlan(piece, 0.75);
    expect(panels.reduce((sum, count) => sum + count, 0)).toBe(13);
    expect(Math.max(...panels) * GLUE.stripMinutes).toBeLessThanOrEqual(GLUE.openMinutes);
    expect((clamps - 1) * 8).toBeGreaterThanOrEqual(37);
    // Own arithmetic: 37 × 3/4 in of joint at 0.7 MPa = 101.5 psi, over six clamps.
    expect(poundsEach.low).toBeCloseTo((37 * 0.75 * 101.526) / 6, 0);
    expect(steps.at(-1)?.dryHours).toBe(24);
  });

  it('says each caution where its work is, and only there', () => {
    const of = (colour: 'none' | 'torch' | 'stain', finish: 'lacquer' | 'drying-oil') => new Map(benchSteps(piece, build, { colour, finish }, 18).map(({ id, cautions }) => [id, cautions]));
    expect(of('torch', 'lacquer').get('colour')).toEqual(['torch']);
    expect(of('none', 'lacquer').has('colour')).toBe(false);
    expect(of('none', 'drying-oil').get('finish')).toEqual(['rags']);
    expect(of('none', 'lacquer').get('finish')).toEqual([]);
    expect(of('none', 'lacquer').get('rail A')).toEqual(['brads']);
    expect(of('none', 'lacquer').get('hang')).toEqual(['hanging']);
    for (const cautions of of('stain', 'lacquer').values()) for (const caution of cautions) expect(CAUTIONS[caution].length).toBeGreaterThan(20);
  });

  it('makes as many coats as are asked for, the last dry enough to leave', () => {
    expect(coatsOf('oil-polyurethane', 3, 1).map(({ dryHours }) => dryHours)).toEqual([24, 24, 72]);
  });
});
