import { callerOf } from '#server/access/person';
import { listRailPrograms } from '#server/services/railPrograms';
import { answerList } from '#server/utils/answerList';
import { readQueryAs } from '#server/utils/readQueryAs';
import { listQuerySchema } from '#shared/shop/list';

/** The shop's programs, the newest first; `q` finds marks by their beginning. */
export default defineEventHandler((event) => answerList(event, 'programs', readQueryAs(event, listQuerySchema), (query) => listRailPrograms(callerOf(event).shopId, query)));
