import { z } from 'zod';
import { LENGTH_HELP, formatSize, lengthIn, parseLength } from '../measure/length';
import { objectError } from '../measure/messages';
import { UNITS, type Units, byUnits, convertLength } from '../measure/units';

/** One kind of coin: sizes in the tally's units, mass in grams (null: not known, a brass disc is assumed for weights). */
export interface CoinKind {
  readonly name: string;
  readonly diameter: number;
  readonly thickness: number;
  readonly count: number;
  readonly mass: number | null;
}

/** A customer's coins. Names are unlike each other: a kind is known by its name everywhere. */
export interface Tally {
  readonly units: Units;
  readonly kinds: readonly CoinKind[];
}

/** What a tally may hold. */
export const TALLY_LIMITS = {
  /** 6 mm is below any coin struck for use, 125 mm (5 in) above any that stands in a rail: common practice, no source. */
  diameter: { in: [0.25, 5], mm: [6, 125] },
  /** Foil to a thick medal: common practice, no source. */
  thickness: { in: [0.02, 0.75], mm: [0.5, 19] },
  /** What one commission's rails could hold, several times over. */
  count: 1000,
  kinds: 40,
  name: 60,
  /** A kilogram: a slip of the decimal point beyond it. */
  mass: 1000,
} as const;

const shown = (value: unknown) => (typeof value === 'string' ? `"${value.slice(0, 40)}"` : String(value));

/** A size of a coin in the tally's units, or the sentence that says why it is none. */
export function readCoinSize(field: 'diameter' | 'thickness', raw: unknown, units: Units): number | string {
  const what = field === 'diameter' ? 'The diameter' : 'The thickness';
  const written = typeof raw === 'number' ? { value: raw, units: null } : typeof raw === 'string' ? parseLength(raw) : null;
  if (raw === undefined || raw === null || raw === '') return `${what} is missing. ${LENGTH_HELP}`;
  if (!written || !Number.isFinite(written.value)) return `${what} is ${shown(raw)}. That is not a size we can read. ${LENGTH_HELP}`;
  const value = lengthIn(units, written);
  const [least, most] = TALLY_LIMITS[field][units];
  if (value < least || value > most) return `${what} is ${formatSize(value, units)}. Use ${formatSize(least, units)} to ${formatSize(most, units)}.`;
  return value;
}

/** What is wrong with one kind's two sizes together, or null. */
export function discProblem(kind: Pick<CoinKind, 'diameter' | 'thickness'>, units: Units): string | null {
  // A disc thicker than half its diameter is a slug, and most likely two columns changed over.
  if (kind.thickness <= kind.diameter / 2) return null;
  return `A coin ${formatSize(kind.diameter, units)} across and ${formatSize(kind.thickness, units)} thick is no coin. Are diameter and thickness changed over?`;
}

const lengthSchema = z.union([z.number(), z.string()]).optional().nullable();

const kindSchema = z.strictObject({
  name: z.string({ error: 'Name the kind of coin.' }).trim().min(1, { error: 'The name is missing. Say what the customer calls this coin.' })
    .max(TALLY_LIMITS.name, { error: `The name is too long. Use ${TALLY_LIMITS.name} characters or fewer.` }),
  diameter: lengthSchema,
  thickness: lengthSchema,
  count: z.number({ error: 'Give the count as a whole number.' }).int({ error: 'Give the count as a whole number.' })
    .min(1, { error: `The count is below 1. Use 1 to ${TALLY_LIMITS.count}, or take the line out.` }).max(TALLY_LIMITS.count, { error: `The count is too large. Use 1 to ${TALLY_LIMITS.count}.` }),
  mass: z.number({ error: 'Give the mass in grams.' }).positive({ error: 'Give the mass in grams, above 0.' }).max(TALLY_LIMITS.mass, { error: `Give the mass in grams, ${TALLY_LIMITS.mass} or less.` }).nullable().optional(),
}, { error: objectError('each kind of coin with name, diameter, thickness and count') });

/** Two kinds go by one name whatever its case. */
export const nameKey = (name: string) => name.trim().toLowerCase();

/** A tally as a form or a request gives it: sizes as numbers in `units` or in the trade's notation. */
export const tallySchema = z
  .strictObject({
    units: z.enum(UNITS, { error: `Use ${UNITS.join(' or ')} for the tally's units.` }),
    kinds: z.array(kindSchema, { error: 'Give the kinds of coin as a list.' }).min(1, { error: 'The tally is empty. Give at least one kind of coin.' })
      .max(TALLY_LIMITS.kinds, { error: `The tally has more than ${TALLY_LIMITS.kinds} kinds. Put like coins together.` }),
  }, { error: objectError('a tally as units and kinds') })
  .transform(({ units, kinds }, context): Tally => {
    const seen = new Map<string, number>();
    const read = kinds.map((kind, index): CoinKind => {
      const sizeOf = (field: 'diameter' | 'thickness'): number => {
        const size = readCoinSize(field, kind[field], units);
        if (typeof size === 'number') return size;
        context.addIssue({ code: 'custom', path: ['kinds', index, field], message: size });
        return NaN;
      };
      const disc = { diameter: sizeOf('diameter'), thickness: sizeOf('thickness') };
      const problem = discProblem(disc, units);
      if (problem && !Number.isNaN(disc.diameter + disc.thickness)) context.addIssue({ code: 'custom', path: ['kinds', index, 'thickness'], message: problem });
      const before = seen.get(nameKey(kind.name));
      if (before !== undefined) context.addIssue({ code: 'custom', path: ['kinds', index, 'name'], message: `"${kind.name}" stands in line ${before + 1} too. Give each kind its own name, or one line with the whole count.` });
      else seen.set(nameKey(kind.name), index);
      return { name: kind.name, ...disc, count: kind.count, mass: kind.mass ?? null };
    });
    return { units, kinds: read };
  });

export type TallyInput = z.input<typeof tallySchema>;

/** Coins in a tally. */
export function countOf(tally: Tally): number {
  return tally.kinds.reduce((sum, { count }) => sum + count, 0);
}

/** A tally in the piece's units. */
export function tallyIn(units: Units, tally: Tally): Tally {
  const convert = (length: number) => convertLength(length, tally.units, units);
  return { units, kinds: tally.kinds.map((kind) => ({ ...kind, diameter: convert(kind.diameter), thickness: convert(kind.thickness) })) };
}

/** Density assumed of a coin whose mass nobody gave, g/cm³: brass, the heavier of the two usual metals (brass 8.5, zinc alloy 6.6: common practice), so that hardware is not chosen too weak. */
const BRASS = 8.5;

/** Mass of one coin in grams: as given, or a plain disc of brass, π D² t / 4 × density. */
export function massOf(kind: Pick<CoinKind, 'diameter' | 'thickness' | 'mass'>, units: Units): number {
  const centimetres = byUnits(units, 2.54, 0.1);
  return kind.mass ?? (Math.PI / 4) * kind.diameter ** 2 * kind.thickness * centimetres ** 3 * BRASS;
}
