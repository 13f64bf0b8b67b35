import { callerOf } from '#server/access/person';
import { createRail } from '#server/services/rails';
import { readBodyAs } from '#server/utils/readBodyAs';
import { railSchema } from '#shared/shop/rail';

/** Keeps a new rail, in its first revision. */
export default defineEventHandler(async (event) => ({ id: await createRail(callerOf(event), await readBodyAs(event, railSchema)), revision: 1 }));
