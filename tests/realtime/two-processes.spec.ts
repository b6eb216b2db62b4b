import { randomUUID } from 'node:crypto';
import type { WorldPerson } from '@holdwater/backend/testing/fixtures/world.js';
import { io, type Socket } from 'socket.io-client';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { seedDatabase, type SeededDatabase } from '../support/seeded-database.js';
import type { ServerProcess } from '../support/server-process.js';
import { useServers } from '../support/use-servers.js';

/** No mail is looked at here: port 9 (discard, RFC 863) of loopback takes none. */
const noMail = 'smtp://127.0.0.1:9';

describe('two server processes on one PostgreSQL', () => {
  let seeded: SeededDatabase;
  let one: ServerProcess;
  let two: ServerProcess;
  const open: Socket[] = [];

  afterAll(() => seeded?.database.drop());
  const servers = useServers();
  beforeAll(async () => {
    seeded = await seedDatabase();
    [one, two] = await Promise.all([
      servers.start(seeded.environment(noMail)),
      servers.start(seeded.environment(noMail)),
    ]);
  });
  afterEach(() => {
    for (const socket of open.splice(0)) socket.disconnect();
  });

  async function watch(server: ServerProcess, person: WorldPerson, lotId: string) {
    const auth = { token: seeded.world.tokenOf(person) };
    const socket = io(server.url, { auth, transports: ['websocket'], reconnection: false, forceNew: true });
    open.push(socket);
    await new Promise<void>((resolve, reject) => {
      socket.once('connect', resolve);
      socket.once('connect_error', reject);
    });
    const answer = (await socket.emitWithAck('lot:watch', { lotId })) as { ok: boolean };
    return { socket, answer };
  }
  const threadOf = (socket: Socket, lotId: string) =>
    new Promise<void>((resolve) => {
      socket.on('changed', (change: { lotId: string; topics: string[] }) => {
        if (change.lotId === lotId && change.topics.includes('thread')) resolve();
      });
    });
  const comment = async (server: ServerProcess, person: WorldPerson, lotId: string, text: string) => {
    const body = { clientId: randomUUID(), madeAt: new Date().toISOString(), text };
    const answer = await seeded.as(person, server.url).post(`/api/lots/${lotId}/comments`, body);
    expect(answer.status).toBe(201);
  };

  it('shows on one, both ways, what was written on the other', async () => {
    const lotId = seeded.world.lots[0].id;
    const ways = [
      { from: one, to: two, text: 'Water is on' },
      { from: two, to: one, text: 'On my way' },
    ];
    for (const { from, to, text } of ways) {
      const { socket, answer } = await watch(to, 'superintendent', lotId);
      expect(answer).toEqual({ ok: true });
      const told = threadOf(socket, lotId);
      await comment(from, 'helper', lotId, text);
      await told;
      const thread = await seeded.as('superintendent', to.url).get(`/api/lots/${lotId}/comments`);
      expect(thread.body.items[0]).toMatchObject({ text, authorName: 'Jory Tamsin' });
    }
  });

  it('lets an outsider of the lot hear and read nothing', async () => {
    const lotId = seeded.world.lots[1].id;
    const { socket: outsider, answer } = await watch(two, 'otherSuperintendent', lotId);
    expect(answer).toEqual({ ok: false });
    const heard: string[] = [];
    outsider.onAny((event: string) => heard.push(event));
    const { socket: insider } = await watch(two, 'inspector', lotId);
    const told = threadOf(insider, lotId);
    await comment(one, 'helper', lotId, 'Not for everyone');
    await told;
    // one socket keeps its order: whatever was sent before this answer has arrived by now
    await outsider.emitWithAck('lot:unwatch', { lotId });
    expect(heard).toEqual([]);
    const read = await seeded.as('otherSuperintendent', two.url).get(`/api/lots/${lotId}/comments`);
    expect(read.status).toBe(404);
  });
});
