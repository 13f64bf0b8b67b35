import { z } from 'zod';

const flag = z.enum(['0', '1']).default('0').transform((value) => value === '1');

/** What the server takes from its environment; a value it cannot read stops it at start. */
const settingsSchema = z.object({
  /** Folder of the database and the session secret. */
  TALLYRAIL_DATA: z.string().min(1).default('.data'),
  /** Programs one address may ask for in a minute: a person needs a few, a script in a shop a few dozen. */
  TALLYRAIL_PROGRAMS_PER_MINUTE: z.coerce.number().int().positive().default(120),
  /** 1: the last address of X-Forwarded-For counts, since a proxy of ours wrote it. */
  TALLYRAIL_TRUST_PROXY: flag,
  /** 1: the empty route of the benches answers. */
  TALLYRAIL_BENCH: flag,
});

export const settings = settingsSchema.parse(process.env);
