import { callerOf } from '#server/access/person';
import { listCuts } from '#server/services/cuts';
import { answerList } from '#server/utils/answerList';
import { readQueryAs } from '#server/utils/readQueryAs';
import { listQuerySchema } from '#shared/shop/list';

/** The shop's cuts, the newest first. */
export default defineEventHandler((event) => answerList(event, 'cuts', readQueryAs(event, listQuerySchema), (query) => listCuts(callerOf(event).shopId, query)));
