import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createWorld, type World } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { OpenApi } from './openapi.js';

describe('operations', () => {
  let server: TestApp;
  let world: World;
  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
  });
  afterAll(() => server?.close());

  it('is healthy and ready', async () => {
    expect((await world.nobody().get('/api/health')).body).toEqual({ status: 'ok' });
    const ready = await world.nobody().get('/api/ready');
    expect([ready.status, ready.body.status]).toEqual([200, 'ready']);
  });

  it('describes every contract it serves, and every reference in the description leads somewhere', async () => {
    const document = (await world.nobody().get('/api/openapi.json')).body;
    expect(document.openapi).toBe('3.1.0');
    const operations = Object.values<object>(document.paths).flatMap((path) =>
      Object.values<{ operationId: string }>(path as never),
    );
    expect(operations).toHaveLength(server.get(OpenApi).routes().length);
    expect(new Set(operations.map(({ operationId }) => operationId)).size).toBe(operations.length);
    const references = JSON.stringify(document).match(/"\$ref":"#\/components[^"]+"/g) ?? [];
    expect(references.length).toBeGreaterThan(0);
    for (const reference of references) expect(reference).toBe('"$ref":"#/components/schemas/Error"');
    expect(document.paths['/api/auth/sign-in'].post.security).toBeUndefined();
  });

  it('has a page of it that runs no script', async () => {
    const page = await world.nobody().get('/api/docs');
    expect(page.text).toContain('/api/auth/sign-in');
    expect(page.text).not.toContain('<script');
  });

  it('shows deliveries and the ledger to the operator alone', async () => {
    for (const path of ['/api/operations/deliveries', '/api/operations/ledger']) {
      expect((await world.as('operator').get(path)).status).toBe(200);
      for (const person of ['builderOwner', 'desk', 'superintendent'] as const)
        expect((await world.as(person).get(path)).status).toBe(404);
      expect((await world.nobody().get(path)).status).toBe(401);
    }
  });
});
