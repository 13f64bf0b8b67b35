import type { ShopProblem } from '../shop/fields';

/** Where a commission stands, in order. */
export const STAGES = ['enquiry', 'quoted', 'approved', 'deposit paid', 'wood bought', 'cutting', 'assembly', 'finishing', 'ready', 'delivered'] as const;
export type Stage = (typeof STAGES)[number];

/** A stage as a label shows it. */
export const STAGE_WORDS: Readonly<Record<Stage, string>> = {
  'enquiry': 'Enquiry', 'quoted': 'Quoted', 'approved': 'Approved', 'deposit paid': 'Deposit paid', 'wood bought': 'Wood bought',
  'cutting': 'Cutting', 'assembly': 'Assembly', 'finishing': 'Finishing', 'ready': 'Ready', 'delivered': 'Delivered',
};

/** Whether a commission that stands at `current` has come to a stage. */
export const hasReached = (stage: Stage, current: Stage): boolean => STAGES.indexOf(stage) <= STAGES.indexOf(current);

/** A stage past the first: each is entered by one milestone, which bears its name. */
export type Milestone = Exclude<Stage, 'enquiry'>;
export const MILESTONES = STAGES.filter((stage): stage is Milestone => stage !== 'enquiry');

/** What really happens in a shop and moves a commission. */
export const STAGE_EVENTS = [
  'quoteSent', 'quoteWithdrawn', 'approval', 'approvalLapsed', 'depositPaid', 'depositReturned', 'woodBought', 'firstCut', 'lastRailCut', 'railToCut',
  'assembled', 'assemblyReopened', 'finished', 'finishReopened', 'delivered', 'broughtBack',
] as const;
export type StageEvent = (typeof STAGE_EVENTS)[number];

/** What an event reaches or undoes, and what the commission's log says of it. */
export interface StageMove {
  readonly reaches: readonly Milestone[];
  readonly undoes: readonly Milestone[];
  readonly reason: string;
}

/** Every event and what it moves. `assembly` is entered when the last rail is cut, `finishing` when all is assembled, `ready` when the last coat is dry. */
export const STAGE_MOVES: Readonly<Record<StageEvent, StageMove>> = {
  quoteSent: { reaches: ['quoted'], undoes: [], reason: 'The quote was sent.' },
  quoteWithdrawn: { reaches: [], undoes: ['quoted', 'approved'], reason: 'The quote was withdrawn.' },
  approval: { reaches: ['approved'], undoes: [], reason: 'The customer approved.' },
  approvalLapsed: { reaches: [], undoes: ['approved'], reason: 'The piece or its price was changed: the approval no longer covers it.' },
  depositPaid: { reaches: ['deposit paid'], undoes: [], reason: 'The deposit is paid.' },
  depositReturned: { reaches: [], undoes: ['deposit paid'], reason: 'Less than the deposit is paid now.' },
  woodBought: { reaches: ['wood bought'], undoes: [], reason: 'The wood is bought.' },
  firstCut: { reaches: ['cutting'], undoes: [], reason: 'The first rail is on the machine.' },
  lastRailCut: { reaches: ['cutting', 'assembly'], undoes: [], reason: 'The last rail is cut.' },
  railToCut: { reaches: [], undoes: ['assembly'], reason: 'A rail is to be cut: one was added, or has to be made again.' },
  assembled: { reaches: ['finishing'], undoes: [], reason: 'The piece is assembled.' },
  assemblyReopened: { reaches: [], undoes: ['finishing'], reason: 'A step of the assembly is to be done again.' },
  finished: { reaches: ['ready'], undoes: [], reason: 'The finish is dry and the piece can leave.' },
  finishReopened: { reaches: [], undoes: ['ready'], reason: 'The finish is to be done again.' },
  delivered: { reaches: ['delivered'], undoes: [], reason: 'The piece is delivered.' },
  broughtBack: { reaches: [], undoes: ['delivered'], reason: 'The piece is back in the shop.' },
};

/** Milestones that a commission has reached, whether or not those before them are. */
export type Reached = ReadonlySet<Milestone>;

/** What an event makes of the milestones; what was reached stays so when it is told of again. */
export function moved(reached: Reached, event: StageEvent): Reached {
  const { reaches, undoes } = STAGE_MOVES[event];
  return new Set([...[...reached].filter((milestone) => !undoes.includes(milestone)), ...reaches]);
}

/**
 * The stage of a commission: as far as its milestones go without a gap. What comes too early counts once the gap is
 * closed, so the order in which news arrives does not matter.
 */
export function stageOf(reached: Reached): Stage {
  const gap = MILESTONES.findIndex((milestone) => !reached.has(milestone));
  return (gap < 0 ? STAGES[STAGES.length - 1] : STAGES[gap]) ?? 'enquiry';
}

/** What is reached beyond the stage: work that went ahead of what should come before it. */
export function aheadOf(reached: Reached): Milestone[] {
  const at = STAGES.indexOf(stageOf(reached));
  return MILESTONES.filter((milestone) => reached.has(milestone) && STAGES.indexOf(milestone) > at);
}

const LONGEST_REASON = 300;

/** A commission put to a stage by hand: all before it is reached and nothing after, and the reason stands in the log. */
export function movedByHand(to: Stage, from: Stage, typed: string):
  | { readonly ok: true; readonly reached: Reached; readonly reason: string }
  | { readonly ok: false; readonly problem: ShopProblem } {
  const reason = typed.trim();
  if (to === from) return { ok: false, problem: { field: 'stage', message: `The commission is at "${to}" already. Choose another stage.` } };
  if (reason === '') return { ok: false, problem: { field: 'reason', message: 'Say why it is moved by hand: the log keeps it.' } };
  if (reason.length > LONGEST_REASON) return { ok: false, problem: { field: 'reason', message: `The reason is too long. Use ${LONGEST_REASON} characters or fewer.` } };
  return { ok: true, reached: new Set(MILESTONES.slice(0, STAGES.indexOf(to))), reason };
}

/** The day, `2026-12-18`, on which each stage was entered, as far as known. */
export type StageDays = Readonly<Partial<Record<Stage, string>>>;

/** The days after a move to a stage: it is entered today, what lies before keeps its day, what lies after has none any more. */
export function movedTo(days: StageDays, stage: Stage, today: string): StageDays {
  const at = STAGES.indexOf(stage);
  return { ...Object.fromEntries(STAGES.slice(0, at).flatMap((one) => (days[one] === undefined ? [] : [[one, days[one]]]))), [stage]: today };
}
