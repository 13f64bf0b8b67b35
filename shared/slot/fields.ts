import type { SlotSpec } from './spec';

/** What a page, a message or a sheet calls a field, and for an optional one where its default comes from. */
export interface FieldFacts {
  readonly words: string;
  /** Null: the field is required. */
  readonly defaultSource: string | null;
}

const PRACTICE = 'common practice, no source';

/** Every field of a spec, in the order of a drawing: rail and slot, then bit, then cut, then holding and machine. */
export const FIELDS: Readonly<Record<keyof SlotSpec, FieldFacts>> = {
  units: { words: 'unit of length', defaultSource: null },
  name: { words: 'name', defaultSource: 'empty' },
  length: { words: 'slot length', defaultSource: null },
  width: { words: 'slot width', defaultSource: null },
  depth: { words: 'slot depth', defaultSource: null },
  stopMargin: { words: 'stop margin', defaultSource: null },
  bitDiameter: { words: 'bit diameter', defaultSource: null },
  stepdown: { words: 'stepdown', defaultSource: null },
  railWidth: { words: 'rail width', defaultSource: `3 × slot width, the joiner's rule of thirds; ${PRACTICE}` },
  railThickness: { words: 'rail thickness', defaultSource: '3/4 in or 19 mm: a dry 1 in board, PS 20' },
  ends: { words: 'ends', defaultSource: "cornered: inside corners keep the bit's radius" },
  wood: { words: 'wood', defaultSource: 'hardwood: its chip load band is the lowest' },
  flutes: { words: 'flute count', defaultSource: `2; ${PRACTICE}` },
  spindleSpeed: { words: 'spindle speed', defaultSource: `16 000 rev/min, within the machine's range; ${PRACTICE}` },
  feed: { words: 'feed', defaultSource: "the advised chip load's lower third, at most the machine's top feed" },
  plungeFeed: { words: 'plunge feed', defaultSource: `a quarter of the feed; ${PRACTICE}` },
  rampAngle: { words: 'ramp angle', defaultSource: `3°, of 2 to 5; ${PRACTICE}` },
  stepover: { words: 'stepover', defaultSource: `0.4 of the bit's diameter; ${PRACTICE}` },
  finishAllowance: { words: 'finish allowance', defaultSource: '0: no finish lap' },
  direction: { words: 'direction', defaultSource: `climb, for work that is clamped; ${PRACTICE}` },
  cuttingLength: { words: 'cutting length', defaultSource: `3 × bit diameter; ${PRACTICE}` },
  bitKind: { words: 'bit kind', defaultSource: 'straight' },
  centreCutting: { words: 'centre cutting', defaultSource: 'false: assume the bit cannot plunge' },
  chipLoadRange: { words: 'chip load range', defaultSource: `the shop's chart for wood and bit; ${PRACTICE}` },
  colletDiameter: { words: 'collet nut diameter', defaultSource: `1 1/4 in or 32 mm; ${PRACTICE}` },
  stickout: { words: 'stickout', defaultSource: 'the least that keeps the nut 1/4 in or 6 mm above the clamps at full depth' },
  clampHeight: { words: 'clamp height', defaultSource: `1/2 in or 12 mm; ${PRACTICE}` },
  clampReach: { words: 'clamp reach', defaultSource: '0: held from outside the rail' },
  safeHeight: { words: 'safe height', defaultSource: 'clamp height + 1/4 in or 6 mm' },
  workZero: { words: 'work zero', defaultSource: "the rail's front left corner" },
  spindle: { words: 'spindle', defaultSource: 'switched by the program' },
  machine: { words: 'machine', defaultSource: 'none: what needs one is not measured' },
};
