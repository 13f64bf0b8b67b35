import type { ShopProblem } from './fields';

/** Where a rail stands: being drawn; with a program of its current drawing; cut to it, as many of it as are wanted. */
export const RAIL_STATUSES = ['draft', 'ready', 'cut'] as const;
export type RailStatus = (typeof RAIL_STATUSES)[number];

/**
 * What moves a rail: a program of its current drawing that reads back well, a new revision of its drawing, a cut of its
 * current program that went well with more of it wanted, or as the last one wanted, or was spoiled, and a cut taken
 * back because it was logged by mistake or has to be made again.
 */
export const RAIL_EVENTS = ['programMade', 'revised', 'cutOne', 'cutLast', 'spoiled', 'cutTakenBack'] as const;
export type RailEvent = (typeof RAIL_EVENTS)[number];

/** One step of a rail's life, or why there is none. `reason` is for the rail's log, `refused` for whoever asked. */
export type RailStep =
  | { readonly to: RailStatus; readonly reason: string }
  | { readonly refused: string };

const NO_PROGRAM = 'The rail is a draft: no program of its current drawing has been read back. Make one, then cut it.';
const NOT_CUT = 'The rail is a draft: no cut of its current drawing is logged. Log one first.';

/** Every status met by every event. */
export const RAIL_STEPS: Readonly<Record<RailStatus, Readonly<Record<RailEvent, RailStep>>>> = {
  draft: {
    programMade: { to: 'ready', reason: 'A program of this drawing has been read back.' },
    revised: { to: 'draft', reason: 'The drawing was changed.' },
    cutOne: { refused: NO_PROGRAM },
    cutLast: { refused: NO_PROGRAM },
    spoiled: { refused: NO_PROGRAM },
    cutTakenBack: { refused: NOT_CUT },
  },
  ready: {
    programMade: { to: 'ready', reason: 'Another program of this drawing has been read back.' },
    revised: { to: 'draft', reason: 'The drawing was changed: its programs are of an older revision.' },
    cutOne: { to: 'ready', reason: 'One was cut well; more are wanted.' },
    cutLast: { to: 'cut', reason: 'It was cut well.' },
    spoiled: { to: 'ready', reason: 'The cut was spoiled: it is to be cut again.' },
    cutTakenBack: { to: 'ready', reason: 'A cut was taken back: it is to be cut again.' },
  },
  cut: {
    programMade: { to: 'cut', reason: 'A program was made again; the rail is cut already.' },
    revised: { to: 'draft', reason: 'The drawing was changed: what was cut is of an older revision.' },
    cutOne: { to: 'ready', reason: 'More of it are wanted than before.' },
    cutLast: { to: 'cut', reason: 'It was cut once more than was wanted.' },
    spoiled: { to: 'cut', reason: 'One more than was wanted was spoiled; what was cut well stands.' },
    cutTakenBack: { to: 'ready', reason: 'Its cut was taken back: it is to be cut again.' },
  },
};

/** Which event a cut that went well is, counting it. Both counts are of the rail's current drawing. */
export function cutEvent(cutWell: number, wanted: number): Extract<RailEvent, 'cutOne' | 'cutLast'> {
  return cutWell < wanted ? 'cutOne' : 'cutLast';
}

/** What an event makes of a rail: its next status and the reason for its log, or the problem. */
export function moveRail(status: RailStatus, event: RailEvent):
  | { readonly ok: true; readonly status: RailStatus; readonly reason: string }
  | { readonly ok: false; readonly problem: ShopProblem } {
  const step = RAIL_STEPS[status][event];
  return 'refused' in step
    ? { ok: false, problem: { field: 'status', message: step.refused } }
    : { ok: true, status: step.to, reason: step.reason };
}
