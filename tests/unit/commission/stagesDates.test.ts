import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Day, type ShopHours, dateOf, dayOf, isOpenOn } from '#shared/assembly/calendar';
import { type FinishStep, coatsOf } from '#shared/assembly/finish';
import { MILESTONES, type Milestone, type Reached, STAGES } from '#shared/commission/stages';
import { type DatePlan, USUAL_DAYS, stageDates, workingDaysBetween, workingDaysFrom } from '#shared/commission/stagesDates';
import { feedDays } from '#shared/commission/stagesFeed';
import { lateBecause } from '#shared/commission/stagesLate';
import type { CommissionNow } from '#shared/commission/stagesNow';
import { todayAcross } from '#shared/commission/stagesToday';

const shop: ShopHours = { weekdays: [0, 1, 2, 3, 4], opens: 8, closes: 17, closed: [] };
const day = (iso: string): Day => {
  const found = dayOf(iso);
  if (found === null) throw new Error(`${iso} is no date`);
  return found;
};
const glue: FinishStep = { name: 'glue', workHours: 2, dryHours: 24, recoatWithin: null, from: 'common practice' };
const plan = (more: Partial<DatePlan> = {}): DatePlan => ({ due: day('2026-12-18'), shop, busy: [], cuttingHours: 3, assembly: [glue], finishing: coatsOf('water-polyurethane', 2, 1), days: USUAL_DAYS, ...more });

/** December 2026: the 1st is a Tuesday, by a wall calendar. */
describe('working days', () => {
  const holiday: ShopHours = { ...shop, closed: [day('2026-12-25')] };
  it.each([
    ['2026-12-18', -1, '2026-12-17'], ['2026-12-21', -1, '2026-12-18'], ['2026-12-20', 0, '2026-12-18'], ['2026-12-20', -1, '2026-12-17'], ['2026-12-20', 1, '2026-12-22'],
    ['2026-12-24', 1, '2026-12-28'], ['2026-12-18', 5, '2026-12-28'], ['2026-12-28', -2, '2026-12-23'],
  ])('from %s by %i are %s', (from, days, to) => {
    expect(dateOf(workingDaysFrom(holiday, day(from), days))).toBe(to);
  });

  it('counted between are those walked', () => {
    expect(workingDaysBetween(holiday, day('2026-12-18'), day('2026-12-28'))).toBe(5); // 21, 22, 23, 24, 28
    expect(workingDaysBetween(shop, day('2026-12-18'), day('2026-12-20'))).toBe(0);
    expect(workingDaysBetween(shop, day('2026-12-18'), day('2026-12-01'))).toBe(0);
    fc.assert(fc.property(fc.integer({ min: 20_000, max: 21_000 }), fc.integer({ min: 1, max: 60 }), (from, days) => {
      fc.pre(isOpenOn(holiday, from));
      expect(workingDaysBetween(holiday, from, workingDaysFrom(holiday, from, days))).toBe(days);
      expect(workingDaysFrom(holiday, workingDaysFrom(holiday, from, days), -days)).toBe(from);
    }));
  });

  it('of a shop that is never open come to an end', () => {
    expect(workingDaysFrom({ ...shop, weekdays: [] }, 20_000, -3)).toBe(20_000 - 3);
  });
});

describe('dates counted back', () => {
  it('go from the due day through delivery, finish, glue, cutting, wood, deposit, approval and quote', () => {
    // By hand. Due Friday 18; delivery 1 day: ready when the shop opens on Thursday 17, at 8:00. Coat 2 dries 24 h, so it is
    // done by Wednesday 8:00, and the last open hour before that ends on Tuesday 15 at 17:00.
    // Coat 2 Tuesday 16–17; coat 1 dries 2 h, so 13–14 of Tuesday. Glue dries 24 h before Tuesday 13: Monday 13, worked 11–13.
    // Cutting 3 h before Monday 11: Monday 8–11. Wood 3 working days earlier: Wednesday 9; deposit with it; approval Monday 7; quote Wednesday 2; enquiry Monday 30 November.
    const { by, findings } = stageDates(plan(), day('2026-12-01'));
    expect(Object.entries(by).map(([stage, at]) => `${stage} ${dateOf(at)}`)).toEqual([
      'enquiry 2026-11-30', 'quoted 2026-12-02', 'approved 2026-12-07', 'deposit paid 2026-12-09', 'wood bought 2026-12-09',
      'cutting 2026-12-14', 'assembly 2026-12-14', 'finishing 2026-12-15', 'ready 2026-12-17', 'delivered 2026-12-18',
    ]);
    expect(findings.every(({ severity }) => severity === 'agrees')).toBe(true);
  });

  it('are in order whatever the work', () => {
    const hours = fc.double({ min: 0, max: 30, noNaN: true });
    const steps = fc.array(fc.record({ name: fc.constant('step'), workHours: fc.double({ min: 0.25, max: 9, noNaN: true }), dryHours: fc.double({ min: 0, max: 96, noNaN: true }), recoatWithin: fc.constant(null), from: fc.constant('product label' as const) }), { maxLength: 5 });
    const days = fc.record({ quote: fc.nat(10), approval: fc.nat(10), deposit: fc.nat(10), wood: fc.nat(10), delivery: fc.nat(5) });
    fc.assert(fc.property(hours, steps, steps, days, fc.integer({ min: 20_000, max: 20_400 }), (cuttingHours, assembly, finishing, usual, due) => {
      const { by, steps: found } = stageDates(plan({ cuttingHours, assembly, finishing, days: usual, due }), 0);
      STAGES.slice(1).forEach((stage, n) => expect(by[STAGES[n] ?? 'enquiry'], stage).toBeLessThanOrEqual(by[stage]));
      expect(found.at(-1)?.readyAt ?? -Infinity).toBeLessThanOrEqual(by.ready * 24 + shop.opens + 1e-6);
    }), { numRuns: 300, seed: 41 });
  });

  it('say what does not fit a day, and stay in order', () => {
    const { by, findings } = stageDates(plan({ assembly: [{ ...glue, workHours: 12 }] }), day('2026-12-01'));
    expect(findings).toMatchObject([{ rule: 'fits', about: 'glue', reason: 'longerThanDay' }]);
    // The coats stand where they stood above; what has no place begins no later than they do.
    expect(['cutting', 'assembly', 'finishing'].map((stage) => dateOf(by[STAGES.find((each) => each === stage) ?? 'enquiry']))).toEqual(['2026-12-15', '2026-12-15', '2026-12-15']);
  });
});

const upTo = (last: Milestone): Reached => new Set(MILESTONES.slice(0, MILESTONES.indexOf(last) + 1));
const now = (more: Partial<CommissionNow> = {}): CommissionNow => ({
  id: 'c1', name: '42 coins for the day room', cameOn: day('2026-11-30'), reached: new Set(), dates: stageDates(plan(), day('2026-12-01')), railsLeft: 3, spoiled: 0, changesAsked: 0, balance: 'none', closed: false, ...more,
});

describe('a late commission', () => {
  const said = (more: Partial<CommissionNow>, today: string) => lateBecause(now(more), day(today), shop);

  it('is silent while it is in time, delivered or given up', () => {
    expect(said({}, '2026-12-02')).toEqual([]);
    expect(said({ reached: upTo('delivered') }, '2027-03-01')).toEqual([]);
    expect(said({ closed: true }, '2027-03-01')).toEqual([]);
  });

  it.each<[string, Partial<CommissionNow>, string, string[]]>([
    ['the quote', {}, '2026-12-04', ['The quote was to be sent by 2026-12-02, 2 working days ago.', 'Reached today, the piece would be there on 2026-12-22 in place of 2026-12-18.']],
    ['a weekend', { cameOn: day('2026-11-27'), reached: upTo('quoted'), dates: stageDates(plan({ days: { ...USUAL_DAYS, deposit: 3 } }), day('2026-12-01')) }, '2026-12-05', ['The customer was to approve by 2026-12-04.']],
    ['changes nobody answered', { reached: upTo('quoted'), changesAsked: 2 }, '2026-12-08', ['The customer was to approve by 2026-12-07, 1 working day ago.', 'The customer asked for 2 changes that nobody has answered.', 'Reached today, the piece would be there on 2026-12-21 in place of 2026-12-18.']],
    ['an enquiry that came late', { cameOn: day('2026-12-03') }, '2026-12-04', ['The quote was to be sent by 2026-12-02, 2 working days ago.', 'It came in on 2026-12-03; at the usual pace it had to come by 2026-11-30.', 'Reached today, the piece would be there on 2026-12-22 in place of 2026-12-18.']],
    ['rails spoiled', { reached: upTo('cutting'), railsLeft: 1, spoiled: 2 }, '2026-12-15', ['The last rail was to be cut by 2026-12-14, 1 working day ago.', '1 rail is still to be cut.', '2 cuts were spoiled.', 'Reached today, the piece would be there on 2026-12-21 in place of 2026-12-18.']],
    ['delivery', { reached: upTo('ready') }, '2026-12-21', ['The piece was to be there by 2026-12-18, 1 working day ago.']],
  ])('says so of %s', (_what, more, today, sentences) => {
    expect(said(more, today)).toEqual(sentences);
  });
});

describe('today', () => {
  const across = (today: string, ...list: CommissionNow[]) => todayAcross(list, day(today), shop).map(({ commissionId, what, late }) => `${commissionId} ${late} ${what}`);

  it.each<[string, Partial<CommissionNow>, string, string[]]>([
    ['an enquiry is answered', {}, '2026-12-01', ['c1 0 Send the quote.']],
    ['a customer is left alone until the last day', { reached: upTo('quoted') }, '2026-12-04', []],
    ['and then reminded', { reached: upTo('quoted') }, '2026-12-07', ['c1 0 Remind the customer to approve.']],
    ['a changed quote goes out again', { reached: new Set<Milestone>(['quoted', 'deposit paid']) }, '2026-12-07', ['c1 0 Send the changed quote for approval.']],
    ['wood is bought', { reached: upTo('deposit paid') }, '2026-12-10', ['c1 1 Buy the wood.']],
    ['rails are cut', { reached: upTo('cutting') }, '2026-12-14', ['c1 0 Cut 3 rails.']],
    ['the finish goes on', { reached: upTo('finishing') }, '2026-12-15', ['c1 0 Go on with the finish.']],
    ['a ready piece goes out, and its balance is asked for', { reached: upTo('ready'), balance: 'toAsk' }, '2026-12-17', ['c1 0 Ask for the balance.', 'c1 0 Pack and deliver.']],
    ['a delivered one is still to be paid', { reached: upTo('delivered'), balance: 'toAsk' }, '2026-12-21', ['c1 2 Ask for the balance.']],
    ['a change is answered', { reached: upTo('quoted'), changesAsked: 1 }, '2026-12-03', ['c1 0 Answer 1 change that the customer asks for.']],
    ['nothing is done about one put away', { closed: true, changesAsked: 1 }, '2026-12-30', []],
  ])('%s', (_what, more, today, tasks) => {
    expect(across(today, now(more))).toEqual(tasks);
  });

  it('has the latest first, then what is soonest due, whatever order they are given in', () => {
    const list = [now({ id: 'c1', reached: upTo('quoted') }), now({ id: 'c2' }), now({ id: 'c3', reached: upTo('wood bought') }), now({ id: 'c4', reached: upTo('quoted') })];
    const expected = ['c2 8 Send the quote.', 'c1 5 Remind the customer to approve.', 'c4 5 Remind the customer to approve.', 'c3 0 Begin cutting.'];
    expect(across('2026-12-14', ...list)).toEqual(expected);
    expect(across('2026-12-14', ...[...list].reverse())).toEqual(expected);
  });
});

describe('the feed\'s days', () => {
  it('are the shop\'s work still to come, each under an id that stays', () => {
    const days = feedDays([now({ reached: upTo('wood bought') }), now({ id: 'c2', closed: true })]);
    expect(days.map(({ uid, day: at, summary }) => `${uid} ${dateOf(at)} ${summary}`)).toEqual([
      'c1-assembly@tallyrail 2026-12-14 42 coins for the day room: begin assembly', 'c1-cutting@tallyrail 2026-12-14 42 coins for the day room: begin cutting',
      'c1-finishing@tallyrail 2026-12-15 42 coins for the day room: begin finishing', 'c1-ready@tallyrail 2026-12-17 42 coins for the day room: ready', 'c1-delivered@tallyrail 2026-12-18 42 coins for the day room: due',
    ]);
    expect(days.every((each) => Object.keys(each).sort().join() === 'day,summary,uid')).toBe(true); // no contact, no price
  });
});
