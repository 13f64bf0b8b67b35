import type { JobFinding } from '../coin/finding';
import { type Day, type ShopHours, isOpenOn } from './calendar';

/** One step of making a piece ready: work at the bench, then a wait that nights and holidays count towards. */
export interface FinishStep {
  readonly name: string;
  readonly workHours: number;
  /** Until the next step, or until it may leave: from the product's label, which the shop enters. */
  readonly dryHours: number;
  /** Latest the next coat may follow without sanding; null: no such limit. */
  readonly recoatWithin: number | null;
  readonly from: 'product label' | 'common practice';
}

/** Finishes with their usual times: common practice, no source; the label overrides, and cold or damp slow them all. */
export const FINISHES = {
  'oil-polyurethane': { words: 'oil-based polyurethane', recoatHours: 24, leaveHours: 72 },
  'water-polyurethane': { words: 'water-based polyurethane', recoatHours: 2, leaveHours: 24 },
  'lacquer': { words: 'spray lacquer', recoatHours: 2, leaveHours: 24 },
  'drying-oil': { words: 'drying oil', recoatHours: 24, leaveHours: 72 },
} as const;
export type FinishName = keyof typeof FINISHES;

/** Coats of a finish as steps: the last may leave only when it is hard enough to pack. */
export function coatsOf(name: FinishName, coats: number, workHours: number): FinishStep[] {
  const { words, recoatHours, leaveHours } = FINISHES[name];
  return Array.from({ length: coats }, (_, n) => ({ name: `${words}, coat ${n + 1}`, workHours, dryHours: n === coats - 1 ? leaveHours : recoatHours, recoatWithin: null, from: 'common practice' as const }));
}

/** A stretch of time in hours from midnight of day 0. */
export interface Span {
  readonly from: number;
  readonly to: number;
}

export interface ScheduledStep extends FinishStep {
  readonly work: Span;
  /** When the next step may begin. */
  readonly readyAt: number;
}

export const SCHEDULE_RULES = ['start', 'fits', 'recoat'] as const;
export type ScheduleFinding = JobFinding<(typeof SCHEDULE_RULES)[number]>;

export interface Schedule {
  readonly steps: readonly ScheduledStep[];
  readonly findings: readonly ScheduleFinding[];
}

const DAY = 24; // hours
const FURTHEST = 1000; // days looked back for an open hour: a shop closed for longer does no job

/** The latest stretch of open, free time of so many hours that ends by `end`; null where the shop has none. */
function latestWork(hours: number, end: number, shop: ShopHours, busy: readonly Span[]): Span | null {
  const first = Math.floor(end / DAY);
  for (let day = first; day > first - FURTHEST; day--) {
    if (!isOpenOn(shop, day)) continue;
    const opens = day * DAY + shop.opens;
    let to = Math.min(end, day * DAY + shop.closes);
    // Other work pushes it earlier, each once.
    for (const span of [...busy].sort((a, b) => b.to - a.to)) if (span.from < to && span.to > to - hours) to = Math.min(to, span.from);
    if (to - hours >= opens - 1e-9) return { from: to - hours, to };
  }
  return null;
}

/**
 * Steps counted back from the day a piece is due: it is ready when the shop opens on that day. Work lies in open hours
 * and beside other work (`busy`), each step on one day; drying goes on through nights and holidays.
 *
 * @param today the first day that can still be used; a start before it is a finding with the days it is short.
 */
export function scheduleBack(steps: readonly FinishStep[], due: Day, today: Day, shop: ShopHours, busy: readonly Span[]): Schedule {
  const scheduled: ScheduledStep[] = [];
  const findings: ScheduleFinding[] = [];
  let end = due * DAY + shop.opens;
  for (const step of [...steps].reverse()) {
    const work = step.workHours <= shop.closes - shop.opens + 1e-9 ? latestWork(step.workHours, end - step.dryHours, shop, busy) : null;
    if (!work) {
      findings.push({ rule: 'fits', severity: 'disagrees', about: step.name, quantity: 'days', wanted: null, measured: null, reason: step.workHours > shop.closes - shop.opens ? 'longerThanDay' : 'neverOpen', source: 'geometry' });
      return { steps: scheduled, findings };
    }
    const readyAt = work.to + step.dryHours;
    const next = scheduled[0];
    if (step.recoatWithin !== null && next) {
      const late = next.work.from - work.to > step.recoatWithin;
      findings.push({ rule: 'recoat', severity: late ? 'caution' : 'agrees', about: step.name, quantity: 'days', wanted: { least: null, most: step.recoatWithin / DAY }, measured: (next.work.from - work.to) / DAY, reason: late ? 'sandFirst' : null, source: step.from });
    }
    scheduled.unshift({ ...step, work, readyAt });
    end = work.from;
  }
  const startDay = scheduled[0] ? Math.floor(scheduled[0].work.from / DAY) : due;
  const short = today - startDay;
  findings.push({ rule: 'start', severity: short > 0 ? 'disagrees' : 'agrees', about: scheduled[0]?.name ?? '', quantity: 'days', wanted: { least: 0, most: null }, measured: -short, reason: short > 0 ? 'tooLate' : null, source: 'geometry' });
  return { steps: scheduled, findings };
}
