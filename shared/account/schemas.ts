import { z } from 'zod';
import { CONTROL, objectError } from '../measure/messages';

// What people send about their accounts: one schema per request, for the form and for the server.

/** Shorter ones are guessed; NIST SP 800-63B asks for 15 where a password stands alone, 8 with a second factor: a long phrase is wanted, and no rule about signs. */
export const SHORTEST_PASSWORD = 12;
/** Far above any phrase; hashing longer ones costs us and gains nobody. */
const LONGEST_PASSWORD = 200;
const LONGEST_NAME = 80;

const line = (what: string, most = LONGEST_NAME) => z.string({ error: `Give ${what} as text.` }).trim()
  .min(1, { error: `Give ${what}.` })
  .max(most, { error: `Give ${what} in ${most} characters or fewer.` })
  .refine((text) => !CONTROL.test(text), { error: `Give ${what} on one line, without control characters.` });

/** An address in its one form: trimmed, lower case. */
const email = z.string({ error: 'Give the e-mail address as text.' }).trim().toLowerCase()
  .max(254, { error: 'The e-mail address is too long.' }) // RFC 5321, 4.5.3.1.3
  .pipe(z.email({ error: 'That is not an e-mail address. It looks like name@example.com.' }));

const password = z.string({ error: 'Give the password as text.' })
  .min(SHORTEST_PASSWORD, { error: `The password is too short. Use ${SHORTEST_PASSWORD} characters or more: a few words will do.` })
  .max(LONGEST_PASSWORD, { error: `The password is too long. Use ${LONGEST_PASSWORD} characters or fewer.` });

/** A password as typed to sign in: whether it is right is all that is asked. */
const given = z.string({ error: 'Give the password.' }).min(1, { error: 'Give the password.' }).max(LONGEST_PASSWORD, { error: 'That is not the password.' });

const secret = z.string({ error: 'The link is damaged. Open it again from the mail.' }).regex(/^[\w-]{20,100}$/, { error: 'The link is damaged. Open it again from the mail.' });

/** The drawing that a visitor had on the page, as its link writes it. */
const drawing = z.string().regex(/^1\.[\w-]{1,8190}$/, { error: 'The drawing cannot be read.' });

const object = <Shape extends z.core.$ZodLooseShape>(shape: Shape, what: string) => z.strictObject(shape, { error: objectError(what) });

export const signUpSchema = object({ shop: line("the shop's name"), name: line('your name'), email, password, drawing: drawing.optional() }, 'shop, name, email and password');
export const signInSchema = object({ email, password: given }, 'email and password');
export const forgotSchema = object({ email }, 'email');
export const secretSchema = object({ secret }, 'the secret of the link');
export const resetSchema = object({ secret, password }, 'the secret of the link and the new password');
export const joinSchema = object({ secret, name: line('your name'), password }, 'the secret of the link, your name and a password');
export const passwordSchema = object({ old: given, password }, 'the old and the new password');
export const inviteSchema = object({ name: line('their name'), email }, 'name and email');
export const personPatchSchema = object({ status: z.enum(['active', 'suspended'], { error: 'Use active or suspended.' }) }, 'status');
export const keyNameSchema = line('a name for the passkey', 40);
