import { type H3Event, getRouterParam } from 'h3';
import { problem } from '../utils/problem';
import { callerOf } from './person';

/** What a route's address names, looked for in the caller's own shop; 404 where it is not there. */
export async function foundIn<Row>(event: H3Event, find: (shopId: string, id: string) => Promise<Row | null>): Promise<Row> {
  const row = await find(callerOf(event).shopId, idOf(event));
  if (row === null) throw gone();
  return row;
}

export const idOf = (event: H3Event): string => getRouterParam(event, 'id') ?? '';

/** The answer for what is not there, is put away, or is another shop's: all read alike. */
export const gone = () => problem(404, 'There is nothing here by that id.');
