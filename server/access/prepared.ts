import type { H3Event } from 'h3';
import { prepareRail } from '#shared/shop/forMachine';
import { cutWithSchema } from '#shared/shop/rail';
import { recordsFor } from '../services/railPrograms';
import { findRail } from '../services/rails';
import { problem } from '../utils/problem';
import { readBodyAs } from '../utils/readBodyAs';
import { foundIn } from './found';
import { callerOf } from './person';

/** The rail that a route names, on the machine, bit and holding that its body names: 422 with whatever stands against it. */
export async function preparedRailOf(event: H3Event) {
  const rail = await foundIn(event, findRail);
  const chosen = await readBodyAs(event, cutWithSchema);
  const records = await recordsFor(callerOf(event).shopId, chosen);
  if ('missing' in records) throw problem(422, 'One thing needs changing.', { errors: [{ path: records.missing, message: 'The shop has none by that id. Choose one from the list.' }] });
  const prepared = prepareRail(rail.request, records);
  if (!prepared.ok) {
    const errors = prepared.problems.map(({ field, message }) => ({ path: field, message }));
    throw problem(422, 'This rail cannot be cut so.', { errors });
  }
  return { rail, chosen, records, request: prepared.request };
}
