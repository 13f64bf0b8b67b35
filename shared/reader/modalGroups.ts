/**
 * The codes of the language in their modal groups: NISTIR 6556 Table 4, as data.
 * A G code is kept as ten times its number (G59.1 is 591), because some have a tenth.
 */
export const G_GROUPS = {
  nonModal: [4, 10, 28, 30, 53, 92, 92.1, 92.2, 92.3],
  motion: [0, 1, 2, 3, 38.2, 80, 81, 82, 83, 84, 85, 86, 87, 88, 89],
  plane: [17, 18, 19],
  distance: [90, 91],
  feedMode: [93, 94],
  units: [20, 21],
  radiusCompensation: [40, 41, 42],
  lengthOffset: [43, 49],
  cycleReturn: [98, 99],
  workOffset: [54, 55, 56, 57, 58, 59, 59.1, 59.2, 59.3],
  pathControl: [61, 61.1, 64],
} as const;

/** M7 and M8 may be active together, yet 3.3.5 still allows one word of a group on a line. */
export const M_GROUPS = {
  stopping: [0, 1, 2, 30, 60],
  toolChange: [6],
  spindle: [3, 4, 5],
  coolant: [7, 8, 9],
  overrides: [48, 49],
} as const;

/** Codes of the report that this reader refuses by name: a stopped groove needs none of them. */
export const NOT_READ: Readonly<Record<number, string>> = {
  10: 'coordinate system data',
  28: 'return to home',
  30: 'return to secondary home',
  38.2: 'straight probe',
  41: 'cutter radius compensation, left',
  42: 'cutter radius compensation, right',
  43: 'tool length offset',
  53: 'motion in machine coordinates',
  81: 'canned cycle',
  82: 'canned cycle',
  83: 'canned cycle',
  84: 'canned cycle',
  85: 'canned cycle',
  86: 'canned cycle',
  87: 'canned cycle',
  88: 'canned cycle',
  89: 'canned cycle',
  92: 'coordinate system offset',
  92.1: 'coordinate system offset',
  92.2: 'coordinate system offset',
  92.3: 'coordinate system offset',
};

/** Codes of group 0 that use the axis words (3.4). */
export const AXIS_USING: readonly number[] = [10, 28, 30, 92];

export type GGroup = keyof typeof G_GROUPS;
export type MGroup = keyof typeof M_GROUPS;

/** A group's number in the lookups below: its place in the table. */
const order = (groups: object, group: string) => Object.keys(groups).indexOf(group);
export const gGroup = (group: GGroup) => order(G_GROUPS, group);
export const mGroup = (group: MGroup) => order(M_GROUPS, group);

/** No group holds the code. */
export const NO_GROUP = -1;

/** From a code (times `scale`) to its group's number: one array read per word. */
function lookup(groups: Readonly<Record<string, readonly number[]>>, size: number, scale: number): Int8Array {
  const table = new Int8Array(size).fill(NO_GROUP);
  Object.values(groups).forEach((codes, group) => codes.forEach((code) => (table[Math.round(code * scale)] = group)));
  return table;
}

const G_LOOKUP = lookup(G_GROUPS, 1000, 10);
const M_LOOKUP = lookup(M_GROUPS, 100, 1);

/** The group of a G code given as ten times its number; NO_GROUP for what Table 5 does not list. */
export const groupOfG = (tenths: number): number => G_LOOKUP[tenths] ?? NO_GROUP;

/** The group of an M code; NO_GROUP for what Table 7 does not list. */
export const groupOfM = (code: number): number => M_LOOKUP[code] ?? NO_GROUP;

const UNREAD = new Uint8Array(1000);
for (const code of Object.keys(NOT_READ)) UNREAD[Math.round(Number(code) * 10)] = 1;

/** True for a G code, as ten times its number, that this reader refuses by name. */
export const isUnread = (tenths: number): boolean => UNREAD[tenths] === 1;
