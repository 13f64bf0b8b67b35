import { z } from 'zod';
import { LENGTH_HELP, formatSize, lengthIn, parseLength } from '../measure/length';
import { CONTROL, capital, objectError, quote } from '../measure/messages';
import { UNITS, type Units, byUnits } from '../measure/units';

/** What is wrong with one field of a shop's record, and what would work. */
export interface ShopProblem {
  readonly field: string;
  readonly message: string;
}

/** `Flute count is 0. Use 1 to 8.`, or that the field is missing. */
export const wrong = (words: string, help: string) => (issue: { readonly input?: unknown }) =>
  issue.input === undefined ? `${capital(words)} is missing. ${help}` : `${capital(words)} is ${quote(issue.input)}. ${help}`;

/** Least and greatest size, each in inches and in millimetres. */
export interface SizeLimits {
  readonly least: { readonly in: number; readonly mm: number };
  readonly most: { readonly in: number; readonly mm: number };
}

/**
 * A length of a record kept in `units`: a number in them, or text in the trade's notation, converted once where it
 * names the other unit. Parsing answers the number.
 */
export function sizeField(units: Units, words: string, limits: SizeLimits) {
  const [least, most] = [limits.least[units], limits.most[units]];
  const range = `Use ${formatSize(least, units)} to ${formatSize(most, units)}.`;
  return z
    .union([z.number(), z.string()], { error: wrong(words, LENGTH_HELP) })
    .transform((value, context): number => {
      const written = typeof value === 'number' ? { value, units: null } : parseLength(value);
      if (written === null) {
        context.addIssue({ code: 'custom', message: `${capital(words)} is ${quote(value)}. That is not a size we can read. ${LENGTH_HELP}` });
        return z.NEVER;
      }
      const length = lengthIn(units, written);
      if (length < least || length > most) {
        context.addIssue({ code: 'custom', message: `${capital(words)} is ${formatSize(length, units)}. ${range}` });
        return z.NEVER;
      }
      return length;
    });
}

/** A figure that is no length, within limits. */
export function figureField(words: string, least: number, most: number, what: string) {
  const error = wrong(words, `Use ${least} to ${most} ${what}.`);
  return z.number({ error }).min(least, { error }).max(most, { error });
}

/** One of a list of words. */
export const choiceField = <const Values extends readonly [string, ...string[]]>(words: string, values: Values) =>
  z.enum(values, { error: wrong(words, `Use ${values.join(' or ')}.`) });

export const yesNoField = (words: string) => z.boolean({ error: wrong(words, 'Use true or false.') });

/** Least and greatest of something, in that order. */
export function rangeField(words: string, least: number, most: number, what: string) {
  return z
    .tuple([figureField(`least ${words}`, least, most, what), figureField(`greatest ${words}`, least, most, what)], {
      error: wrong(words, 'Use two numbers, least then greatest.'),
    })
    .refine(([low, high]) => low <= high, { error: `Give the ${words} as least, then greatest.` });
}

/** Units per tooth. Half an inch a tooth is beyond any cutter: a feed typed in its place is caught. */
export const chipLoadFigure = (units: Units, words: string) => figureField(words, byUnits(units, 0.0001, 0.002), byUnits(units, 0.5, 12), `${units} per tooth`);

/** A chip load band: a slot takes one only with some room in it. */
export function chipLoadField(units: Units, words: string) {
  return z
    .tuple([chipLoadFigure(units, `least ${words}`), chipLoadFigure(units, `greatest ${words}`)], { error: wrong(words, 'Use two numbers, least then greatest.') })
    .refine(([least, most]) => least < most, { error: ROOM });
}

/** Said where a band has no room in it. */
export const ROOM = 'The greatest chip load is no more than the least. Give least, then greatest; around a single figure a tenth either way.';

/** Longest name of a record: one line of a list and of a sheet. */
const LONGEST_NAME = 60;

/** The name that the shop calls a record by. */
export const nameField = (words: string) =>
  z.string({ error: wrong(words, 'Give it as text.') }).trim()
    .min(1, { error: `${capital(words)} is empty. Give the words you call it by.` })
    .max(LONGEST_NAME, { error: `${capital(words)} is too long. Use ${LONGEST_NAME} characters or fewer.` })
    .refine((name) => !CONTROL.test(name), { error: `${capital(words)} holds a control character. Use plain text on one line.` });

/** The message of a record's schema: its units come first, since every size is read in them. */
export const recordError = (what: string) => (issue: { readonly code: string; readonly input?: unknown; readonly keys?: readonly string[] | undefined }) => {
  if (issue.code !== 'invalid_union') return objectError(what)(issue);
  const units = typeof issue.input === 'object' && issue.input !== null && 'units' in issue.input ? issue.input.units : undefined;
  return wrong('unit of length', `Use ${UNITS.join(' or ')}.`)({ input: units });
};
