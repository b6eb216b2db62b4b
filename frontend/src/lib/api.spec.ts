import { readMe, signOut, updateMe } from '@holdwater/shared-types/accounts/auth.contract.js';
import { readLot } from '@holdwater/shared-types/lots/lot.contract.js';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { getAccessToken, setAccessToken } from './access-token';
import { call, pathOf } from './api';
import { onSessionLost } from './session-refresh';
import { personOf, sessionOf } from './testing/people';
import { noAnswer, refusal, stubApi } from './testing/stub-api';

const me = personOf();

afterEach(() => setAccessToken(null));

// A server that knows one token, hands out the next, and counts how often it is asked to.
function tokenServer(knows: string, hands: string) {
  return stubApi({
    'GET /api/me': ({ headers }) =>
      headers['Authorization'] === `Bearer ${knows}` ? { data: me } : refusal('signed-out'),
    'PATCH /api/me': ({ headers }) =>
      headers['Authorization'] === `Bearer ${knows}` ? { data: me } : refusal('signed-out'),
    'POST /api/auth/refresh': async () => {
      await Promise.resolve();
      return { data: sessionOf(me, hands) };
    },
  });
}

describe('the access token', () => {
  it('is renewed once for many calls that find it run out, and each is sent again', async () => {
    setAccessToken('old');
    const sent = tokenServer('new', 'new');
    const answers = await Promise.all([call(readMe), call(readMe), call(readMe)]);
    expect(answers.map((one) => one.name)).toEqual([me.name, me.name, me.name]);
    expect(sent.filter(({ path }) => path === '/api/auth/refresh')).toHaveLength(1);
    expect(sent.filter(({ path }) => path === '/api/me')).toHaveLength(6);
    expect(getAccessToken()).toBe('new');
  });

  it('is not renewed again when another call has renewed it meanwhile', async () => {
    setAccessToken('old');
    const sent = stubApi({
      'GET /api/me': ({ headers }) => {
        if (headers['Authorization'] === 'Bearer new') return { data: me };
        setAccessToken('new');
        return refusal('signed-out');
      },
    });
    await expect(call(readMe)).resolves.toMatchObject({ id: me.id });
    expect(sent.map(({ path }) => path)).toEqual(['/api/me', '/api/me']);
  });

  it('is asked for once only: a renewed token that is refused as well is the end', async () => {
    setAccessToken('old');
    const sent = tokenServer('none', 'new');
    await expect(call(readMe)).rejects.toMatchObject({ code: 'signed-out' });
    expect(sent.map(({ path }) => path)).toEqual(['/api/me', '/api/auth/refresh', '/api/me']);
  });

  it('ends the session when the refresh is refused, and not when it has no answer', async () => {
    const lost = vi.fn();
    const stop = onSessionLost(lost);
    setAccessToken('old');
    stubApi({ 'GET /api/me': () => refusal('signed-out'), 'POST /api/auth/refresh': () => noAnswer('ERR_NETWORK') });
    await expect(call(readMe)).rejects.toMatchObject({ code: 'offline' });
    expect(lost).not.toHaveBeenCalled();
    expect(getAccessToken()).toBe('old');
    stubApi({ 'GET /api/me': () => refusal('signed-out'), 'POST /api/auth/refresh': () => refusal('session-reused') });
    await expect(call(readMe)).rejects.toMatchObject({ code: 'session-reused' });
    expect(lost).toHaveBeenCalledTimes(1);
    expect(getAccessToken()).toBeNull();
    stop();
  });

  it('is not asked for by somebody who has none', async () => {
    const sent = stubApi({ 'GET /api/me': () => refusal('signed-out') });
    await expect(call(readMe)).rejects.toMatchObject({ code: 'signed-out', status: 401 });
    expect(sent).toHaveLength(1);
  });
});

describe('a write', () => {
  it('carries the clock of this device and an idempotency key, the same when it is sent again', async () => {
    setAccessToken('old');
    const sent = tokenServer('new', 'new');
    await call(updateMe, { body: { units: 'metric' } }, { idempotencyKey: 'key-of-this-intent' });
    const writes = sent.filter(({ method }) => method === 'PATCH');
    expect(writes.map(({ headers }) => headers['Idempotency-Key'])).toEqual([
      'key-of-this-intent',
      'key-of-this-intent',
    ]);
    for (const { headers } of writes) expect(Date.parse(headers['X-Sent-At'] ?? '')).not.toBeNaN();
  });

  it('gets a key of its own without one; a read carries neither', async () => {
    const sent = stubApi({
      'POST /api/auth/sign-out': () => ({ data: { done: true } }),
      'GET /api/me': () => ({ data: me }),
    });
    await call(signOut);
    await call(signOut);
    await call(readMe);
    const keys = sent.map(({ headers }) => headers['Idempotency-Key']);
    // RFC 9562: version 4 in the third group.
    expect(keys[0]).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-4[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
    expect(keys[1]).not.toBe(keys[0]);
    expect(keys[2]).toBeUndefined();
    expect(sent[2]?.headers['X-Sent-At']).toBeUndefined();
  });
});

describe('what fails', () => {
  it('keeps code, params, fields and entry of a refusal', async () => {
    stubApi({
      'PATCH /api/me': () =>
        refusal('bad-input', { params: { most: 3 }, fields: { name: 'required' }, entry: '7f3-20c' }),
    });
    await expect(call(updateMe, { body: { name: '' } })).rejects.toMatchObject({
      code: 'bad-input',
      status: 400,
      params: { most: 3 },
      fields: { name: 'required' },
      entry: '7f3-20c',
      isUndecided: false,
    });
  });

  it.each([
    ['ERR_NETWORK', 'offline'],
    ['ECONNABORTED', 'slow'],
  ] as const)('%s is %s, and it is not known whether the work was done', async (fault, code) => {
    stubApi({ 'GET /api/me': () => noAnswer(fault) });
    await expect(call(readMe)).rejects.toMatchObject({ code, status: 0, isUndecided: true });
  });

  it('is busy for a proxy without a server, and unknown for an answer that is not ours', async () => {
    stubApi({ 'GET /api/me': () => ({ status: 502, data: '<html>' }) });
    await expect(call(readMe)).rejects.toMatchObject({ code: 'busy', isUndecided: true });
    stubApi({ 'GET /api/me': () => ({ status: 418, data: { code: 'teapot' } }) });
    await expect(call(readMe)).rejects.toMatchObject({ code: 'unknown' });
  });

  it('is told at once when an answer does not fit its contract', async () => {
    stubApi({ 'GET /api/me': () => ({ data: { ...me, units: 'furlongs' } }) });
    await expect(call(readMe)).rejects.toThrow(/units/);
  });
});

describe('a path', () => {
  it('takes its parameters, escaped, and misses none silently', () => {
    expect(pathOf(readLot.path, { lotId: 'a/b' })).toBe('/api/lots/a%2Fb');
    expect(() => pathOf(readLot.path, {})).toThrow('lotId');
  });
});
