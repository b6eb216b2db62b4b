import type { System } from '@holdwater/shared-types/holds/hold.states.js';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { lotPlansQuery } from '../api/plans';
import { useWayName } from '../way-name';
import '../plans.css';

export interface PlanSlotProps {
  lotId: string;
  stageCode: string;
  unitNumber: number;
  system: System;
}

/** On the lot sheet: what is planned for the part looked at, and the way to its plan. */
export function PlanSlot({ lotId, stageCode, unitNumber, system }: PlanSlotProps): ReactNode {
  const { t } = useTranslation('plans');
  const plans = useQuery(lotPlansQuery(lotId));
  const nameOf = useWayName();
  const plan = plans.data?.items.find(
    (each) => each.stageCode === stageCode && each.unitNumber === unitNumber && each.system === system,
  );
  const address = new URLSearchParams({ stage: stageCode, unit: String(unitNumber), system });
  return (
    <div className="plan-slot">
      <p className="s">
        {plans.data === undefined ? null : plan === undefined ? (
          <span className="mid">{t('slot.none')}</span>
        ) : (
          <>
            <span className="b">{t('slot.planned', { way: nameOf(plan) })}</span>
            {plan.stale.length > 0 ? <span className="t-brass b">. {t('slot.stale')}</span> : null}
          </>
        )}
      </p>
      <Act size="sm" to={`/lots/${lotId}/plan?${address.toString()}`}>
        {t('slot.open')}
      </Act>
    </div>
  );
}
