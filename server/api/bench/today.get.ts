import { callerOf } from '#server/access/person';
import { benchToday } from '#server/services/bench';

/** What the bench cuts today, in the order that changes bits and woods least. */
export default defineEventHandler((event) => benchToday(callerOf(event).shopId, new Date()));
