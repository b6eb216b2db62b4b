import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import { dwvMethods, type DwvMethod, type Method } from '@holdwater/shared-types/holds/hold.states.js';
import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Choice } from '../../../components/choice';
import { Panel } from '../../../components/panel';
import { Plain } from '../../../components/plain';
import { Cutaway } from '../../../drawings/cutaway';
import { findDwvPlan, drawnHouseOf } from '../dwv-ways';
import { PlanSlot } from '../../plans/components/plan-slot';
import type { LotView } from '../lot-view';
import { HouseOriginLine } from './house-origin-line';
import { SectionCautions } from './section-cautions';
import { SectionFacts } from './section-facts';
import { StandingLine } from './standing-line';
import { WaysToTest } from './ways-to-test';
import '../section.css';

export interface SectionPartProps {
  lot: LotDetail;
  view: LotView;
  /** The tests of what is looked at, the newest first. */
  tests: readonly Hold[];
  corrections: readonly Correction[];
  rule: TestRule | null;
  /** Tested before the slab is poured. */
  isGroundwork: boolean;
  zone: string;
}

function asDwvMethod(method: Method | undefined): DwvMethod | null {
  return dwvMethods.find((one) => one === method) ?? null;
}

/** The section through the house as it stands under test, what the test rests on, and what may hurt. */
export function SectionPart({ lot, view, tests, corrections, rule, isGroundwork, zone }: SectionPartProps): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const unit = lot.units.find(({ number }) => number === view.unitNumber);
  const house = unit?.geometry ?? null;
  const hold = tests[0] ?? null;
  const shown = hold?.state === 'standing' ? hold : null;
  const isWater = view.system === 'water';
  const method = isWater ? null : asDwvMethod(shown?.method);
  const plan =
    house === null || method === null || rule === null || isGroundwork ? null : findDwvPlan(house, method, rule);
  const systems = view.stage?.systems.length ? view.stage.systems : (['dwv', 'water'] as const);
  const pinned = corrections.flatMap((one) =>
    one.place === 'whole-system' || one.unitNumber !== view.unitNumber || one.stageCode !== view.stage?.code
      ? []
      : [{ number: one.number, state: one.state, ...one.place }],
  );
  return (
    <Panel
      title={t('section.title')}
      side={
        <Choice
          label={t('section.system')}
          options={systems.map((value) => ({ value, label: t(`common.systems.${value}`) }))}
          value={view.system}
          onChange={(system) => view.show({ system })}
        />
      }
      isFlush
    >
      <StandingLine hold={hold} zone={zone} />
      {view.stage?.systems.includes(view.system) ? (
        <PlanSlot lotId={lot.id} stageCode={view.stage.code} unitNumber={view.unitNumber} system={view.system} />
      ) : null}
      {house === null ? (
        <Plain
          kind="empty"
          level={3}
          title={t('section.noHouse')}
          acts={
            lot.abilities.canEditGeometry ? (
              <Act to={`/lots/${lot.id}/edit?part=house&unit=${view.unitNumber}`}>{t('section.draw')}</Act>
            ) : undefined
          }
        >
          {t('section.noHouseText')}
        </Plain>
      ) : (
        <div className="section-drawing">
          <Cutaway
            house={drawnHouseOf(house)}
            method={method}
            fillLevelFt={shown?.fillLevelFt ?? null}
            levels={plan?.levels}
            view={view.system}
            corrections={pinned}
          />
          <HouseOriginLine origin={unit?.model} isLinked={lot.abilities.canEdit} />
        </div>
      )}
      <SectionFacts house={house} hold={shown} rule={rule} plan={plan} system={view.system} />
      {!isWater && house !== null && rule !== null ? (
        <WaysToTest house={house} rule={rule} chosen={method} isGroundwork={isGroundwork} ruleCard={lot.ruleCard} />
      ) : null}
      <SectionCautions hold={shown} plan={plan} system={view.system} />
    </Panel>
  );
}
