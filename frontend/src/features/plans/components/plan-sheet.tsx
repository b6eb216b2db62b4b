import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { TestPlan } from '@holdwater/shared-types/plans/plan.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Choice } from '../../../components/choice';
import { Plain } from '../../../components/plain';
import { localName, useLocale } from '../../../lib/i18n';
import { useLotView, type LotView } from '../../lots/lot-view';
import { PlanBody } from './plan-body';

export interface PlanSheetProps {
  lot: LotDetail;
  plans: readonly TestPlan[];
}

/** The plan page of a lot: which part is looked at, and its plan. */
export function PlanSheet({ lot, plans }: PlanSheetProps): ReactNode {
  const { t } = useTranslation('plans');
  const view = useLotView(lot);
  const { stage } = view;
  if (stage === null) {
    return (
      <Plain kind="empty" title={t('noStages')} acts={<Act to={`/lots/${lot.id}`}>{t('backToLot')}</Act>}>
        {t('noStagesText')}
      </Plain>
    );
  }
  return (
    <>
      <PartChoice lot={lot} view={view} />
      <Part lot={lot} view={view} stage={stage} plans={plans} />
    </>
  );
}

function PartChoice({ lot, view }: { lot: LotDetail; view: LotView }): ReactNode {
  const { t } = useTranslation(['plans', 'common']);
  const locale = useLocale();
  const systems = view.stage?.systems ?? [];
  return (
    <div className="plan-part">
      <Choice
        label={t('stage')}
        isLabelShown
        options={lot.stages.map(({ code, name }) => ({ value: code, label: localName(name, locale) }))}
        value={view.stage?.code ?? null}
        onChange={(stage) => view.show({ stage })}
      />
      {lot.units.length > 1 ? (
        <Choice
          label={t('unit')}
          isLabelShown
          options={lot.units.map(({ number, label }) => ({ value: String(number), label }))}
          value={String(view.unitNumber)}
          onChange={(unit) => view.show({ unit })}
        />
      ) : null}
      {systems.length > 1 ? (
        <Choice
          label={t('system')}
          isLabelShown
          options={systems.map((value) => ({ value, label: t(`common.systems.${value}`) }))}
          value={view.system}
          onChange={(system) => view.show({ system })}
        />
      ) : null}
    </div>
  );
}

type PartProps = PlanSheetProps & { view: LotView; stage: NonNullable<LotView['stage']> };

function Part({ lot, plans, view, stage }: PartProps): ReactNode {
  const { t } = useTranslation('plans');
  const locale = useLocale();
  const { unitNumber, system } = view;
  if (stage.systems.length === 0) {
    return (
      <Plain kind="empty" title={t('noTest')}>
        {t('noTestText', { stage: localName(stage.name, locale) })}
      </Plain>
    );
  }
  const house = lot.units.find(({ number }) => number === unitNumber)?.geometry ?? null;
  if (house === null) {
    const to = `/lots/${lot.id}/edit?part=house&unit=${unitNumber}`;
    const acts = lot.abilities.canEditGeometry ? (
      <Act kind="first" to={to}>
        {t('measureHouse')}
      </Act>
    ) : undefined;
    return (
      <Plain kind="empty" title={t('noHouse')} acts={acts}>
        {t('noHouseText')}
      </Plain>
    );
  }
  const part = { unitNumber, stageCode: stage.code, system };
  const current =
    plans.find((plan) => plan.unitNumber === unitNumber && plan.stageCode === stage.code && plan.system === system) ??
    null;
  // another part, or another plan of it, begins anew with its own tools
  const key = `${unitNumber} ${stage.code} ${system} ${current?.id ?? ''}`;
  return <PlanBody key={key} lot={lot} part={part} house={house} current={current} />;
}
