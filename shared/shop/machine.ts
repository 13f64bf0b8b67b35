import { z } from 'zod';
import { objectError } from '../measure/messages';
import { type Units, byUnits } from '../measure/units';
import { programOptionsSchema } from '../program/options';
import { SPINDLE_CONTROLS } from '../slot/spec';
import { choiceField, figureField, nameField, rangeField, recordError, sizeField, wrong, yesNoField } from './fields';

/** How a rail is held: at both ends from above, between jaws along its sides, or laid against a fence on tape. */
export const HOLDING_KINDS = ['end clamps', 'side vise', 'fence and tape'] as const;

/** Limits of what a machine's record takes: wide enough for any router table, narrow enough to catch a slip of units. */
const LIMITS = {
  /** An axis: from a hand-sized engraver to a 20 ft table. */
  axis: { least: { in: 0.5, mm: 12 }, most: { in: 240, mm: 6096 } },
  /** Zero: nothing stands above the rail, or on it. */
  holding: { least: { in: 0, mm: 0 }, most: { in: 12, mm: 300 } },
  gripped: { least: { in: 0.25, mm: 6 }, most: { in: 48, mm: 1220 } },
} as const;

/** Finished sizes hold to this, so no chord may stray further (0.0005 in, 0.01 mm: as in the slot request). */
export const coarsestChord = (units: Units): number => byUnits(units, 0.0005, 0.01);

function holdingIn(units: Units) {
  return z.strictObject({
    kind: choiceField('way of holding', HOLDING_KINDS),
    /** Greatest rail width that it grips; null: any. */
    widest: sizeField(units, 'greatest rail width gripped', LIMITS.gripped).nullable().default(null),
    /** Its highest part above the rail's top. */
    height: sizeField(units, 'height above the rail', LIMITS.holding),
    /** How far it comes in from each rail end. */
    reach: sizeField(units, 'reach onto the rail', LIMITS.holding),
  }, { error: objectError('each way of holding as an object with kind, widest, height and reach') })
    .refine(({ kind, widest }) => kind !== 'side vise' || widest !== null, {
      path: ['widest'], error: "Greatest rail width gripped is missing. Give the vise's opening.",
    })
    .refine(({ kind, reach }) => kind === 'end clamps' || reach === 0, {
      path: ['reach'], error: 'Only end clamps reach onto the rail from its ends. Use 0.',
    });
}

function machineIn<const U extends Units>(units: U) {
  const perMinute = `${units} a minute`;
  const axis = (words: string) => sizeField(units, words, LIMITS.axis);
  const feed = (words: string) => figureField(words, byUnits(units, 1, 25), byUnits(units, 5000, 127_000), perMinute); // 5000 in/min: above any router
  // A place in the machine's own coordinates, which lie below zero on many machines.
  const place = (words: string) => figureField(words, -byUnits(units, 240, 6096), byUnits(units, 240, 6096), units);
  return z.strictObject({
    units: z.literal(units),
    name: nameField("the machine's name"),
    /** The box that the bit's tip can reach, from the table up. */
    workArea: z.strictObject({ x: axis('work area along X'), y: axis('work area along Y'), z: axis('work area along Z') }, {
      error: objectError('the work area as x, y and z'),
    }),
    /** Highest feed of each axis. */
    topFeed: z.strictObject({ x: feed('highest feed along X'), y: feed('highest feed along Y'), z: feed('highest feed along Z') }, {
      error: objectError('the highest feeds as x, y and z'),
    }),
    /** Units per second squared, of the slowest axis; null: not known. */
    acceleration: figureField('acceleration', byUnits(units, 0.1, 2), byUnits(units, 2000, 50_000), `${units}/s²`).nullable().default(null),
    spindleRange: rangeField('spindle speed', 100, 100_000, 'rev/min'),
    spindle: choiceField('spindle', SPINDLE_CONTROLS),
    /** True for an industrial frame: the heavier chip load band and stepdown apply. */
    heavy: yesNoField('heavy').default(false),
    options: programOptionsSchema.prefault({})
      .superRefine(({ programUnits, chordTolerance }, context) => {
        if (programUnits !== null && programUnits !== units) {
          context.addIssue({ code: 'custom', path: ['programUnits'], message: `The program units are ${programUnits}. A program is in its machine's units: use ${units}, or change the machine's.` });
        }
        if (chordTolerance > coarsestChord(units)) {
          context.addIssue({ code: 'custom', path: ['chordTolerance'], message: `The chord tolerance is ${chordTolerance}. Use ${coarsestChord(units)} ${units} or less.` });
        }
      }),
    /** Where the spindle stands while a rail is laid on, in the machine's own coordinates. */
    parking: z.strictObject({ x: place('parking place along X'), y: place('parking place along Y'), z: place('parking place along Z') }, {
      error: objectError('the parking place as x, y and z'),
    }).nullable().default(null),
    holdings: z.array(holdingIn(units), { error: wrong('ways of holding', 'Use a list.') })
      .min(1, { error: 'There is no way of holding. Give at least one.' })
      .max(20, { error: 'There are more than 20 ways of holding. Use 20 or fewer.' }),
  }, { error: objectError('the machine as an object') });
}

/** A machine as it is entered or changed. Sizes are numbers in its units or the trade's notation; feeds in units per minute. */
export const machineSchema = z.discriminatedUnion('units', [machineIn('in'), machineIn('mm')], { error: recordError('the machine as one object') });

export type Machine = z.output<typeof machineSchema>;
export type MachineInput = z.input<typeof machineSchema>;
export type Holding = Machine['holdings'][number];
