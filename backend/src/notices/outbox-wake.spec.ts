import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { createWorld, type World } from '../testing/fixtures/world.js';
import { startTestApp, testNow, type TestApp } from '../testing/test-app.js';
import { OutboxEventModel } from './outbox-event.model.js';

describe('a server that works its own outbox', () => {
  let server: TestApp;
  let world: World;

  beforeAll(async () => {
    server = await startTestApp({ environment: { ROLE: 'all' } });
    world = await createWorld(server);
  });
  afterAll(() => server?.close());

  it('tells what a write with an idempotency key brought about, and is not held up by it', async () => {
    const write = (key: string, text: string) =>
      world
        .as('superintendent')
        .post(`/api/lots/${world.lots[0].id}/comments`, { clientId: randomUUID(), madeAt: testNow, text }, { key });
    expect((await write(randomUUID(), 'one')).status).toBe(201);
    expect((await write(randomUUID(), 'two')).status).toBe(201);
    await vi.waitFor(
      async () => {
        const events = await OutboxEventModel.findAll({ where: { kind: 'comment' } });
        expect(events.map(({ processedAt }) => processedAt !== null)).toEqual([true, true]);
      },
      { timeout: 30_000, interval: 100 },
    );
  });
});
