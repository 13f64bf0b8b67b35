import { callerOf } from '#server/access/person';
import { listRails } from '#server/services/rails';
import { answerList } from '#server/utils/answerList';
import { readQueryAs } from '#server/utils/readQueryAs';
import { listQuerySchema } from '#shared/shop/list';

/** The shop's rails, a page at a time or as CSV. */
export default defineEventHandler((event) => answerList(event, 'rails', readQueryAs(event, listQuerySchema), (query) => listRails(callerOf(event).shopId, query)));
