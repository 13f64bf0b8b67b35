import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MILESTONES, type Milestone, type Reached, STAGES, STAGE_EVENTS, STAGE_MOVES, type StageEvent, aheadOf, hasReached, moved, movedByHand, movedTo, stageOf } from '#shared/commission/stages';
import { aheadWords } from '#shared/commission/stagesNow';

const NONE: Reached = new Set<Milestone>();
const after = (...events: StageEvent[]) => events.reduce(moved, NONE);
const FORWARD: StageEvent[] = ['quoteSent', 'approval', 'depositPaid', 'woodBought', 'firstCut', 'lastRailCut', 'assembled', 'finished', 'delivered'];
const shuffled = <T>(list: readonly T[]) => fc.shuffledSubarray([...list], { minLength: list.length });

describe('stages', () => {
  it('follow one another as the work does', () => {
    let reached = NONE;
    const seen = [stageOf(reached)];
    for (const event of FORWARD) {
      reached = moved(reached, event);
      seen.push(stageOf(reached));
    }
    expect(seen).toEqual([...STAGES]);
  });

  it.each<[string, StageEvent[], string]>([
    ['a change after approval goes back to the quote', ['quoteSent', 'approval', 'depositPaid', 'approvalLapsed'], 'quoted'],
    ['approved again it stands where the deposit had brought it', ['quoteSent', 'approval', 'depositPaid', 'approvalLapsed', 'approval'], 'deposit paid'],
    ['wood bought early waits for the deposit', ['quoteSent', 'approval', 'woodBought'], 'approved'],
    ['and counts once it is paid', ['quoteSent', 'approval', 'woodBought', 'depositPaid'], 'wood bought'],
    ['a refund of the deposit goes back before it', ['quoteSent', 'approval', 'depositPaid', 'woodBought', 'depositReturned'], 'approved'],
    ['the only rail is first and last', ['quoteSent', 'approval', 'depositPaid', 'woodBought', 'lastRailCut'], 'assembly'],
    ['a rail to cut again goes back to cutting', ['quoteSent', 'approval', 'depositPaid', 'woodBought', 'lastRailCut', 'railToCut'], 'cutting'],
    ['a quote withdrawn is an enquiry again', ['quoteSent', 'approval', 'quoteWithdrawn'], 'enquiry'],
    ['a piece brought back is ready', [...FORWARD, 'broughtBack'], 'ready'],
    ['a coat to do again is finishing', [...FORWARD.slice(0, -1), 'finishReopened'], 'finishing'],
    ['a step undone is assembly', [...FORWARD.slice(0, -1), 'assemblyReopened'], 'assembly'],
  ])('%s', (_what, events, stage) => {
    expect(stageOf(after(...events))).toBe(stage);
  });

  it('do not depend on the order or repetition of what was reached', () => {
    const some = fc.subarray(FORWARD).chain((events) => fc.tuple(fc.constant(events), fc.subarray(events)).chain(([all, again]) => fc.tuple(fc.constant(all), shuffled([...all, ...again]))));
    fc.assert(fc.property(some, ([events, told]) => {
      const [one, other] = [after(...events), after(...told)];
      expect([...other].sort()).toEqual([...one].sort());
      expect(stageOf(other)).toBe(stageOf(one));
      // What is reached is what the stage says and what is ahead of it, each once.
      expect([...MILESTONES.slice(0, STAGES.indexOf(stageOf(one))), ...aheadOf(one)].sort()).toEqual([...one].sort());
    }), { numRuns: 500 });
  });

  it('have an event that reaches and one that undoes each milestone, but the first cut', () => {
    for (const milestone of MILESTONES) expect(STAGE_EVENTS.some((event) => STAGE_MOVES[event].reaches.includes(milestone)), milestone).toBe(true);
    const undone = new Set(STAGE_EVENTS.flatMap((event) => [...STAGE_MOVES[event].undoes]));
    expect(MILESTONES.filter((milestone) => !undone.has(milestone))).toEqual(['wood bought', 'cutting']); // wood and sawdust do not go back
  });

  it('say what went ahead of what', () => {
    expect(aheadWords({ reached: after('quoteSent', 'approval', 'woodBought', 'firstCut') })).toEqual(['The wood was bought before the deposit was paid: it stays at "approved".']);
    expect(aheadWords({ reached: after('quoteSent', 'approval') })).toEqual([]);
    expect(aheadWords({ reached: after(...FORWARD) })).toEqual([]);
  });
});

describe('a stage set by hand', () => {
  it('takes a reason and holds', () => {
    const answer = movedByHand('cutting', 'enquiry', ' Agreed by telephone. ');
    expect(answer).toMatchObject({ ok: true, reason: 'Agreed by telephone.' });
    if (answer.ok) expect([stageOf(answer.reached), aheadOf(answer.reached)]).toEqual(['cutting', []]);
    for (const stage of STAGES.slice(1)) {
      const moving = movedByHand(stage, 'enquiry', 'because');
      expect(moving.ok && stageOf(moving.reached)).toBe(stage);
    }
    const start = movedByHand('enquiry', 'ready', 'begun again');
    expect(start.ok && stageOf(start.reached)).toBe('enquiry');
  });

  it.each([
    ['quoted', 'quoted', 'x', 'stage', /is at "quoted" already/], ['quoted', 'enquiry', '  ', 'reason', /Say why/], ['quoted', 'enquiry', 'x'.repeat(301), 'reason', /300 characters/],
  ] as const)('to %s from %s because "%s" is refused', (to, from, reason, field, message) => {
    const answer = movedByHand(to, from, reason);
    expect(answer).toMatchObject({ ok: false, problem: { field, message: expect.stringMatching(message) } });
  });
});

describe('the days of stages', () => {
  it('are kept for what lies before, set for what is entered, and gone for what lies after', () => {
    const days = { enquiry: '2026-12-01', quoted: '2026-12-02', cutting: '2026-12-09' };
    expect(movedTo(days, 'approved', '2026-12-11')).toEqual({ enquiry: '2026-12-01', quoted: '2026-12-02', approved: '2026-12-11' });
    expect(movedTo({}, 'enquiry', '2026-12-01')).toEqual({ enquiry: '2026-12-01' });
  });

  it('are of stages come to, the current one among them', () => {
    expect(STAGES.filter((stage) => hasReached(stage, 'approved'))).toEqual(['enquiry', 'quoted', 'approved']);
  });
});
