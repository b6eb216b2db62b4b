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
    watchers.forEach((_, lotId) => connection.emit('lot:watch', { lotId }));
    // What changed while the line was down was told to nobody.
    if (hasBeenConnected) invalidateAll(queryClient, everythingLive());
    hasBeenConnected = true;
  });
  connection.on('changed', ({ lotId, topics }: Changed) => invalidateAll(queryClient, staleOnLot(lotId, topics)));
  personTopics.forEach((topic) => connection.on(topic, () => invalidateAll(queryClient, staleForPerson(topic))));
  renewWhenRefused(connection);
  const stopListening = onAccessToken((token) => (token === null ? connection.disconnect() : connectOnce(connection)));
  if (getAccessToken() !== null) connection.connect();
  return () => {
    stopListening();
    connection.disconnect();
    if (socket === connection) socket = null;
  };
}

function connectOnce(connection: Socket): void {
  if (!connection.active) connection.connect();
}

/** A server that refuses the token or ends the connection for good does not let socket.io try again by itself. */
function renewWhenRefused(connection: Socket): void {
  const renew = (): void => {
    if (getAccessToken() === null) return;
    refreshAccess().then(
      () => connectOnce(connection),
      // Signed out, or no signal: the first ends the session, the second is tried again with the next token.
      () => undefined,
    );
  };
  connection.on('connect_error', () => {
    if (!connection.active) renew();
  });
  connection.on('disconnect', (reason) => {
    if (reason === 'io server disconnect') renew();
  });
}

function everythingLive(): QueryKey[] {
  return [...[...watchers.keys()].map((lotId) => queryKeys.lot(lotId)), ...personTopics.flatMap(staleForPerson)];
}

function invalidateAll(queryClient: QueryClient, keys: readonly QueryKey[]): void {
  keys.forEach((queryKey) => void queryClient.invalidateQueries({ queryKey }));
}

/** Tells the server that this page looks at a lot; the returned function takes it back. */
export function watchLot(lotId: string): () => void {
  const before = watchers.get(lotId) ?? 0;
  watchers.set(lotId, before + 1);
  if (before === 0 && socket?.connected) socket.emit('lot:watch', { lotId });
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
  useEffect(() => {
    if (lotId === undefined) return undefined;
    const stop = watchLot(lotId);
    // Between the first read and the server's room there is a gap in which a change would be missed.
    const catchUp = (): void => invalidateAll(queryClient, [queryKeys.lotPart(lotId, 'thread')]);
    catchUp();
    return stop;
  }, [lotId, queryClient]);
}
