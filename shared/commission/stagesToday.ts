import type { Day, ShopHours } from '../assembly/calendar';
import type { Milestone } from './stages';
import { workingDaysBetween } from './stagesDates';
import { type CommissionNow, count, nextOf } from './stagesNow';

/** Something to do today for one commission. */
export interface Task {
  readonly commissionId: string;
  readonly name: string;
  readonly what: string;
  /** The last day for it. */
  readonly by: Day;
  /** Working days that it is late; 0: it is in time. */
  readonly late: number;
}

/** From when on a milestone is worked at: days of work from the day they begin, what takes no time on its last day. */
function beginsOn({ cameOn, dates: { by } }: CommissionNow, next: Milestone): Day {
  switch (next) {
    case 'quoted': return cameOn;
    case 'assembly': return by.cutting;
    case 'finishing': return by.assembly;
    case 'ready': return by.finishing;
    case 'delivered': return by.ready;
    default: return by[next];
  }
}

/** What is to be done to reach a milestone. */
function whatFor({ reached, railsLeft }: CommissionNow, next: Milestone): string {
  switch (next) {
    case 'quoted': return 'Send the quote.';
    case 'approved': return reached.has('deposit paid') ? 'Send the changed quote for approval.' : 'Remind the customer to approve.';
    case 'deposit paid': return 'Ask for the deposit again.';
    case 'wood bought': return 'Buy the wood.';
    case 'cutting': return 'Begin cutting.';
    case 'assembly': return railsLeft > 0 ? `Cut ${count(railsLeft, 'rail')}.` : 'Log the last cuts.';
    case 'finishing': return 'Assemble the piece.';
    case 'ready': return 'Go on with the finish.';
    case 'delivered': return 'Pack and deliver.';
  }
}

function tasksOf(commission: CommissionNow, today: Day, shop: ShopHours): Task[] {
  const { id, name, dates: { by }, reached, changesAsked, balance } = commission;
  const task = (what: string, last: Day): Task => ({ commissionId: id, name, what, by: last, late: workingDaysBetween(shop, last, today) });
  const next = nextOf(commission);
  return [
    ...(changesAsked > 0 ? [task(`Answer ${count(changesAsked, 'change')} that the customer asks for.`, today)] : []),
    ...(next !== null && today >= beginsOn(commission, next) ? [task(whatFor(commission, next), by[next])] : []),
    ...(balance === 'toAsk' && reached.has('ready') ? [task('Ask for the balance.', by.ready)] : []),
  ];
}

const inOrder = (a: string, b: string) => (a < b ? -1 : a > b ? 1 : 0);

/** What to do today across all commissions, the latest first, then what has to be done soonest. */
export const todayAcross = (commissions: readonly CommissionNow[], today: Day, shop: ShopHours): Task[] =>
  commissions.filter(({ closed }) => !closed).flatMap((commission) => tasksOf(commission, today, shop))
    .sort((a, b) => b.late - a.late || a.by - b.by || inOrder(a.name, b.name) || inOrder(a.commissionId, b.commissionId) || inOrder(a.what, b.what));
