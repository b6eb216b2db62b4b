import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { RouteAnswer } from '@holdwater/shared-types/common/route.js';
import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { Medium, Method, System } from '@holdwater/shared-types/holds/hold.states.js';
import type { readRun } from '@holdwater/shared-types/visits/calendar.contract.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import type { Actor } from '../common/access/actor.js';
import { RuleCardsQueries } from '../departments/rule-cards.queries.js';
import type { LotRecord } from '../lots/lot-record.js';
import { canSeeAccess } from '../lots/lots.policy.js';
import { RequestedLotsQueries } from './requested-lots.queries.js';
import type { VisitRow } from './visit-row.js';
import { partiesOfRow, VisitsPresenter } from './visits.presenter.js';

type Stop = RouteAnswer<typeof readRun>['stops'][number];
type Ask = Stop['asks'][number];

interface TestOfSystem {
  readonly lotId: string;
  readonly stageCode: string;
  readonly unitNumber: number;
  readonly system: System;
  readonly method: Method;
  readonly medium: Medium;
  readonly minimumPsi: number | null;
  readonly fillLevelFt: number | null;
}

/** The stops of a run: the visits with what an inspector needs at the door and in front of the gauge. */
@Injectable()
export class RunStops {
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    private readonly lots: RequestedLotsQueries,
    private readonly ruleCards: RuleCardsQueries,
    private readonly presenter: VisitsPresenter,
  ) {}

  /** `isToday`: gate codes and contacts are for the inspector who comes, on the day. */
  async present(actor: Actor, rows: readonly VisitRow[], isToday: boolean): Promise<Stop[]> {
    const lotIds = [...new Set(rows.map(({ lotId }) => lotId))];
    const lots = new Map((await this.lots.listLots(lotIds)).map((lot) => [lot.id, lot]));
    const ruleCards = await this.ruleCards.listRuleCards([...new Set(rows.map(({ ruleCardId }) => ruleCardId))]);
    const tests = await this.listNewestTests(lotIds);
    return this.presenter.presentRows(actor, rows).map((visit, index) => {
      const row = rows[index];
      const lot = lots.get(visit.lotId);
      const rules = row ? (ruleCards.get(row.ruleCardId)?.content.tests ?? []) : [];
      const isComing = isToday && row?.inspectorId === actor.personId;
      return {
        visit,
        order: index + 1,
        access: lot && row && canSeeAccess(actor, partiesOfRow(row), isComing) ? accessOf(lot) : null,
        latitude: lot?.latitude ?? null,
        longitude: lot?.longitude ?? null,
        asks: row ? asksOf(row, rules, tests) : [],
      };
    });
  }

  /** Of each unit, stage and system the newest test: the one standing, where one stands. */
  private async listNewestTests(lotIds: readonly string[]): Promise<TestOfSystem[]> {
    return this.sequelize.query<TestOfSystem>(
      `SELECT DISTINCT ON (lot_id, stage_code, unit_number, system) lot_id AS "lotId", stage_code AS "stageCode", unit_number AS "unitNumber",
         system, method, medium, minimum_psi AS "minimumPsi", fill_level_ft AS "fillLevelFt"
       FROM holds WHERE lot_id = ANY (ARRAY[:lotIds]::uuid[]) ORDER BY lot_id, stage_code, unit_number, system, ordinal DESC`,
      { replacements: { lotIds: [...lotIds] }, type: QueryTypes.SELECT },
    );
  }
}

function accessOf({ gateCode, contactName, contactPhone, hazards }: LotRecord): Stop['access'] {
  return { gateCode, contactName, contactPhone, hazards };
}

function asksOf(row: VisitRow, rules: readonly TestRule[], tests: readonly TestOfSystem[]): Ask[] {
  return row.unitNumbers.flatMap((unitNumber) =>
    (row.stage?.systems ?? []).map((system) => {
      const test = tests.find(
        (each) =>
          each.lotId === row.lotId &&
          each.stageCode === row.stageCode &&
          each.unitNumber === unitNumber &&
          each.system === system,
      );
      const rule = rules.find((each) => each.stageCode === row.stageCode && each.system === system);
      return {
        unitNumber,
        system,
        method: test?.method ?? null,
        minimumPsi: minimumPsiOf(rule, test),
        levelFt: levelFtOf(rule, test),
      };
    }),
  );
}

/** What the rule card asks of the medium tested with; before there is a test, of the first it accepts. Psi at the gauge. */
function minimumPsiOf(rule: TestRule | undefined, test: TestOfSystem | undefined): number | null {
  if (test?.minimumPsi !== null && test?.minimumPsi !== undefined) return test.minimumPsi;
  const pressure = test ? rule?.pressures.find(({ medium }) => medium === test.medium) : rule?.pressures[0];
  return pressure?.minimumPsi ?? null;
}

/** Feet the water stands at: as filled, else as the rule card has it where it gives a level of its own. */
function levelFtOf(rule: TestRule | undefined, test: TestOfSystem | undefined): number | null {
  if (test?.fillLevelFt !== null && test?.fillLevelFt !== undefined) return test.fillLevelFt;
  return rule?.headRule?.kind === 'fill-level' ? rule.headRule.feet : null;
}
