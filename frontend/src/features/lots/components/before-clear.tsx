import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Icon } from '../../../components/icon';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import { visitOutcomeQuery } from '../api/visit-outcome';
import { clearChecks } from '../clear-checks';
import { findLastClosed, unitState, type LotView } from '../lot-view';

export interface BeforeClearProps {
  lotId: string;
  view: LotView;
  visits: readonly VisitSummary[];
  holds: readonly Hold[];
  corrections: readonly Correction[];
}

/** What is left before plumbing is clear, from what was recorded. */
export function BeforeClear({ lotId, view, visits, holds, corrections }: BeforeClearProps): ReactNode {
  const { t } = useTranslation('lots');
  const last = findLastClosed(visits, view.stage?.code);
  const outcome = useQuery({ ...visitOutcomeQuery(lotId, last?.id ?? ''), enabled: last !== null });
  if (view.stage === null) return null;
  const state = unitState(view.stage, view.unitNumber);
  const checks = clearChecks({
    stageCode: view.stage.code,
    unitNumber: view.unitNumber,
    systems: view.stage.systems,
    state,
    corrections,
    holds,
    outcome: outcome.data ?? null,
  });
  const isClear = state === 'clear';
  return (
    <section className="title-part" aria-labelledby="before-clear">
      <h2 className="h2" id="before-clear">
        {t('before.title')}
      </h2>
      <p className="s mid">{t('before.computed')}</p>
      <ul className="before-clear">
        {checks.map(({ key, isDone, done, total }) => (
          <li key={key} className="spread">
            <span className="row">
              {isDone ? (
                <Icon name="check" size={18} className="t-green" title={t('before.done')} />
              ) : (
                <span className="to-do" />
              )}
              {t(`before.${key}`)}
            </span>
            <span className="s mid nw">
              {total === null ? (
                isDone ? null : (
                  t('before.atVisit')
                )
              ) : (
                <Numeral text={t('before.of', { done, total })} />
              )}
            </span>
          </li>
        ))}
        <li className="row b">
          <Mark name={isClear ? 'clear' : 'not-tested'} />
          {t(isClear ? 'title.plumbingClear' : 'before.notClear')}
        </li>
      </ul>
      <p className="s mid">{t('before.says')}</p>
    </section>
  );
}
