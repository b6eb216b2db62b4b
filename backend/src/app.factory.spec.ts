import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startTestApp, type TestApp } from './testing/test-app.js';
import { AccessCheck } from './common/access/access.check.js';

describe('the server', () => {
  let server: TestApp;
  beforeAll(async () => {
    server = await startTestApp();
  });
  afterAll(() => server?.close());

  it('starts, answers an unknown path of the API in the one error shape, and sets its headers', async () => {
    const answer = await fetch(`${server.url}/api/no-such-thing`);
    expect(answer.status).toBe(404);
    expect(await answer.json()).toMatchObject({ code: 'not-found' });
    expect(answer.headers.get('content-security-policy')).toContain("script-src 'self'");
    expect(answer.headers.get('content-security-policy')).not.toContain('unsafe-inline');
  });

  it('has no route that declares no access', () => {
    expect(
      server
        .get(AccessCheck)
        .routes()
        .filter((route) => route.access === null),
    ).toEqual([]);
  });
});
