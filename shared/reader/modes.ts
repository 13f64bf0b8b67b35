import type { Modes } from './motion';

/** Nothing stated yet. What a machine wakes up with is its own affair; DEFAULTS says how the reader takes a mode not stated. */
export const UNSTATED: Modes = Object.freeze({
  motion: null,
  plane: null,
  distance: null,
  feedMode: null,
  units: null,
  radiusCompensation: null,
  lengthOffset: null,
  workOffset: null,
  pathControl: null,
  spindle: null,
  spindleSpeed: null,
  selectedTool: null,
  coolant: null,
  overrides: null,
  feed: null,
});

/** How a mode not stated is taken: as the program end of NISTIR 6556 3.6.1 leaves it. A motion mode has to be stated. */
export const DEFAULTS = { plane: 17, distance: 90, feedMode: 94, workOffset: 54 } as const;

/** What M2 and M30 leave in force: the nine effects of NISTIR 6556 3.6.1. Length units are not among them. */
export const AFTER_END: Partial<Modes> = {
  workOffset: 54,
  plane: 17,
  distance: 90,
  feedMode: 94,
  overrides: 48,
  radiusCompensation: 40,
  spindle: 'stopped',
  motion: 1,
  coolant: 'off',
};

/** The modes with a change; call it only where something changes, so that steps share one object. */
export function withModes(modes: Modes, change: Partial<Modes>): Modes {
  return { ...modes, ...change };
}
