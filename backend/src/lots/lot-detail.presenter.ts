import { Injectable } from '@nestjs/common';
import type { LotAccess, LotDetail, LotUnit } from '@holdwater/shared-types/lots/lot.contract.js';
import type { Actor } from '../common/access/actor.js';
import { refuse } from '../common/errors/app-error.js';
import { Clock } from '../common/time/clock.js';
import { RuleCardsQueries } from '../departments/rule-cards.queries.js';
import { localDateOf } from '../scheduling/working-time/local-instant.js';
import { originOf } from './houses/modelled-units.js';
import { UnitHousesQueries } from './houses/unit-houses.queries.js';
import { LotPartiesPresenter } from './lot-parties.presenter.js';
import { LotProgressQueries } from './lot-progress.queries.js';
import type { LotRecord } from './lot-record.js';
import { canSeeAccess, lotAbilities } from './lots.policy.js';
import { LotsPresenter } from './lots.presenter.js';
import { LotsQueries } from './lots.queries.js';

/** Presents one lot whole, as this reader may see it. */
@Injectable()
export class LotDetailPresenter {
  constructor(
    private readonly units: UnitHousesQueries,
    private readonly lots: LotsQueries,
    private readonly summaries: LotsPresenter,
    private readonly parties: LotPartiesPresenter,
    private readonly ruleCards: RuleCardsQueries,
    private readonly progress: LotProgressQueries,
    private readonly clock: Clock,
  ) {}

  /** Throws `not-found`. */
  async present(actor: Actor, lotId: string): Promise<LotDetail> {
    const lot = await this.lots.getLotFor(actor, lotId);
    const brief = (await this.lots.listBriefs([lotId])).get(lotId) ?? refuse('not-found');
    const [summary = refuse('not-found')] = await this.summaries.presentSummaries([brief]);
    return {
      ...summary,
      latitude: lot.latitude,
      longitude: lot.longitude,
      zone: brief.zone,
      permit: { number: lot.permitNumber, status: lot.permitStatus, holder: lot.permitHolder },
      mayPlumberRequest: lot.mayPlumberRequest,
      coverDate: lot.coverDate,
      units: await this.unitsOf(lotId),
      access: await this.accessFor(actor, lot, brief.zone),
      parties: await this.parties.present(lot),
      handovers: await this.parties.presentHandovers(lot.id),
      ruleCard: await this.ruleCardOf(lot),
      abilities: lotAbilities(actor, lot),
    };
  }

  private async unitsOf(lotId: string): Promise<LotUnit[]> {
    const units = await this.units.listOfLots([lotId]);
    return units.map((unit) => ({
      number: unit.unitNumber,
      label: unit.unitLabel,
      geometry: unit.geometry,
      model: originOf(unit),
    }));
  }

  private async accessFor(actor: Actor, lot: LotRecord, zone: string | null): Promise<LotAccess | null> {
    const isComingToday =
      zone !== null && (await this.progress.isPlannedOn(lot.id, actor.personId, localDateOf(this.clock.now(), zone)));
    if (!canSeeAccess(actor, lot, isComingToday)) return null;
    const { gateCode, contactName, contactPhone, hazards } = lot;
    return { gateCode, contactName, contactPhone, hazards };
  }

  private async ruleCardOf({ departmentId }: LotRecord): Promise<LotDetail['ruleCard']> {
    if (departmentId === null) return null;
    const card = (await this.ruleCards.listInForce([departmentId], this.clock.now())).get(departmentId);
    return card ? { id: card.id, version: card.version, effectiveFrom: card.effectiveFrom } : null;
  }
}
