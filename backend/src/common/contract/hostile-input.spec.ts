import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createWorld, type World } from '../../testing/fixtures/world.js';
import { startTestApp, testNow, type TestApp } from '../../testing/test-app.js';

// What is refused and how is the project's own error contract; that such input must never end in a 500: OWASP ASVS 5.0 16.5.1, 2.2.2.

let server: TestApp;
let world: World;
let lotPath: string;

beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
  lotPath = `/api/lots/${world.lots[0].id}`;
});
afterAll(() => server?.close());

const comment = (text: string, madeAt = testNow) => ({ clientId: randomUUID(), madeAt, text });
const cursorOf = (keys: unknown) => Buffer.from(JSON.stringify(keys)).toString('base64url');
const withPlat = (lotNumber: string) => ({
  builderId: world.organizations.builder.id,
  name: randomUUID(),
  plat: {
    widthFt: 1,
    heightFt: 1,
    northDegrees: 0,
    roads: [],
    parcels: [{ lotNumber, points: [[0, 0], [1, 0], [1, 1]] }], // prettier-ignore
  },
});

describe('words the database does not keep', () => {
  // PostgreSQL 8.3 and 8.14.1: neither text nor jsonb holds U+0000; RFC 3629 3: UTF-8 has no surrogates
  it.each(['a\u0000b', 'a\ud800b'])('are bad input (%j)', async (text) => {
    const caller = world.as('superintendent');
    const posted = await caller.post(`${lotPath}/comments`, comment(text));
    // a lone surrogate may be replaced on the way (it is no UTF-8), never be a fault of ours
    expect([201, 400]).toContain(posted.status);
    if (text.includes('\u0000')) expect(posted.body).toMatchObject({ code: 'bad-input' });
    expect((await caller.post('/api/tracts', withPlat(text))).body).toMatchObject({ code: 'bad-input' });
    expect((await caller.get(`/api/search?q=a%00b`)).status).toBeLessThan(500);
  });
});

describe('days and numbers outside of what a column holds', () => {
  it('are bad input', async () => {
    const caller = world.as('superintendent');
    const answers = [
      await caller.patch(lotPath, { coverDate: '0000-01-01' }),
      await caller.get('/api/calendar?from=0000-01-01&to=0000-01-31'),
      await caller.post(`${lotPath}/comments`, comment('x', '0000-01-01T00:00:00Z')),
    ];
    for (const answer of answers) expect(answer.body).toMatchObject({ code: 'bad-input' });
  });

  it('leave a clock that cannot be out of account', async () => {
    const headers = { 'X-Sent-At': '+275760-09-13T00:00:00Z' };
    const answer = await world.as('superintendent').post(`${lotPath}/comments`, comment('x'), { headers });
    expect(answer.body).toMatchObject({ at: new Date(testNow).toISOString() });
  });
});

describe('a cursor that is not ours', () => {
  const forged = [['x', 'y'], [1e300, 2], ['2027-03-02T16:30:00Z', 'no'], ['x'], ['1e30'], [-1.5], {}];

  it.each(forged.map((keys) => ({ keys })))('is bad input, or finds nothing ($keys)', async ({ keys }) => {
    const cursor = cursorOf(keys);
    const lists = [`${lotPath}/comments`, `${lotPath}/ledger`, '/api/notices', '/api/lots', '/api/corrections'];
    for (const path of lists) {
      const answer = await world.as('superintendent').get(`${path}?cursor=${cursor}`);
      expect(answer.body, path).toMatchObject({ code: 'bad-input', fields: { cursor: 'not-a-cursor' } });
    }
    expect((await world.as('superintendent').get(`/api/organizations?cursor=${cursor}`)).status).toBeLessThan(500);
    const deliveries = await world.as('operator').get(`/api/operations/deliveries?cursor=${cursor}`);
    expect(deliveries.body).toMatchObject({ code: 'bad-input' });
  });
});

describe('the faults of an input', () => {
  const codes = /^[a-z]+(-[a-z]+)*$/;

  it('are told as codes, never in the words of a library', async () => {
    const caller = world.as('superintendent');
    const answers = [
      await caller.patch(lotPath, { latitude: 'x', longitude: 999, coverDate: 'soon', permit: { status: 'lost' } }),
      await caller.post(`${lotPath}/comments`, { clientId: 'x', text: 4, on: { kind: 'z' }, more: 1 }),
      await caller.get('/api/lots?limit=9999&state=zz&tractId=1'),
      await caller.post('/api/auth/sign-in', { email: 'nobody' }),
    ];
    for (const { body } of answers) {
      const { code, fields } = body as { code: string; fields: Record<string, string> };
      expect(code).toBe('bad-input');
      for (const why of Object.values(fields)) expect(why).toMatch(codes);
    }
    expect(answers[0]?.body).toMatchObject({
      fields: { latitude: 'must-be-a-number', longitude: 'out-of-range', coverDate: 'must-be-an-instant' },
    });
    expect(answers[3]?.body).toMatchObject({ fields: { email: 'not-an-email', password: 'required' } });
  });

  it('refuse a key that is none, rather than do the act without it', async () => {
    const answer = await world.as('superintendent').post(`${lotPath}/comments`, comment('x'), { key: 'short' });
    expect(answer.body).toMatchObject({ code: 'bad-input', fields: { 'Idempotency-Key': 'not-a-code' } });
  });
});

describe('a body that cannot be read', () => {
  const send = async (body: string, headers: Record<string, string> = {}) => {
    const path = `${server.url}/api/auth/sign-in`;
    const answer = await fetch(path, {
      method: 'POST',
      body,
      headers: { 'content-type': 'application/json', ...headers },
    });
    return { status: answer.status, body: (await answer.json()) as { code: string; entry: string } };
  };
  const signIn = '{"email":"a@example.test","password":"x"}';
  const deep = '['.repeat(200_000) + ']'.repeat(200_000);

  it.each<[string, string, Record<string, string>]>([
    ['half an object', '{"a":', {}],
    ['no object', '"x"', {}],
    ['another type', signIn, { 'content-type': 'text/plain' }],
    ['a form', 'email=a%40example.test&password=x', { 'content-type': 'application/x-www-form-urlencoded' }],
    ['an unknown charset', signIn, { 'content-type': 'application/json; charset=klingon' }],
    ['an unknown encoding', signIn, { 'content-encoding': 'zip' }],
    ['no gzip', signIn, { 'content-encoding': 'gzip' }],
    ['deep nesting', deep, {}],
    ['deep nesting with a key', deep, { 'idempotency-key': randomUUID() }],
  ])('is bad input in the one shape: %s', async (_name, body, headers) => {
    const answer = await send(body, headers);
    expect(answer).toMatchObject({ status: 400, body: { code: 'bad-input' } });
    expect(answer.body.entry).toMatch(/^[0-9a-f]{8}$/);
  });

  it('is too large past three megabytes', async () => {
    expect(await send(JSON.stringify({ email: 'x'.repeat(4_000_000) }))).toMatchObject({ status: 413 });
  });
});

describe('answers of the API', () => {
  it.each(['/api/me', '/api/health', '/api/no-such-thing', '/api/lots/%E0%A4%A'])(
    'are kept by no cache: %s',
    async (path) => {
      const answer = await fetch(`${server.url}${path}`);
      expect(answer.status).toBeLessThan(500);
      expect(answer.headers.get('cache-control')).toBe('no-store');
      expect(answer.headers.get('x-content-type-options')).toBe('nosniff');
    },
  );
});
