import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { type CorrectionMove, correctionMoveTable } from '@holdwater/shared-types/outcomes/correction.states.js';
import { ClearancesService } from '../clearances/clearances.service.js';
import { Changes } from '../common/changes/changes.js';
import { refuse } from '../common/errors/app-error.js';
import { Ledger, type LedgerActor } from '../ledger/ledger.service.js';
import { Outbox } from '../notices/outbox.service.js';
import { CorrectionModel } from './correction.model.js';

export type CorrectionStep =
  | { readonly move: 'fix'; readonly note: string; readonly at: Date }
  | { readonly move: 'accept'; readonly at: Date }
  | { readonly move: 'reopen'; readonly why: string; readonly at: Date };

/** The only place where a correction changes its state. Inside the unit of work of the act, its row locked. */
@Injectable()
export class CorrectionMoves {
  constructor(
    @InjectModel(CorrectionModel) private readonly corrections: typeof CorrectionModel,
    private readonly ledger: Ledger,
    private readonly outbox: Outbox,
    private readonly clearances: ClearancesService,
    private readonly changes: Changes,
  ) {}

  async findLocked(id: string): Promise<CorrectionModel | null> {
    return this.corrections.findByPk(id, { lock: true });
  }

  /** Several at once, in the order of their ids so that two acts never wait for each other in a ring; unknown ones are left out. */
  async lockAll(ids: readonly string[]): Promise<CorrectionModel[]> {
    return this.corrections.findAll({ where: { id: [...ids] }, order: [['id', 'ASC']], lock: true });
  }

  /**
   * Makes a move of the table, told once; the plumbing state follows.
   * @throws correction-unfixed, stale-state
   */
  async apply(correction: CorrectionModel, step: CorrectionStep, by: LedgerActor): Promise<void> {
    requireCorrectionMove(correction, step.move);
    const state = correctionMoveTable[step.move].to;
    await correction.update({ ...valuesOf(step, by.personId), state, version: correction.version + 1 });
    await this.tell(correction, step, by);
    await this.clearances.recompute(correction.lotId, correction.unitNumber, correction.stageCode);
    this.changes.lot(correction.lotId, 'outcomes', 'visits', 'lot');
  }

  private async tell(correction: CorrectionModel, step: CorrectionStep, by: LedgerActor): Promise<void> {
    const { lotId, visitId, number } = correction;
    const payload = { correctionId: correction.id, number };
    const subject = { lotId, visitId, actorId: by.personId };
    if (step.move === 'reopen') {
      await this.ledger.appendToLot(lotId, 'correction-reopened', { ...payload, why: step.why }, by);
      await this.outbox.add('correction-reopened', subject, { ...payload, why: step.why });
      return;
    }
    const kind = step.move === 'fix' ? 'correction-fixed' : 'correction-accepted';
    await this.ledger.appendToLot(lotId, kind, payload, by);
    await this.outbox.add(kind, subject, payload);
  }
}

/** @throws correction-unfixed where one still open is to be decided, else stale-state with what it is now */
export function requireCorrectionMove(
  correction: Pick<CorrectionModel, 'state' | 'version' | 'number'>,
  move: CorrectionMove,
): void {
  const { state, version, number } = correction;
  if (state === correctionMoveTable[move].from) return;
  if (move !== 'fix' && state === 'open') refuse('correction-unfixed', { number, is: state });
  refuse('stale-state', { is: state, version });
}

/** What it was last said to be fixed by stays readable when it is reopened. */
function valuesOf(step: CorrectionStep, personId: string) {
  if (step.move === 'fix') return { fixedAt: step.at, fixedBy: personId, fixNote: step.note };
  if (step.move === 'accept') return { acceptedAt: step.at, acceptedBy: personId };
  return { reopenedWhy: step.why };
}
