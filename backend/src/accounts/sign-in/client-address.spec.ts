import { describe, expect, it } from 'vitest';
import { countedAddress } from './client-address.js';

describe('the address the throttle counts by', () => {
  // addresses of the ranges set aside for examples: RFC 5737, RFC 3849; text forms of RFC 5952
  it.each([
    ['192.0.2.7', '192.0.2.7'],
    ['::ffff:192.0.2.7', '192.0.2.7'],
    ['2001:db8:0:1:aaaa:bbbb:cccc:dddd', '2001:db8:0:1::/64'],
    ['2001:db8:0:1::5', '2001:db8:0:1::/64'],
    ['2001:0DB8:0000:0001::5', '2001:db8:0:1::/64'],
    ['2001:db8::1', '2001:db8:0:0::/64'],
    ['::1', '0:0:0:0::/64'],
    ['fe80::1%eth0', 'fe80:0:0:0::/64'],
    ['', ''],
  ])('%s counts as %s', (address, counted) => {
    expect(countedAddress(address)).toBe(counted);
  });
});
