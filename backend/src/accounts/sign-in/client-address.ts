import { isIPv6 } from 'node:net';
import type { Request } from 'express';

/**
 * Where a request comes from, as the throttle counts it: the IPv4 address, or the first 64 bits of an IPv6 address, since whoever has one
 * has all of its network.
 */
export function clientAddressOf(request: Pick<Request, 'ip'>): string {
  return countedAddress(request.ip ?? '');
}

export function countedAddress(address: string): string {
  const mapped = /^::ffff:(\d+\.\d+\.\d+\.\d+)$/i.exec(address)?.[1];
  if (mapped !== undefined || !isIPv6(address)) return mapped ?? address;
  const [head = '', tail] = (address.split('%')[0] ?? '').split('::');
  const before = head.split(':').filter(Boolean);
  const after = (tail ?? '').split(':').filter(Boolean);
  const zeros = Array<string>(Math.max(0, 8 - before.length - after.length)).fill('0');
  const groups = [...before, ...zeros, ...after].slice(0, 4);
  return `${groups.map((group) => Number.parseInt(group, 16).toString(16)).join(':')}::/64`;
}
