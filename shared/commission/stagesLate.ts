import { type Day, type ShopHours, dateOf } from '../assembly/calendar';
import type { Milestone } from './stages';
import { workingDaysBetween, workingDaysFrom } from './stagesDates';
import { type CommissionNow, count, nextOf } from './stagesNow';

/** What was to be done, before the day it was to be done by. */
const OUGHT: Readonly<Record<Milestone, string>> = {
  'quoted': 'The quote was to be sent by', 'approved': 'The customer was to approve by', 'deposit paid': 'The deposit was to be paid by', 'wood bought': 'The wood was to be bought by',
  'cutting': 'Cutting was to begin by', 'assembly': 'The last rail was to be cut by', 'finishing': 'The piece was to be assembled by', 'ready': 'The finish was to be dry by', 'delivered': 'The piece was to be there by',
};

/** How long ago a day was, over the days that the shop works. */
function ago(shop: ShopHours, day: Day, today: Day): string {
  const days = workingDaysBetween(shop, day, today);
  return days > 0 ? `, ${count(days, 'working day')} ago` : '';
}

/**
 * Why a commission is late, in sentences; none where it is not. The first is the milestone that is missing, then what
 * held it up, then when the piece would be there if that milestone were reached today and the rest kept its pace.
 *
 * @param show how a day is written.
 */
export function lateBecause(commission: CommissionNow, today: Day, shop: ShopHours, show: (day: Day) => string = dateOf): string[] {
  const { dates: { by }, closed, cameOn, railsLeft, spoiled, changesAsked } = commission;
  const next = nextOf(commission);
  if (closed || next === null || today <= by[next]) return [];
  const slip = workingDaysBetween(shop, by[next], today);
  const cutting = next === 'cutting' || next === 'assembly';
  return [
    `${OUGHT[next]} ${show(by[next])}${ago(shop, by[next], today)}.`,
    ...(cameOn > by.enquiry ? [`It came in on ${show(cameOn)}; at the usual pace it had to come by ${show(by.enquiry)}.`] : []),
    ...(changesAsked > 0 && (next === 'quoted' || next === 'approved') ? [`The customer asked for ${count(changesAsked, 'change')} that nobody has answered.`] : []),
    ...(next === 'assembly' && railsLeft > 0 ? [`${count(railsLeft, 'rail is', 'rails are')} still to be cut.`] : []),
    ...(cutting && spoiled > 0 ? [`${count(spoiled, 'cut was', 'cuts were')} spoiled.`] : []),
    ...(next !== 'delivered' && slip > 0 ? [`Reached today, the piece would be there on ${show(workingDaysFrom(shop, by.delivered, slip))} in place of ${show(by.delivered)}.`] : []),
  ];
}
