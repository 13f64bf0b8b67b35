import { otherPersonOf } from '#server/access/other';
import { setStatus } from '#server/services/people';
import { readBodyAs } from '#server/utils/readBodyAs';
import { personPatchSchema } from '#shared/account/schemas';

/** Suspends a person, or lets them back in. */
export default defineEventHandler(async (event) => {
  const { by, person } = await otherPersonOf(event);
  const { status } = await readBodyAs(event, personPatchSchema);
  await setStatus(by, person, status);
  return { ...person, status };
});
