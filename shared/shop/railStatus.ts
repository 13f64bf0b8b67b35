import type { ShopProblem } from './fields';

/** Where a rail stands: being drawn; with a program of its current drawing; cut to it. */
export const RAIL_STATUSES = ['draft', 'ready', 'cut'] as const;
export type RailStatus = (typeof RAIL_STATUSES)[number];

/**
 * What moves a rail: a program of its current drawing that reads back well, a new revision of its drawing, a cut of its
 * current program that went well or was spoiled, and a cut taken back because it was logged by mistake or has to be
 * made again.
 */
export const RAIL_EVENTS = ['programMade', 'revised', 'cutWell', 'spoiled', 'cutTakenBack'] as const;
export type RailEvent = (typeof RAIL_EVENTS)[number];

/** One step of a rail's life, or why there is none. `reason` is for the rail's log, `refused` for whoever asked. */
export type RailStep =
  | { readonly to: RailStatus; readonly reason: string }
  | { readonly refused: string };

const NO_PROGRAM = 'The rail is a draft: no program of its current drawing has been read back. Make one, then cut it.';
const NOT_CUT = 'The rail has not been cut well yet. Log its cut first.';

/** Every status met by every event. */
export const RAIL_STEPS: Readonly<Record<RailStatus, Readonly<Record<RailEvent, RailStep>>>> = {
  draft: {
    programMade: { to: 'ready', reason: 'A program of this drawing has been read back.' },
    revised: { to: 'draft', reason: 'The drawing was changed.' },
    cutWell: { refused: NO_PROGRAM },
    spoiled: { refused: NO_PROGRAM },
    cutTakenBack: { refused: NOT_CUT },
  },
  ready: {
    programMade: { to: 'ready', reason: 'Another program of this drawing has been read back.' },
    revised: { to: 'draft', reason: 'The drawing was changed: its programs are of an older revision.' },
    cutWell: { to: 'cut', reason: 'It was cut well.' },
    spoiled: { to: 'ready', reason: 'The cut was spoiled: it is to be cut again.' },
    cutTakenBack: { refused: NOT_CUT },
  },
  cut: {
    programMade: { to: 'cut', reason: 'A program was made again; the rail is cut already.' },
    revised: { to: 'draft', reason: 'The drawing was changed: what was cut is of an older revision.' },
    cutWell: { refused: 'The rail is cut already. Take that cut back first if it has to be cut again.' },
    spoiled: { refused: 'The rail is cut already. Take that cut back first if it was the one spoiled.' },
    cutTakenBack: { to: 'ready', reason: 'Its cut was taken back: it is to be cut again.' },
  },
};

/** What an event makes of a rail: its next status and the reason for its log, or the problem. */
export function moveRail(status: RailStatus, event: RailEvent):
  | { readonly ok: true; readonly status: RailStatus; readonly reason: string }
  | { readonly ok: false; readonly problem: ShopProblem } {
  const step = RAIL_STEPS[status][event];
  return 'refused' in step
    ? { ok: false, problem: { field: 'status', message: step.refused } }
    : { ok: true, status: step.to, reason: step.reason };
}
