import { OnEvent } from '@nestjs/event-emitter';
import { Interval } from '@nestjs/schedule';
import {
  ConnectedSocket,
  MessageBody,
  type OnGatewayInit,
  SubscribeMessage,
  WebSocketGateway,
  WebSocketServer,
} from '@nestjs/websockets';
import type { DefaultEventsMap, Server, Socket } from 'socket.io';
import { z } from 'zod';
import { Authentication } from '../accounts/sessions/authentication.service.js';
import { type Actor, organizationIds } from '../common/access/actor.js';
import {
  ACCESS_CHANGED,
  type AccessChange,
  LOT_CHANGED,
  type LotChange,
  PERSON_TOLD,
  type PersonTold,
} from '../common/changes/changes.js';
import { LotsQueries } from '../lots/lots.queries.js';
import { canReadLot } from '../lots/lots.policy.js';

type Known = Socket<DefaultEventsMap, DefaultEventsMap, DefaultEventsMap, { actor: Actor }>;

const lotRequest = z.object({ lotId: z.uuid() });
/** How often open sockets are asked again whether they still may. */
const recheckMs = 60_000;
/** What server processes tell each other, beside what goes to sockets. */
const accessElsewhere = 'access';
const lotElsewhere = 'lot';
const lotRoom = (lotId: string) => `lot:${lotId}`;
const personRoom = (personId: string) => `person:${personId}`;
const organizationRoom = (organizationId: string) => `organization:${organizationId}`;

/**
 * Tells pages what to fetch anew; carries no data of a lot itself. A socket joins a lot's room only after the policy was asked, and leaves
 * it when the right is lost.
 */
@WebSocketGateway({ cors: false })
export class RealtimeGateway implements OnGatewayInit<Server> {
  @WebSocketServer() private readonly server!: Server;

  constructor(
    private readonly authentication: Authentication,
    private readonly lots: LotsQueries,
  ) {}

  afterInit(server: Server): void {
    server.use((socket, next) => void this.admit(socket, next));
    server.on(accessElsewhere, (change: AccessChange) => void this.recheckOf(change).catch(() => undefined));
    server.on(lotElsewhere, (lotId: string) => void this.evict(lotId).catch(() => undefined));
  }

  @SubscribeMessage('lot:watch')
  async watch(@ConnectedSocket() socket: Known, @MessageBody() body: unknown): Promise<{ ok: boolean }> {
    const request = lotRequest.safeParse(body);
    if (!request.success || !(await this.mayWatch(socket.data.actor, request.data.lotId))) return { ok: false };
    await socket.join(lotRoom(request.data.lotId));
    return { ok: true };
  }

  @SubscribeMessage('lot:unwatch')
  async unwatch(@ConnectedSocket() socket: Known, @MessageBody() body: unknown): Promise<{ ok: boolean }> {
    const request = lotRequest.safeParse(body);
    if (request.success) await socket.leave(lotRoom(request.data.lotId));
    return { ok: request.success };
  }

  @OnEvent(LOT_CHANGED)
  async lotChanged({ lotId, topics }: LotChange): Promise<void> {
    this.server?.to(lotRoom(lotId)).emit('changed', { lotId, topics });
    if (topics.every((topic) => topic === 'ledger' || topic === 'thread')) return;
    const lot = await this.lots.partiesOf(lotId);
    const rooms = [lot.builderId, lot.plumberId, lot.departmentId].filter((id) => id !== null).map(organizationRoom);
    this.server?.to(rooms).emit('waiting', {});
    if (!topics.includes('lot')) return;
    this.server?.serverSideEmit(lotElsewhere, lotId);
    await this.evict(lotId);
  }

  @OnEvent(PERSON_TOLD)
  personTold({ personId, what }: PersonTold): void {
    this.server?.to(personRoom(personId)).emit(what, {});
  }

  /** Somebody's session ended, or what they may changed: their sockets are asked again at once, in every process. */
  @OnEvent(ACCESS_CHANGED)
  async accessChanged(change: AccessChange): Promise<void> {
    this.server?.serverSideEmit(accessElsewhere, change);
    await this.recheckOf(change);
  }

  /** The net below what is told at once: whatever was missed is out within a minute, a session that ran out too. */
  @Interval(recheckMs)
  async recheck(): Promise<void> {
    await this.recheckSockets(this.openSockets());
  }

  private async recheckOf(change: AccessChange): Promise<void> {
    const isMeant = ({ data: { actor } }: Known) =>
      'personId' in change ? actor.personId === change.personId : actor.sessionId === change.sessionId;
    await this.recheckSockets(this.openSockets().filter(isMeant));
  }

  private openSockets(): Known[] {
    const sockets: Iterable<unknown> = this.server?.sockets.sockets.values() ?? [];
    return [...sockets] as Known[];
  }

  private async recheckSockets(sockets: readonly Known[]): Promise<void> {
    for (const socket of sockets) {
      const actor = await this.authentication.findActor(socket.data.actor);
      if (actor === null) socket.disconnect(true);
      else await this.renew(socket, actor);
    }
    const rooms = new Set(sockets.flatMap((socket) => [...socket.rooms].filter((room) => room.startsWith('lot:'))));
    for (const room of rooms) await this.evict(room.slice('lot:'.length));
  }

  /** The rooms of the organizations as they now are. */
  private async renew(socket: Known, actor: Actor): Promise<void> {
    socket.data.actor = actor;
    const rooms = organizationIds(actor).map(organizationRoom);
    const left = [...socket.rooms].filter((room) => room.startsWith(organizationRoom('')) && !rooms.includes(room));
    for (const room of left) await socket.leave(room);
    await socket.join(rooms);
  }

  private async admit(socket: Socket, next: (error?: Error) => void): Promise<void> {
    try {
      const token: unknown = (socket.handshake.auth as { token?: unknown }).token;
      const actor = typeof token === 'string' ? await this.authentication.findActorOfToken(token) : null;
      if (actor === null) {
        next(new Error('signed-out'));
        return;
      }
      (socket as unknown as Known).data.actor = actor;
      await socket.join([personRoom(actor.personId), ...organizationIds(actor).map(organizationRoom)]);
      next();
    } catch {
      next(new Error('busy'));
    }
  }

  private async mayWatch(actor: Actor, lotId: string): Promise<boolean> {
    try {
      await this.lots.getLotFor(actor, lotId);
      return true;
    } catch {
      return false;
    }
  }

  /** Sockets of this process that may no longer read the lot leave its room; the others are told to do the same. */
  private async evict(lotId: string): Promise<void> {
    const ids = this.server?.sockets.adapter.rooms.get(lotRoom(lotId)) ?? new Set<string>();
    if (ids.size === 0) return;
    const lot = await this.lots.partiesOf(lotId);
    for (const id of ids) {
      const socket = this.server.sockets.sockets.get(id) as unknown as Known | undefined;
      if (socket && !canReadLot(socket.data.actor, lot)) await socket.leave(lotRoom(lotId));
    }
  }
}
