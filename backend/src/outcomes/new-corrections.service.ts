import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { NewCorrection } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { refuse } from '../common/errors/app-error.js';
import { Ledger, type LedgerActor } from '../ledger/ledger.service.js';
import { Outbox } from '../notices/outbox.service.js';
import type { VisitModel } from '../visits/visit.model.js';
import { CorrectionModel } from './correction.model.js';

/** Opens the corrections an outcome lists, counted per lot. The caller has locked the lot, so that no number is given twice. */
@Injectable()
export class NewCorrections {
  constructor(
    @InjectModel(CorrectionModel) private readonly corrections: typeof CorrectionModel,
    private readonly ledger: Ledger,
    private readonly outbox: Outbox,
  ) {}

  /** @throws bad-input where a client id was used before */
  async open(visit: VisitModel, given: readonly NewCorrection[], at: Date, by: LedgerActor): Promise<void> {
    await this.requireFresh(given);
    const last = await this.corrections.max<number | null, CorrectionModel>('number', {
      where: { lotId: visit.lotId },
    });
    let number = last ?? 0;
    for (const each of given) {
      number += 1;
      await this.openOne(visit, each, number, at, by);
    }
  }

  private async openOne(
    visit: VisitModel,
    given: NewCorrection,
    number: number,
    at: Date,
    by: LedgerActor,
  ): Promise<void> {
    const { lotId, stageCode } = visit;
    const { subject, severity } = given;
    const correction = await this.corrections.create({
      id: randomUUID(),
      clientId: given.clientId,
      lotId,
      visitId: visit.id,
      unitNumber: given.unitNumber,
      stageCode,
      number,
      subject,
      pointCode: given.pointCode ?? null,
      text: given.text,
      place: given.place,
      floor: given.floor ?? null,
      room: given.room ?? null,
      severity,
      section: given.section ?? null,
      state: 'open',
      version: 0,
      openedAt: at,
      openedBy: by.personId,
    });
    const payload = { correctionId: correction.id, number };
    await this.ledger.appendToLot(lotId, 'correction-opened', { ...payload, subject, severity }, by);
    await this.outbox.add('correction-opened', { lotId, visitId: visit.id, actorId: by.personId }, payload);
  }

  private async requireFresh(given: readonly NewCorrection[]): Promise<void> {
    const used = await this.corrections.findAll({ where: { clientId: given.map((each) => each.clientId) } });
    const index = given.findIndex((each) => used.some((correction) => correction.clientId === each.clientId));
    if (index >= 0) refuse('bad-input', {}, { [`result.corrections.${index}.clientId`]: 'used-before' });
  }
}
