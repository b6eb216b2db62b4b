import { Injectable } from '@nestjs/common';
import type { LotSummary } from '@holdwater/shared-types/lots/lot.contract.js';
import { ClearancesQueries, type ClearanceRecord } from '../clearances/clearances.queries.js';
import { Clock } from '../common/time/clock.js';
import { RuleCardsQueries, type RuleCardVersion } from '../departments/rule-cards.queries.js';
import { groupBy } from './group-by.js';
import { LotProgressQueries, type NextVisitRow } from './lot-progress.queries.js';
import type { LotBrief } from './lot-record.js';
import { currentStageOf, lotStages } from './lot-stages.js';
import { LotsQueries } from './lots.queries.js';

/** Everything a page of lots needs, fetched for all of them together. */
interface Gathered {
  readonly ruleCards: Map<string, RuleCardVersion>;
  readonly unitNumbers: Map<string, number[]>;
  readonly states: Map<string, ClearanceRecord[]>;
  readonly nextVisits: Map<string, NextVisitRow>;
  readonly openCorrections: Map<string, number>;
}

/** Presents lots to whoever may read them; a page costs a handful of statements, however long. */
@Injectable()
export class LotsPresenter {
  constructor(
    private readonly lots: LotsQueries,
    private readonly ruleCards: RuleCardsQueries,
    private readonly clearances: ClearancesQueries,
    private readonly progress: LotProgressQueries,
    private readonly clock: Clock,
  ) {}

  async presentSummaries(briefs: readonly LotBrief[]): Promise<LotSummary[]> {
    if (briefs.length === 0) return [];
    const gathered = await this.gather(briefs);
    return briefs.map((brief) => summaryOf(brief, gathered));
  }

  private async gather(briefs: readonly LotBrief[]): Promise<Gathered> {
    const lotIds = briefs.map(({ id }) => id);
    const departmentIds = [...new Set(briefs.flatMap(({ departmentId }) => departmentId ?? []))];
    const states = await this.clearances.listStates(lotIds);
    return {
      ruleCards: await this.ruleCards.listInForce(departmentIds, this.clock.now()),
      unitNumbers: await this.lots.listUnitNumbers(lotIds),
      states: groupBy(states, ({ lotId }) => lotId),
      nextVisits: await this.progress.listNextVisits(lotIds),
      openCorrections: await this.progress.countOpenCorrections(lotIds),
    };
  }
}

function summaryOf(brief: LotBrief, gathered: Gathered): LotSummary {
  const { id, number, address, permitNumber, builderName, plumberName, departmentName, departmentId } = brief;
  const ruleCard = departmentId === null ? undefined : gathered.ruleCards.get(departmentId);
  const stages = lotStages(
    ruleCard?.content.stages ?? [],
    gathered.unitNumbers.get(id) ?? [],
    gathered.states.get(id) ?? [],
  );
  const tract =
    brief.tractId !== null && brief.tractName !== null ? { id: brief.tractId, name: brief.tractName } : null;
  return {
    ...{ id, number, tract, address, permitNumber, builderName, plumberName, departmentName, departmentId, stages },
    currentStage: currentStageOf(stages),
    nextVisit: nextVisitOf(gathered.nextVisits.get(id)),
    openCorrections: gathered.openCorrections.get(id) ?? 0,
  };
}

function nextVisitOf(row: NextVisitRow | undefined): LotSummary['nextVisit'] {
  if (!row) return null;
  return {
    id: row.id,
    state: row.state,
    startAt: row.startAt.toISOString(),
    endAt: row.endAt.toISOString(),
    zone: row.zone,
  };
}
