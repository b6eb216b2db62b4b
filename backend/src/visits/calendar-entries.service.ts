import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { openVisitStates } from '@holdwater/shared-types/visits/visit.states.js';
import type { Actor } from '../common/access/actor.js';
import { Changes } from '../common/changes/changes.js';
import { type LotFollower, LotFollowers } from '../lots/lot-followers.js';
import { Outbox } from '../notices/outbox.service.js';
import { VisitEvents } from './visit-events.service.js';
import { VisitModel } from './visit.model.js';

/** Sends calendar entries anew when what they say of the lot is another, though the window stays. */
@Injectable()
export class CalendarEntries implements LotFollower, OnModuleInit {
  constructor(
    @InjectModel(VisitModel) private readonly visits: typeof VisitModel,
    private readonly followers: LotFollowers,
    private readonly events: VisitEvents,
    private readonly outbox: Outbox,
    private readonly changes: Changes,
  ) {}

  onModuleInit(): void {
    this.followers.register(this);
  }

  /** The open visits of these lots, locked in order of id. */
  async lockOpen(lotIds: readonly string[]): Promise<VisitModel[]> {
    return this.visits.findAll({
      where: { lotId: [...lotIds], state: [...openVisitStates] },
      order: [['id', 'ASC']],
      lock: true,
    });
  }

  async lock(lotIds: readonly string[]): Promise<void> {
    await this.lockOpen(lotIds);
  }

  async renamed(lotIds: readonly string[], actor: Actor): Promise<void> {
    await this.sendAnew(await this.lockOpen(lotIds), actor);
  }

  /**
   * The same UID with a higher SEQUENCE (RFC 5546 §2.1.4) to everyone on the lot now; whoever had the entry and is not gets it taken away.
   * The version stays: nothing changed that a mover decides on. A request has no entry, and at an underway visit everybody is there.
   */
  async sendAnew(locked: readonly VisitModel[], actor: Actor): Promise<void> {
    for (const visit of locked.filter(({ state }) => state === 'booked' || state === 'ready')) {
      await visit.update({ calendarSequence: visit.calendarSequence + 1 });
      const subject = { lotId: visit.lotId, visitId: visit.id, actorId: actor.personId };
      await this.outbox.add('visit-changed', subject, { visit: await this.events.factsOf(visit) });
      this.changes.lot(visit.lotId, 'visits');
    }
  }
}
