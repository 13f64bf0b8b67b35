import { z } from 'zod';
import { objectError } from '../measure/messages';
import { slotRequestSchema, type SlotRequest, type SlotRequestInput } from '../slot/request';
import { wrong } from './fields';

/** Most rails of one drawing: above any job of a small shop. */
const MOST_RAILS = 500;

/** The drawing as a link writes it (app/utils/link): figures as they were typed, which no request keeps. Empty: the page draws it from the request. */
const draft = z.string({ error: wrong('drawing', 'Send it as its link writes it.') }).regex(/^(?:1\.[\w-]{1,8190})?$/, { error: 'The drawing cannot be read. Send it as its link writes it.' }).default('');

/** A drawing's request: judged as for a program, kept as it was sent. */
const request = z.unknown().transform((raw, context): { readonly input: SlotRequestInput; readonly slot: SlotRequest } => {
  const judged = slotRequestSchema.safeParse(raw);
  if (judged.success) return { input: raw as SlotRequestInput, slot: judged.data }; // what the schema took is its input
  for (const { path, message } of judged.error.issues) context.addIssue({ code: 'custom', path: [...path], message });
  return z.NEVER;
});

const quantity = z.number({ error: wrong('how many', `Use 1 to ${MOST_RAILS}.`) }).int({ error: 'How many is no whole number.' })
  .min(1, { error: wrong('how many', `Use 1 to ${MOST_RAILS}.`) }).max(MOST_RAILS, { error: wrong('how many', `Use 1 to ${MOST_RAILS}.`) });
const due = z.iso.date({ error: 'The due date cannot be read. Write it as 2026-12-18.' }).nullable();
const note = z.string({ error: wrong('note', 'Give it as text.') }).trim().max(200, { error: 'The note is too long. Use 200 characters or fewer.' }).default('');

/** A new rail. */
export const railSchema = z.strictObject({ draft, request, quantity: quantity.default(1), due: due.default(null), note }, { error: objectError('draft, request, quantity, due and note') });

/** A rail's next revision: `basedOn` is the one it was drawn from, so that nobody's work is lost by another's. */
export const revisionSchema = z.strictObject({
  draft, request, note,
  basedOn: z.number({ error: wrong('revision', 'Give the number of the revision you drew from.') }).int().min(1),
}, { error: objectError('draft, request, note and basedOn') });

/** What changes of a rail without a new revision. */
export const railPatchSchema = z.strictObject({ quantity: quantity.optional(), due: due.optional() }, { error: objectError('quantity and due') });

/** What a rail's program is made with. */
export const cutWithSchema = z.strictObject({
  machineId: z.string({ error: wrong('machine', 'Choose one of your machines.') }).min(1, { error: 'Choose a machine.' }),
  bitId: z.string({ error: wrong('bit', 'Choose one of your bits.') }).min(1, { error: 'Choose a bit.' }),
  /** Which of the machine's ways of holding, from 0. */
  holding: z.number({ error: wrong('way of holding', "Choose one of the machine's.") }).int().min(0),
  woodId: z.string().nullable().default(null),
}, { error: objectError('machineId, bitId and holding') });
export type CutWithInput = z.output<typeof cutWithSchema>;
