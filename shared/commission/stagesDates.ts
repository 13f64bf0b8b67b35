import { type Day, type ShopHours, isOpenOn } from '../assembly/calendar';
import { type FinishStep, type Schedule, type ScheduledStep, type Span, scheduleBack } from '../assembly/finish';
import type { Stage } from './stages';

/** Furthest that an open day is looked for: a shop closed for longer does no job. */
const FURTHEST = 1000; // days

/** The nearest open day at or before (step −1) or at or after (+1) a day; the day itself where the shop is never open. */
function openNear(shop: ShopHours, day: Day, step: -1 | 1): Day {
  for (let n = 0; n <= FURTHEST; n++) if (isOpenOn(shop, day + n * step)) return day + n * step;
  return day;
}

/** So many working days from a day: below zero back, above ahead. None is the nearest open day in the past. */
export function workingDaysFrom(shop: ShopHours, day: Day, days: number): Day {
  const step = days > 0 ? 1 : -1;
  let at = openNear(shop, day, step);
  for (let n = 0; n < Math.abs(days); n++) at = openNear(shop, at + step, step);
  return at;
}

/** Open days after one day, up to another and with it; none where it is not later. */
export function workingDaysBetween(shop: ShopHours, from: Day, to: Day): number {
  let days = 0;
  for (let day = from + 1; day <= to; day++) if (isOpenOn(shop, day)) days++;
  return days;
}

/** What a commission's dates are counted back from. */
export interface DatePlan {
  readonly due: Day;
  readonly shop: ShopHours;
  /** Other work that hours are already taken by. */
  readonly busy: readonly Span[];
  /** Work at the machine, in hours. */
  readonly cuttingHours: number;
  /** From the glue's and the finish's own schedules; drying between them counts. */
  readonly assembly: readonly FinishStep[];
  readonly finishing: readonly FinishStep[];
  /** Working days that each usually takes in this shop. */
  readonly days: { readonly quote: number; readonly approval: number; readonly deposit: number; readonly wood: number; readonly delivery: number };
}

/** Where a shop starts: common practice, no source; it changes them to what its customers and its yard take. */
export const USUAL_DAYS: DatePlan['days'] = { quote: 2, approval: 3, deposit: 2, wood: 3, delivery: 1 };

export interface StageDates {
  /** The last day by which each stage has to be reached for the piece to be there on time. */
  readonly by: Readonly<Record<Stage, Day>>;
  readonly steps: readonly ScheduledStep[];
  readonly findings: Schedule['findings'];
}

/** Hours of one work as steps that each fit a day of the shop. */
function inDays(name: string, hours: number, { opens, closes }: ShopHours): FinishStep[] {
  const most = closes - opens;
  if (hours <= 0 || most <= 0) return [];
  const days = Math.ceil(hours / most - 1e-9);
  return Array.from({ length: days }, () => ({ name, workHours: hours / days, dryHours: 0, recoatWithin: null, from: 'common practice' as const }));
}

const dayAt = (hours: number) => Math.floor(hours / 24);

/**
 * Each stage's last day, counted back from the due date over the shop's hours: delivery, drying and coats, assembly,
 * cutting, then wood, deposit, approval and quote in working days.
 */
export function stageDates({ due, shop, busy, cuttingHours, assembly, finishing, days }: DatePlan, today: Day): StageDates {
  const ready = workingDaysFrom(shop, due, -days.delivery);
  const cutting = inDays('cutting', cuttingHours, shop);
  const { steps, findings } = scheduleBack([...cutting, ...assembly, ...finishing], ready, today, shop, busy);
  // Where the work does not fit, the schedule holds only its last steps: what is missing begins no later than these.
  const lost = cutting.length + assembly.length + finishing.length - steps.length;
  const startOf = (index: number) => {
    const step = steps[Math.max(0, index - lost)];
    return step ? dayAt(step.work.from) : ready;
  };
  const cut = startOf(0);
  const wood = workingDaysFrom(shop, cut, -days.wood);
  const deposit = wood; // the wood is bought with it
  const approved = workingDaysFrom(shop, deposit, -days.deposit);
  const quoted = workingDaysFrom(shop, approved, -days.approval);
  return {
    by: {
      'enquiry': workingDaysFrom(shop, quoted, -days.quote), quoted, approved, 'deposit paid': deposit, 'wood bought': wood,
      'cutting': cut, 'assembly': startOf(cutting.length), 'finishing': startOf(cutting.length + assembly.length), ready, 'delivered': due,
    },
    steps, findings,
  };
}
