import { z } from 'zod';
import { objectError } from '../measure/messages';
import { figureField, wrong } from './fields';

/** How a cut came out. */
export const OUTCOMES = ['well', 'spoiled'] as const;

const MOST_PLACES = 12;

const measured = (words: string) => z.array(figureField(words, 0.0001, 6096, "of the drawing's units"), { error: wrong(words, 'Use a list of figures.') })
  .max(MOST_PLACES, { error: `There are more than ${MOST_PLACES} measurements. Use ${MOST_PLACES} or fewer.` }).default([]);

/** A cut as the bench logs it, under an id that the bench made: sent again after a lost answer, it is still one cut. */
export const cutSchema = z.strictObject({
  id: z.string({ error: wrong('id', 'Make one for the cut.') }).regex(/^[\w-]{16,64}$/, { error: 'The id is not one that a bench makes.' }),
  programId: z.string({ error: wrong('program', 'Say which program was cut.') }).min(1, { error: 'Say which program was cut.' }),
  outcome: z.enum(OUTCOMES, { error: 'Say whether it was cut well or spoiled.' }),
  reason: z.string({ error: wrong('reason', 'Give it as text.') }).trim().max(300, { error: 'The reason is too long. Use 300 characters or fewer.' }).default(''),
  /** By the bench's stopwatch; null where it was not started. */
  seconds: figureField('time of the cut', 0, 86_400, 'seconds').nullable().default(null),
  /** First-off measurements, in the drawing's units. */
  widths: measured('measured width'),
  depths: measured('measured depth'),
  cutAt: z.iso.datetime({ error: 'The time of the cut cannot be read.' }),
}, { error: objectError('id, programId, outcome and cutAt') })
  .refine(({ outcome, reason }) => outcome === 'well' || reason !== '', { path: ['reason'], error: 'Say why it was spoiled: whoever cuts it again wants to know.' });

export type CutInput = z.input<typeof cutSchema>;
