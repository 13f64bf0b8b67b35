import { callerOf } from '#server/access/person';
import { createCommission } from '#server/services/commissions';
import { readBodyAs } from '#server/utils/readBodyAs';
import { today } from '#server/utils/today';
import { commissionSchema } from '#shared/commission/commission';

/** Takes in a new commission. */
export default defineEventHandler(async (event) => ({ id: await createCommission(callerOf(event), await readBodyAs(event, commissionSchema), today()) }));
