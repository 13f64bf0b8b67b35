import type { H3Event } from 'h3';
import { personIn } from '../services/people';
import { problem } from '../utils/problem';
import { callerOf } from './person';

/** The person that a route is about: of the caller's shop, and not the caller, who cannot shut themselves out. */
export async function otherPersonOf(event: H3Event) {
  const by = callerOf(event);
  const person = await personIn(by.shopId, getRouterParam(event, 'id') ?? '');
  if (!person) throw problem(404, 'There is nobody here by that id.');
  if (person.id === by.id) throw problem(409, 'That is you. Make somebody else the owner first.');
  return { by, person };
}
