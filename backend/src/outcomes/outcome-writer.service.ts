import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Stage } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { OutcomeKind } from '@holdwater/shared-types/outcomes/outcome.states.js';
import { Ledger, type LedgerActor } from '../ledger/ledger.service.js';
import { Outbox } from '../notices/outbox.service.js';
import { VisitEvents } from '../visits/visit-events.service.js';
import type { VisitModel } from '../visits/visit.model.js';
import type { SeenResult } from './outcome.input.js';
import { OutcomeModel } from './outcome.model.js';
import { OutcomeSystemModel } from './outcome-system.model.js';
import { OutcomeWorkModel } from './outcome-work.model.js';

export interface Verdict {
  readonly kind: OutcomeKind;
  readonly reason: string | null;
}

export interface OutcomeEntry {
  readonly clientId: string;
  readonly note: string | null;
  readonly madeAt: Date;
  readonly receivedAt: Date;
}

/** Writes what a visit found, and tells it once. */
@Injectable()
export class OutcomeWriter {
  constructor(
    @InjectModel(OutcomeModel) private readonly outcomes: typeof OutcomeModel,
    @InjectModel(OutcomeSystemModel) private readonly systems: typeof OutcomeSystemModel,
    @InjectModel(OutcomeWorkModel) private readonly work: typeof OutcomeWorkModel,
    private readonly ledger: Ledger,
    private readonly outbox: Outbox,
    private readonly events: VisitEvents,
  ) {}

  /** `seen` is null where nothing was: then there are neither systems nor work. */
  async write(
    visit: VisitModel,
    entry: OutcomeEntry,
    verdict: Verdict,
    seen: { result: SeenResult; stage: Stage } | null,
    by: LedgerActor,
  ) {
    const outcome = await this.outcomes.create({
      id: randomUUID(),
      visitId: visit.id,
      ...entry,
      kind: verdict.kind,
      reason: verdict.reason,
      byPerson: by.personId,
    });
    if (seen !== null) {
      await this.writeSystems(outcome.id, seen.result);
      await this.writeWork(outcome.id, seen.result, seen.stage);
    }
    const systems = (seen?.result.systems ?? []).map(({ unitNumber, system, answer }) => ({
      unitNumber,
      system,
      answer,
    }));
    await this.ledger.appendToLot(visit.lotId, 'outcome', { visitId: visit.id, ...verdict, systems }, by);
  }

  /** After the visit has closed, so that the event tells of the visit as it now is. */
  async tell(visit: VisitModel, verdict: Verdict, by: LedgerActor): Promise<void> {
    const subject = { lotId: visit.lotId, visitId: visit.id, actorId: by.personId };
    await this.outbox.add('outcome', subject, { visit: await this.events.factsOf(visit), ...verdict });
  }

  private async writeSystems(outcomeId: string, seen: SeenResult): Promise<void> {
    await this.systems.bulkCreate(
      seen.systems.map((each) => ({
        id: randomUUID(),
        outcomeId,
        unitNumber: each.unitNumber,
        system: each.system,
        answer: each.answer,
        needle: each.needle ?? null,
        pressurePsi: each.pressurePsi ?? null,
        levelIn: each.levelIn ?? null,
        note: each.note ?? null,
      })),
    );
  }

  /** Every point of the stage, looked at or not. */
  private async writeWork(outcomeId: string, seen: SeenResult, stage: Stage): Promise<void> {
    await this.work.bulkCreate(
      stage.work.map(({ code }) => ({
        id: randomUUID(),
        outcomeId,
        pointCode: code,
        isLookedAt: seen.lookedAt.includes(code),
      })),
    );
  }
}
