import { z } from 'zod';
import { BRAD_GAUGES, type BradGauge } from '../assembly/fasteners';
import { FINISHES, type FinishName } from '../assembly/finish';
import { COLOURS } from '../assembly/steps';
import { type CoinKind, TALLY_LIMITS, nameKey, tallyIn, tallySchema } from '../coin/tally';
import { objectError } from '../measure/messages';
import { pieceSchema } from '../piece/spec';
import { sizeField } from '../shop/fields';
import type { Build, Part } from '../wood/cutList';
import type { Offcut } from '../wood/buying';
import { WOODS, type Wood } from '../wood/woods';

const isFinish = (name: string): name is FinishName => name in FINISHES;
/** Finishes in the table's order. */
export const FINISH_NAMES: readonly FinishName[] = Object.keys(FINISHES).filter(isFinish);

const whole = (what: string, least: number, most: number) => z.number({ error: `Give ${what} as a whole number, ${least} to ${most}.` })
  .int({ error: `Give ${what} as a whole number, ${least} to ${most}.` }).min(least, { error: `Give ${what} as ${least} to ${most}.` }).max(most, { error: `Give ${what} as ${least} to ${most}.` });
const wood = (what: string) => z.enum(WOODS, { error: `Choose the ${what}'s wood.` });
const size = z.union([z.number(), z.string()]);
const kind = z.string({ error: 'Name the kind of coin.' }).max(TALLY_LIMITS.name);

const MOST_BATTENS = 12; // more than any wall piece is held by
const MOST_OFFCUTS = 60; // a rack's worth
/** Sizes of boards and battens: from veneer to a beam; common practice, no source. */
const BOARD = { least: { in: 1 / 8, mm: 3 }, most: { in: 8, mm: 200 } } as const;
const LENGTH = { least: { in: 0, mm: 0 }, most: { in: 240, mm: 6000 } } as const;
const KERF = { least: { in: 0, mm: 0 }, most: { in: 1 / 4, mm: 6 } } as const;

const buildSchema = z.strictObject({
  boardThickness: size, odd: wood('odd stripes'), even: wood('even stripes'), union: wood('union'), rails: wood('rails'), battens: wood('battens'),
  batten: z.strictObject({ count: whole('the number of battens', 0, MOST_BATTENS), width: size, thickness: size, inset: size }, { error: objectError('the battens as count, width, thickness and inset') }),
}, { error: objectError('the build as one object') });

const surfaceSchema = z.strictObject({
  colour: z.enum(COLOURS, { error: `Use ${COLOURS.join(', ')} for the colour.` }),
  finish: z.string().refine(isFinish, { error: 'Choose one of the finishes.' }),
  coats: whole('the number of coats', 1, 10),
  /** Bench hours that one coat takes. */
  coatHours: z.number({ error: 'Give the hours of a coat as a number.' }).positive({ error: 'Give the hours of a coat, above 0.' }).max(12, { error: 'Give the hours of a coat as 12 or less.' }),
}, { error: objectError('the surface as colour, finish, coats and coatHours') });

const yardSchema = z.strictObject({
  kerf: size,
  lengthsFeet: z.array(whole('a board length in feet', 1, 20), { error: 'Give the board lengths as a list of feet.' }).min(1, { error: 'Give at least one length of board.' }).max(8, { error: 'Give eight lengths or fewer.' }),
  offcuts: z.array(z.strictObject({ name: z.string().trim().min(1, { error: 'Name the offcut.' }).max(60, { error: 'Use 60 characters or fewer.' }), wood: wood('offcut'), thickness: size, width: size, length: size }, { error: objectError('an offcut as name, wood, thickness, width and length') }))
    .max(MOST_OFFCUTS, { error: `Keep ${MOST_OFFCUTS} offcuts or fewer.` }).default([]),
  /** Cents a board foot by wood: the owner's alone, and no part of what the shop hand is told. */
  centsPerBoardFoot: z.partialRecord(z.enum(WOODS), z.number({ error: 'Give the price in cents a board foot.' }).int({ error: 'Give the price in whole cents.' }).min(0, { error: 'A price is not below 0.' }).max(1e7, { error: 'That price is too high to be one of a board foot.' })).default({}),
}, { error: objectError('the wood yard as kerf, lengthsFeet, offcuts and centsPerBoardFoot') });

const GAUGES: readonly BradGauge[] = BRAD_GAUGES;
const pin = z.strictObject({ rail: z.string().max(2), kind, count: whole('pinned coins', 1, TALLY_LIMITS.count) }, { error: objectError('a pin as rail, kind and count') });

/** A commission's whole work as one document: coins, piece, woods, finish. Sizes in the trade's notation or as numbers in the piece's units. */
export const workSchema = z.strictObject({
  tally: tallySchema,
  toCome: z.array(z.strictObject({ kind, count: whole('coins to come', 1, TALLY_LIMITS.count) })).max(TALLY_LIMITS.kinds).default([]),
  piece: pieceSchema,
  pins: z.array(pin).max(TALLY_LIMITS.kinds * 12).default([]),
  build: buildSchema,
  surface: surfaceSchema,
  gauge: z.number().refine((value): value is BradGauge => GAUGES.some((gauge) => gauge === value), { error: `Use ${GAUGES.join(', ')} for the brads' gauge.` }),
  yard: yardSchema,
}, { error: objectError('the work as one object') }).transform((value, context) => {
  const { units } = value.piece;
  const read = (path: readonly (string | number)[], words: string, raw: unknown, limits: Parameters<typeof sizeField>[2]): number => {
    const judged = sizeField(units, words, limits).safeParse(raw);
    if (judged.success) return judged.data;
    context.addIssue({ code: 'custom', path: [...path], message: judged.error.issues[0]?.message ?? `The ${words} cannot be read.` });
    return NaN;
  };
  const { batten } = value.build;
  const build: Build = {
    ...value.build,
    boardThickness: read(['build', 'boardThickness'], 'board thickness', value.build.boardThickness, BOARD),
    batten: {
      count: batten.count, width: read(['build', 'batten', 'width'], 'batten width', batten.width, BOARD), thickness: read(['build', 'batten', 'thickness'], 'batten thickness', batten.thickness, BOARD),
      inset: read(['build', 'batten', 'inset'], 'batten inset', batten.inset, LENGTH),
    },
  };
  const offcuts: Offcut[] = value.yard.offcuts.map((offcut, n) => ({
    ...offcut, thickness: read(['yard', 'offcuts', n, 'thickness'], 'offcut thickness', offcut.thickness, BOARD), width: read(['yard', 'offcuts', n, 'width'], 'offcut width', offcut.width, LENGTH), length: read(['yard', 'offcuts', n, 'length'], 'offcut length', offcut.length, LENGTH),
  }));
  const names = new Set(value.tally.kinds.map(({ name }) => nameKey(name)));
  value.toCome.forEach(({ kind: name }, n) => {
    if (!names.has(nameKey(name))) context.addIssue({ code: 'custom', path: ['toCome', n], message: `${name} are to come, and the tally has no such coin.` });
  });
  return { ...value, build, yard: { ...value.yard, offcuts, kerf: read(['yard', 'kerf'], 'kerf', value.yard.kerf, KERF) } };
});

export type WorkInput = z.input<typeof workSchema>;
export type Work = z.output<typeof workSchema>;

/** The work as the bench may know it: without a price. */
export const withoutPrices = (work: WorkInput): WorkInput => ({ ...work, yard: { ...work.yard, centsPerBoardFoot: {} } });

/** The kinds of coin in the piece's units, each with its coins to come. */
export function kindsOf(work: Pick<Work, 'tally' | 'toCome' | 'piece'>): (CoinKind & { readonly toCome: number })[] {
  const toCome = (name: string) => work.toCome.filter(({ kind: of }) => nameKey(of) === nameKey(name)).reduce((sum, { count }) => sum + count, 0);
  return tallyIn(work.piece.units, work.tally).kinds.map((each) => ({ ...each, toCome: toCome(each.name) }));
}

/** Woods that a piece's parts are of, each once. */
export const woodsOf = (parts: readonly Part[]): Wood[] => [...new Set(parts.map(({ wood: of }) => of))];

/** A revision to save: `basedOn` is the one it was drawn from, 0 for the first, so that nobody's work is lost by another's. */
export const workRevisionSchema = z.strictObject({
  work: z.unknown().transform((raw, context): { readonly input: WorkInput; readonly work: Work } => {
    const judged = workSchema.safeParse(raw);
    if (judged.success) return { input: raw as WorkInput, work: judged.data }; // what the schema took is its input
    for (const { path, message } of judged.error.issues) context.addIssue({ code: 'custom', path: [...path], message });
    return z.NEVER;
  }),
  basedOn: z.number({ error: 'Give the number of the revision you drew from, 0 for none.' }).int().min(0),
}, { error: objectError('work and basedOn') });
