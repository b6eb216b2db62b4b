import type { QueryClient, QueryKey } from '@tanstack/react-query';
import { useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { io, type Socket } from 'socket.io-client';
import { getAccessToken, onAccessToken } from './access-token';
import { personTopics, staleForPerson, staleOnLot } from './live-topics';
import { queryKeys } from './query-keys';
import { refreshAccess } from './session-refresh';

interface Changed {
  readonly lotId: string;
  readonly topics: readonly string[];
}

/** How many places of the page watch each lot: the server hears of the first and of the last only. */
const watchers = new Map<string, number>();
let socket: Socket | null = null;

/** First wait before another try to connect, ms; doubled each time up to the longest. */
const firstWaitMs = 2_000;
const longestWaitMs = 60_000;

/** Connects while somebody is signed in; ends with the returned function. */
export function startRealtime(queryClient: QueryClient): () => void {
  const connection = io({
    autoConnect: false,
    auth: (give) => give({ token: getAccessToken() }),
    transports: ['websocket', 'polling'],
  });
  socket = connection;
  let hasBeenConnected = false;
  connection.on('connect', () => {
    watchers.forEach((_, lotId) => askToWatch(connection, queryClient, lotId));
    // What changed while the line was down was told to nobody.
    if (hasBeenConnected) invalidateAll(queryClient, everythingLive());
    hasBeenConnected = true;
  });
  connection.on('changed', ({ lotId, topics }: Changed) => invalidateAll(queryClient, staleOnLot(lotId, topics)));
  personTopics.forEach((topic) => connection.on(topic, () => invalidateAll(queryClient, staleForPerson(topic))));
  const stopTrying = tryAgainWhenRefused(connection);
  const stopListening = onAccessToken((token) => (token === null ? connection.disconnect() : connectOnce(connection)));
  if (getAccessToken() !== null) connection.connect();
  return () => {
    stopListening();
    stopTrying();
    connection.disconnect();
    if (socket === connection) socket = null;
  };
}

function connectOnce(connection: Socket): void {
  if (!connection.active) connection.connect();
}

/** Watches, and once the server has let the page in reads the thread again: what was written in between was told to nobody. */
function askToWatch(connection: Socket, queryClient: QueryClient, lotId: string): void {
  connection.emit('lot:watch', { lotId }, () => invalidateAll(queryClient, [queryKeys.lotPart(lotId, 'thread')]));
}

/**
 * A server that refuses, or ends the connection itself, leaves the next try to us: with a new token where it is the token's fault, always
 * after a wait. A session that is over ends by the refused refresh.
 */
function tryAgainWhenRefused(connection: Socket): () => void {
  let waitMs = firstWaitMs;
  let timer: number | undefined;
  const later = (act: () => void): void => {
    window.clearTimeout(timer);
    timer = window.setTimeout(() => (getAccessToken() === null ? undefined : act()), waitMs);
    waitMs = Math.min(waitMs * 2, longestWaitMs);
  };
  const renew = (): void => {
    refreshAccess().then(
      () => connectOnce(connection),
      () => later(renew),
    );
  };
  connection.on('connect', () => {
    waitMs = firstWaitMs;
  });
  connection.on('connect_error', (error: Error) => {
    if (!connection.active) later(error.message === 'signed-out' ? renew : () => connectOnce(connection));
  });
  connection.on('disconnect', (reason) => {
    if (reason === 'io server disconnect') later(renew);
  });
  return () => window.clearTimeout(timer);
}

function everythingLive(): QueryKey[] {
  return [...[...watchers.keys()].map((lotId) => queryKeys.lot(lotId)), ...personTopics.flatMap(staleForPerson)];
}

function invalidateAll(queryClient: QueryClient, keys: readonly QueryKey[]): void {
  keys.forEach((queryKey) => void queryClient.invalidateQueries({ queryKey }));
}

/** Tells the server that this page looks at a lot; the returned function takes it back. */
export function watchLot(queryClient: QueryClient, lotId: string): () => void {
  const before = watchers.get(lotId) ?? 0;
  watchers.set(lotId, before + 1);
  if (before === 0 && socket?.connected) askToWatch(socket, queryClient, lotId);
  return () => {
    const left = (watchers.get(lotId) ?? 1) - 1;
    if (left > 0) {
      watchers.set(lotId, left);
      return;
    }
    watchers.delete(lotId);
    if (socket?.connected) socket.emit('lot:unwatch', { lotId });
  };
}

/** Keeps everything shown of a lot fresh while the component is on the page. */
export function useLotLive(lotId: string | undefined): void {
  const queryClient = useQueryClient();
  useEffect(() => (lotId === undefined ? undefined : watchLot(queryClient, lotId)), [lotId, queryClient]);
}
