import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { RAIL_EVENTS, RAIL_STATUSES, type RailEvent, type RailStatus, cutEvent, moveRail } from '#shared/shop/railStatus';

/** Follows events from a draft; an event that is refused leaves the rail where it is. */
function after(events: readonly RailEvent[]): RailStatus {
  return events.reduce<RailStatus>((status, event) => {
    const moved = moveRail(status, event);
    return moved.ok ? moved.status : status;
  }, 'draft');
}

/** Issue 4, "Rails": draft → ready → cut; each save is a revision; a program of an older revision does not count. */
describe('a rail', () => {
  it.each<[string, RailEvent[], RailStatus]>([
    ['goes from draft to ready to cut', ['programMade', 'cutLast'], 'cut'],
    ['is not cut without a program of its drawing', ['cutLast'], 'draft'],
    ['is a draft again once its drawing changes', ['programMade', 'revised'], 'draft'],
    ['is a draft again even when cut', ['programMade', 'cutLast', 'revised'], 'draft'],
    ['that was changed is not cut by its older program', ['programMade', 'revised', 'cutLast'], 'draft'],
    ['that was spoiled waits to be cut again', ['programMade', 'spoiled'], 'ready'],
    ['stays cut when a program is made again', ['programMade', 'cutLast', 'programMade'], 'cut'],
    ['of which more are wanted stays ready', ['programMade', 'cutOne'], 'ready'],
    ['cut once more than wanted stays cut', ['programMade', 'cutLast', 'cutLast', 'spoiled'], 'cut'],
    ['whose cut is taken back waits again', ['programMade', 'cutLast', 'cutTakenBack'], 'ready'],
  ])('%s', (_, events, status) => {
    expect(after(events)).toBe(status);
  });

  it('is cut only by a cut made since its last program, and that since its last change', () => {
    fc.assert(fc.property(fc.array(fc.constantFrom(...RAIL_EVENTS), { maxLength: 12 }), (events) => {
      if (after(events) !== 'cut') return;
      const changed = events.lastIndexOf('revised');
      const made = events.indexOf('programMade', changed + 1);
      const cut = events.indexOf('cutLast', made + 1);
      expect(made).toBeGreaterThan(changed);
      expect(cut).toBeGreaterThan(made);
    }), { seed: 5, numRuns: 2000 });
  });

  it('reaches every status, and is a draft again from each by one change', () => {
    expect([after([]), after(['programMade']), after(['programMade', 'cutLast'])]).toEqual([...RAIL_STATUSES]);
    for (const status of RAIL_STATUSES) expect(moveRail(status, 'revised')).toMatchObject({ ok: true, status: 'draft' });
  });

  it('is cut with the last one wanted', () => {
    expect([cutEvent(1, 3), cutEvent(2, 3), cutEvent(3, 3), cutEvent(4, 3), cutEvent(1, 1)]).toEqual(['cutOne', 'cutOne', 'cutLast', 'cutLast', 'cutLast']);
  });

  it('is refused with what would work', () => {
    expect(moveRail('draft', 'cutLast')).toEqual({ ok: false, problem: { field: 'status', message: expect.stringMatching(/is a draft.*Make one/) } });
    for (const status of RAIL_STATUSES) {
      for (const event of RAIL_EVENTS) {
        const moved = moveRail(status, event);
        expect(moved.ok ? moved.reason : moved.problem.message).toMatch(/^[A-Z].*\.$/);
      }
    }
  });
});
