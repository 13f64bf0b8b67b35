import { z } from 'zod';
import { objectError } from '../measure/messages';
import { UNITS } from '../measure/units';
import { wrong } from '../shop/fields';
import { STAGES } from './stages';

const text = (what: string, most: number) => z.string({ error: wrong(what, 'Give it as text.') }).trim().max(most, { error: `The ${what} is too long. Use ${most} characters or fewer.` });

/** Who it is for: the owner's alone. */
export const contactSchema = z.strictObject({
  customer: text('customer', 120).default(''),
  person: text('person', 120).default(''),
  email: text('e-mail address', 254).refine((value) => value === '' || z.email().safeParse(value).success, { error: 'That is no e-mail address. Write it like name@example.com, or leave it open.' }).default(''),
  phone: text('phone number', 40).default(''),
}, { error: objectError('the contact as customer, person, email and phone') });
export type Contact = z.output<typeof contactSchema>;
export const NO_CONTACT: Contact = { customer: '', person: '', email: '', phone: '' };

const due = z.union([z.literal('').transform(() => null), z.iso.date({ error: 'The due date cannot be read. Write it as 2026-12-18.' }), z.null()]);

const fields = {
  name: text('name', 120).min(1, { error: 'The name is missing. Say what the piece is, such as "42 coins for the day room".' }),
  contact: contactSchema,
  occasion: text('occasion', 200),
  wall: text('wall space', 200),
  due,
  units: z.enum(UNITS, { error: `Use ${UNITS.join(' or ')} for the units.` }),
  wishes: text('wishes', 2000),
};

/** A new commission. */
export const commissionSchema = z.strictObject({
  ...fields, contact: fields.contact.default(NO_CONTACT), occasion: fields.occasion.default(''), wall: fields.wall.default(''), due: fields.due.default(null), wishes: fields.wishes.default(''),
}, { error: objectError('name, contact, occasion, wall, due, units and wishes') });
export type NewCommission = z.output<typeof commissionSchema>;

/** What changes of a commission without touching its piece; its units are the piece's and stay. */
export const commissionPatchSchema = z.strictObject({
  name: fields.name.optional(), contact: fields.contact.optional(), occasion: fields.occasion.optional(), wall: fields.wall.optional(), due: fields.due.optional(), wishes: fields.wishes.optional(),
  stage: z.enum(STAGES, { error: `Use one of ${STAGES.join(', ')}.` }).optional(),
}, { error: objectError('what changes: name, contact, occasion, wall, due, wishes or stage') });
export type CommissionPatch = z.output<typeof commissionPatchSchema>;

/** Steps whose making nobody sees but who did it: taken as made by a press. */
export const MADE_BY_HAND = ['cutList', 'assembly'] as const;
export const madeSchema = z.strictObject({ step: z.enum(MADE_BY_HAND, { error: `Use ${MADE_BY_HAND.join(' or ')}.` }) }, { error: objectError('the step') });

/** A bench step ticked off, or the tick taken back. */
export const tickSchema = z.strictObject({
  step: z.string({ error: 'Name the step.' }).min(1, { error: 'Name the step.' }).max(80, { error: 'No step has so long a name.' }),
  done: z.boolean({ error: 'Give done as true or false.' }),
}, { error: objectError('step and done') });
