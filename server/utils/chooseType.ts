import type { H3Event } from 'h3';
import Negotiator from 'negotiator';
import { problem } from './problem';

/** The media type to answer in: what `Accept` likes best of those offered, the first offered where it does not care. */
export function chooseType<Type extends string>(event: H3Event, offered: readonly Type[]): Type {
  event.node.res.setHeader('vary', 'Accept');
  const liked = new Negotiator(event.node.req).mediaType([...offered]);
  const type = offered.find((offer) => offer === liked);
  if (!type) throw problem(406, `This can be sent as ${offered.join(' or ')}.`);
  return type;
}
