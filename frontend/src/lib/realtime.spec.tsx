import { QueryClientProvider } from '@tanstack/react-query';
import { renderHook, waitFor } from '@testing-library/react';
import type { ReactNode } from 'react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { setAccessToken } from './access-token';
import { createQueryClient } from './query-client';
import { startRealtime, useLotLive } from './realtime';
import { personOf, sessionOf } from './testing/people';
import { stubApi } from './testing/stub-api';

type Listener = (data?: unknown) => void;

/** A line to a server that only keeps what was said, in place of a real socket. */
class Line {
  connected = false;
  active = false;
  readonly said: [string, unknown][] = [];
  private readonly listeners = new Map<string, Listener[]>();

  on(event: string, listener: Listener): void {
    this.listeners.set(event, [...(this.listeners.get(event) ?? []), listener]);
  }

  hear(event: string, data?: unknown): void {
    if (event === 'connect') this.connected = true;
    if (event === 'disconnect') this.connected = false;
    this.listeners.get(event)?.forEach((listener) => listener(data));
  }

  emit(event: string, data: unknown, answered?: () => void): void {
    this.said.push([event, data]);
    answered?.();
  }

  connect(): void {
    this.active = true;
  }

  disconnect(): void {
    this.active = false;
    this.connected = false;
  }
}

const made = vi.hoisted((): { line: unknown } => ({ line: null }));
vi.mock('socket.io-client', () => ({ io: () => made.line }));

let line = new Line();
beforeEach(() => {
  line = new Line();
  made.line = line;
  setAccessToken('token');
});

function setUp() {
  const queryClient = createQueryClient();
  const invalidate = vi.spyOn(queryClient, 'invalidateQueries');
  const stop = startRealtime(queryClient);
  const wrapper = ({ children }: { children: ReactNode }): ReactNode => (
    <QueryClientProvider client={queryClient}>{children}</QueryClientProvider>
  );
  const look = (lotId: string) => renderHook(() => useLotLive(lotId), { wrapper });
  const stale = (): string[] => invalidate.mock.calls.map(([filter]) => JSON.stringify(filter?.queryKey));
  return { look, stale, stop, forget: () => invalidate.mockClear() };
}

describe('a lot that is looked at', () => {
  it('is watched once for all places of the page and let go with the last', () => {
    const { look, stop } = setUp();
    line.hear('connect');
    const first = look('lot-17');
    const second = look('lot-17');
    first.unmount();
    expect(line.said).toEqual([['lot:watch', { lotId: 'lot-17' }]]);
    second.unmount();
    expect(line.said.at(-1)).toEqual(['lot:unwatch', { lotId: 'lot-17' }]);
    stop();
  });

  it('has its thread read again once the server has let the page in', () => {
    const { look, stale, stop, forget } = setUp();
    line.hear('connect');
    forget();
    look('lot-17');
    expect(stale()).toEqual(['["lot","lot-17","thread"]']);
    stop();
  });

  it('is read anew by what the server says has changed', () => {
    const { look, stale, stop, forget } = setUp();
    line.hear('connect');
    look('lot-17');
    forget();
    line.hear('changed', { lotId: 'lot-17', topics: ['thread'] });
    expect(stale()).toEqual(['["lot","lot-17","thread"]', '["lot","lot-17","ledger"]']);
    forget();
    line.hear('changed', { lotId: 'lot-17', topics: ['a-topic-of-a-newer-server'] });
    expect(stale()).toEqual(['["lot","lot-17"]']);
    stop();
  });

  it('is watched again and wholly read anew after the line was down', async () => {
    const { look, stale, stop, forget } = setUp();
    line.hear('connect');
    look('lot-17');
    line.hear('disconnect', 'transport close');
    forget();
    line.hear('connect');
    expect(line.said.filter(([event]) => event === 'lot:watch')).toHaveLength(2);
    await waitFor(() => expect(stale()).toContain('["lot","lot-17"]'));
    expect(stale()).toContain('["notices"]');
    stop();
  });
});

it('tells the person of what waits and of notices', () => {
  const { stale, stop, forget } = setUp();
  line.hear('connect');
  forget();
  line.hear('notices');
  expect(stale()).toEqual(['["notices"]']);
  line.hear('waiting');
  expect(stale()).toContain('["waiting"]');
  stop();
});

it('hangs up when nobody is signed in any more, and is up again with the next person', () => {
  const { stop } = setUp();
  expect(line.active).toBe(true);
  setAccessToken(null);
  expect(line.active).toBe(false);
  setAccessToken('another');
  expect(line.active).toBe(true);
  stop();
  expect(line.active).toBe(false);
});

describe('a line that is refused', () => {
  afterEach(() => vi.useRealTimers());

  it('is tried again with a new token when the token was refused, and with the same when the server was busy', async () => {
    vi.useFakeTimers();
    const { stop } = setUp();
    const sent = stubApi({ 'POST /api/auth/refresh': () => ({ data: sessionOf(personOf(), 'renewed') }) });
    line.active = false;
    line.hear('connect_error', new Error('busy'));
    await vi.advanceTimersByTimeAsync(2_000);
    expect(line.active).toBe(true);
    expect(sent).toEqual([]);
    line.active = false;
    line.hear('connect_error', new Error('signed-out'));
    await vi.advanceTimersByTimeAsync(3_999);
    expect(sent).toEqual([]);
    await vi.advanceTimersByTimeAsync(1);
    await vi.waitFor(() => expect(line.active).toBe(true));
    expect(sent).toHaveLength(1);
    stop();
  });
});
