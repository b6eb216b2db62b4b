import net from 'node:net';
import { afterEach, describe, expect, it } from 'vitest';
import { getChosenPort, getFreePort, getRandomPort } from '../../backend/scripts/lib/ports.mjs';

const servers: net.Server[] = [];

function occupy(port: number, host: string): Promise<void> {
  return new Promise((resolve, reject) => {
    const server = net.createServer().once('error', reject);
    servers.push(server);
    server.listen({ host, port }, () => resolve());
  });
}

afterEach(async () => {
  await Promise.all(servers.splice(0).map((server) => new Promise((resolve) => server.close(resolve))));
});

describe('getChosenPort', () => {
  it('takes the fallback when nothing is chosen', () => {
    expect(getChosenPort(undefined, 4310)).toBe(4310);
    expect(getChosenPort('', 4310)).toBe(4310);
  });

  // RFC 6335 section 6: ports are 16-bit numbers; 0 is reserved.
  it.each(['1', '65535'])('takes %s', (text) => expect(getChosenPort(text, 4310)).toBe(Number(text)));
  it.each(['0', '65536', '-1', '43.1', '1e3', ' 80', 'web'])('refuses %s and says what to do', (text) => {
    expect(() => getChosenPort(text, 4310)).toThrow(/PORT is .* Give a whole number from 1 to 65535/);
  });
});

describe('getFreePort', () => {
  // listen(2): EADDRINUSE when another socket listens on the port, on the same or on the wildcard address.
  it.each(['127.0.0.1', '0.0.0.0'])('passes over a port in use on %s', async (host) => {
    const port = await getRandomPort();
    await occupy(port, host);
    expect(await getFreePort(port)).toBeGreaterThan(port);
  });

  it('passes over ports that are promised to something else', async () => {
    const port = await getRandomPort();
    expect(await getFreePort(port, [port])).toBeGreaterThan(port);
  });

  it('leaves the port free again', async () => {
    const port = await getFreePort(await getRandomPort());
    await expect(occupy(port, '127.0.0.1')).resolves.toBeUndefined();
  });
});
