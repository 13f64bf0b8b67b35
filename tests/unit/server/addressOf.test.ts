import { describe, expect, it } from 'vitest';
import { addressOf } from '#server/utils/addressOf';

/** A request from an address, as far as `addressOf` looks at it. */
const from = (remoteAddress: string, forwarded?: string | string[]) =>
  ({ headers: { 'x-forwarded-for': forwarded }, socket: { remoteAddress } }) as unknown as Parameters<typeof addressOf>[0];

describe('addressOf', () => {
  it.each([
    ['203.0.113.7', '203.0.113.7'],
    ['::ffff:203.0.113.7', '203.0.113.7'],
    ['2001:db8:1:2:3:4:5:6', '2001:db8:1:2'],
    ['2001:db8:1:2::1', '2001:db8:1:2'],
    ['2001:0DB8:0001:0002::9', '2001:db8:1:2'],
    ['2001:db8::1', '2001:db8:0:0'],
    ['::1', '0:0:0:0'],
  ])('counts %s as %s', (address, key) => {
    expect(addressOf(from(address), false)).toBe(key);
  });

  it('believes a forwarded address only from a proxy it was told to trust, and the last of them only', () => {
    expect(addressOf(from('10.0.0.1', '203.0.113.7'), false)).toBe('10.0.0.1');
    expect(addressOf(from('10.0.0.1', '198.51.100.9, 203.0.113.7'), true)).toBe('203.0.113.7');
    expect(addressOf(from('10.0.0.1', ['198.51.100.9', '203.0.113.7']), true)).toBe('203.0.113.7');
    expect(addressOf(from('10.0.0.1'), true)).toBe('10.0.0.1');
    expect(addressOf(from('10.0.0.1', ''), true)).toBe('10.0.0.1');
  });
});
