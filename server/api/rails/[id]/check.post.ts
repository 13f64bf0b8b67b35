import { preparedRailOf } from '#server/access/prepared';
import { bitAdvice } from '#shared/shop/bit';

/** Whether a rail can be cut on a machine with a bit, before any program is made; 422 says what stands against it. */
export default defineEventHandler(async (event) => {
  const { records, request } = await preparedRailOf(event);
  return { spec: request.spec, notes: request.notes, advice: bitAdvice(records.bit, request.spec) };
});
