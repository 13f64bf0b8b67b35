import { z } from 'zod';
import { objectError } from '../measure/messages';
import type { Units } from '../measure/units';
import type { Wood, WoodKind } from '../wood/woods';
import { ROOM, choiceField, chipLoadFigure, nameField, recordError, sizeField, wrong, yesNoField } from './fields';

/** What a shop's own wood is: it decides how deep a pass may be. */
export const OWN_WOOD_KINDS = ['hardwood', 'softwood', 'sheet'] as const;

/** What holds for sheet goods beyond how they cut. */
export interface SheetFacts {
  /** Whether its width follows the seasons as a solid board's does. */
  readonly movesSeasonally: boolean;
  readonly dustCaution: string;
}

/**
 * MDF and plywood: fibres or crossed plies hold each other, so that neither moves with the seasons as a board does
 * (Wood Handbook, FPL-GTR-190, ch. 11, from memory); what to do about the dust is common practice, no source.
 */
export const SHEET_FACTS: Readonly<Record<Extract<WoodKind, 'plywood' | 'mdf'>, SheetFacts>> = {
  mdf: { movesSeasonally: false, dustCaution: 'MDF makes very fine dust that hangs in the air. Extract it at the bit and wear a respirator, also while you sweep up.' },
  plywood: { movesSeasonally: false, dustCaution: 'Plywood dust holds glue. Extract it at the bit and wear a respirator.' },
};

/** Diameters of the chip load table: those of router bits. */
const DIAMETER = { least: { in: 0.01, mm: 0.25 }, most: { in: 4, mm: 100 } } as const;
const MOST_ROWS = 30; // more diameters than a shop owns

function chipLoadIn(units: Units) {
  return z.strictObject({
    diameter: sizeField(units, 'bit diameter', DIAMETER),
    least: chipLoadFigure(units, 'least chip load'),
    most: chipLoadFigure(units, 'greatest chip load'),
  }, { error: objectError('each chip load as an object with diameter, least and most') })
    .refine((row) => row.least < row.most, { path: ['most'], error: ROOM });
}

function woodIn<const U extends Units>(units: U) {
  return z.strictObject({
    units: z.literal(units),
    name: nameField("the wood's name"),
    kind: choiceField('kind of wood', OWN_WOOD_KINDS),
    /** Per bit diameter; none: the shop's chart for the kind stands in. Answered smallest bit first. */
    chipLoads: z.array(chipLoadIn(units), { error: wrong('chip loads', 'Use a list.') })
      .max(MOST_ROWS, { error: `There are more than ${MOST_ROWS} chip loads. Use ${MOST_ROWS} or fewer.` })
      .superRefine((rows, context) => {
        rows.forEach((row, i) => {
          if (rows.findIndex(({ diameter }) => diameter === row.diameter) === i) return;
          context.addIssue({ code: 'custom', path: [i, 'diameter'], message: `The bit diameter ${row.diameter} ${units} stands twice. Keep one chip load for each diameter.` });
        });
      })
      .transform((rows) => [...rows].sort((a, b) => a.diameter - b.diameter))
      .default([]),
    /** Said wherever this wood is cut; null: nothing beyond what holds for every wood. */
    dustCaution: z.string({ error: wrong('dust caution', 'Give it as text.') }).trim()
      .max(200, { error: 'The dust caution is too long. Use 200 characters or fewer.' })
      .transform((text) => text || null).nullable().default(null),
    movesSeasonally: yesNoField('moves with the seasons'),
  }, { error: recordError('the wood as an object') });
}

/** A wood of the shop's own. Diameters are numbers in its units or the trade's notation; chip loads in units per tooth. */
export const ownWoodSchema = z.discriminatedUnion('units', [woodIn('in'), woodIn('mm')], { error: recordError('the wood as one object') });

export type OwnWood = z.output<typeof ownWoodSchema>;
export type OwnWoodInput = z.input<typeof ownWoodSchema>;

/** The wood that a slot spec names for a shop's own: its kind. Sheets go as plywood, whose chart is the lower of the two. */
export function kindOf(wood: Pick<OwnWood, 'kind'>): Wood {
  return wood.kind === 'sheet' ? 'plywood' : wood.kind;
}

/**
 * The chip load that the shop gave for a bit in its own wood, least and most, in the wood's units; null where it gave
 * none. Between two diameters along a straight line, below the smallest in proportion, above the largest its own: as
 * the shop's chart is read.
 */
export function ownChipLoad({ chipLoads }: Pick<OwnWood, 'chipLoads'>, diameter: number): readonly [number, number] | null {
  const above = chipLoads.findIndex((row) => row.diameter >= diameter);
  const high = above < 0 ? chipLoads[chipLoads.length - 1] : chipLoads[above];
  if (!high) return null;
  if (above < 0) return [high.least, high.most];
  const low = chipLoads[above - 1] ?? { diameter: 0, least: 0, most: 0 };
  const t = (diameter - low.diameter) / (high.diameter - low.diameter);
  return [low.least + t * (high.least - low.least), low.most + t * (high.most - low.most)];
}
