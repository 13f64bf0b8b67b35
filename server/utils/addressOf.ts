import { isIPv6 } from 'node:net';
import type { IncomingMessage } from 'node:http';

/**
 * Who is asking, as far as a limit is concerned: an IPv4 address, or the first 64 bits of an IPv6 one, since one
 * customer's line has them all (RFC 6177). A forwarded address counts only from a proxy we were told to trust, and of
 * its list only the last, the one that proxy saw.
 */
export function addressOf(request: Pick<IncomingMessage, 'headers' | 'socket'>, trustProxy: boolean): string {
  const forwarded = [request.headers['x-forwarded-for'] ?? []].flat().join(',').split(',').at(-1)?.trim();
  const address = (trustProxy && forwarded) || (request.socket.remoteAddress ?? 'unknown');
  const plain = address.replace(/^::ffff:(?=\d+\.)/i, '');
  return isIPv6(plain) ? firstHalf(plain) : plain;
}

function firstHalf(address: string): string {
  const [head = '', tail] = address.split('::');
  const groups = (part: string) => (part ? part.split(':') : []);
  const left = groups(head);
  const gap = tail === undefined ? 0 : 8 - left.length - groups(tail).length;
  const all = [...left, ...Array.from({ length: gap }, () => '0'), ...groups(tail ?? '')];
  return all.slice(0, 4).map((group) => parseInt(group, 16).toString(16)).join(':');
}
