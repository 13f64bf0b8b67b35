import { type ShopHours, dateOf, dayOf } from '../assembly/calendar';
import { type FinishStep, type Schedule, coatsOf, scheduleBack } from '../assembly/finish';
import { gluePlan } from '../assembly/gluing';
import { factsOf } from '../piece/kinds';
import type { Stage, StageDays } from './stages';
import type { Work } from './work';

/** Monday to Friday, 8 to 17 o'clock: common practice, no source, until a shop enters its own. */
export const USUAL_HOURS: ShopHours = { weekdays: [0, 1, 2, 3, 4], opens: 8, closes: 17, closed: [] };

const hours = (name: string, workHours: number, dryHours = 0): FinishStep => ({ name, workHours, dryHours, recoatWithin: null, from: 'common practice' });

/** Bench hours that setting rails and battens takes: common practice, no source. */
const SET = 2;
/** Bench hours of colouring, and until it is dry enough to coat: common practice, no source; a torched board is watched for an hour. */
const COLOURING = { torch: { work: 2, dry: 1 }, stain: { work: 1, dry: 24 } } as const;

/** The steps that take time, from sawn parts to a piece that may leave. */
export function finishSteps(work: Work): { readonly assembly: readonly FinishStep[]; readonly finishing: readonly FinishStep[] } {
  const { piece, build, surface } = work;
  const coloured = surface.colour === 'none' ? null : COLOURING[surface.colour];
  const colour = coloured ? [hours(surface.colour === 'torch' ? 'char the bare faces' : 'stain the bare faces', coloured.work, coloured.dry)] : [];
  const set = factsOf(piece.kind).behind ? [] : [hours('set rails and battens', SET)];
  return { assembly: [...colour, ...gluePlan(piece, build.boardThickness).steps, ...set], finishing: coatsOf(surface.finish, surface.coats, surface.coatHours) };
}

/** The schedule counted back from the due date; null where there is none that can be read. */
export function scheduleOf(work: Work, due: string | null, today: string, shop: ShopHours = USUAL_HOURS): Schedule | null {
  const [dueDay, day] = [due === null ? null : dayOf(due), dayOf(today)];
  if (dueDay === null || day === null) return null;
  const { assembly, finishing } = finishSteps(work);
  return scheduleBack([...assembly, ...finishing], dueDay, day, shop, []);
}

const HOURS = 24; // in a day
export const dayOfHour = (hour: number): string => dateOf(Math.floor(hour / HOURS));
/** An hour of the day as the shop's clock shows it. */
export function clockOf(hour: number): string {
  const [whole, minutes] = [Math.floor(hour % HOURS), Math.round((hour % 1) * 60)];
  return `${whole}:${String(minutes).padStart(2, '0')}`;
}

/** Days on which the stages still to come begin, counted back: cutting the day before assembly, delivery on the due day. */
export function plannedDays(work: Work, schedule: Schedule, due: string): StageDays {
  const [first, coat] = [schedule.steps[0], schedule.steps[finishSteps(work).assembly.length]];
  const last = schedule.steps.at(-1);
  const planned: [Stage, string | null][] = [
    ['cutting', first ? dayOfHour(first.work.from - HOURS) : null], ['assembly', first ? dayOfHour(first.work.from) : null],
    ['finishing', coat ? dayOfHour(coat.work.from) : null], ['ready', last ? dayOfHour(last.readyAt) : null], ['delivered', due],
  ];
  return Object.fromEntries(planned.filter(([, day]) => day !== null));
}
