import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import { StateWord } from '../../../components/state-word';
import { localName, useLocale } from '../../../lib/i18n';
import { useTimeWords } from '../../../lib/time';
import { useVisitLook } from '../visit-look';
import '../visit.css';

export interface RequestsListProps {
  requests: readonly VisitSummary[];
  now: Date;
  chosenVisitId: string | null;
  onOpenVisit: (visitId: string) => void;
}

/** The desk's pile: those that keep first place on top, then the oldest. */
export function RequestsList({ requests, now, chosenVisitId, onOpenVisit }: RequestsListProps): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  const words = useTimeWords();
  const locale = useLocale();
  const lookOf = useVisitLook();
  return (
    <table className="ruled requests">
      <thead>
        <tr>
          {(['lot', 'wants', 'neededBy', 'stage', 'requested', 'state'] as const).map((column) => (
            <th key={column} scope="col">
              {t(`requests.columns.${column}`)}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {requests.map((visit) => {
          const look = lookOf(visit, now);
          const { window, zone } = visit;
          return (
            <tr key={visit.id} className={visit.id === chosenVisitId ? 'wash-primer' : undefined}>
              <th scope="row">
                <button
                  type="button"
                  className="link-act"
                  aria-expanded={visit.id === chosenVisitId}
                  onClick={() => onOpenVisit(visit.id)}
                >
                  <Numeral text={t('common.lot', { number: visit.lotNumber })} />
                </button>
                <div className="s mid">{[visit.tractName, visit.builderName].filter(Boolean).join(', ')}</div>
              </th>
              <td data-label={t('requests.columns.wants')}>
                <Numeral text={words.dayWindow(window.startAt, window.endAt, zone)} />
              </td>
              <td data-label={visit.neededBy === null ? undefined : t('requests.columns.neededBy')}>
                {visit.neededBy === null ? null : (
                  <span className="st t-brass">
                    <Mark name="waits-on-you" />
                    <span>
                      <Numeral text={words.dayClock(visit.neededBy, zone)} />
                    </span>
                  </span>
                )}
              </td>
              <td>
                {localName(visit.stageName, locale)}
                {visit.isRetest ? `, ${t('visit.retest')}` : null}
              </td>
              <td data-label={t('requests.columns.requested')}>
                <Numeral text={words.dayClock(visit.requestedAt, zone)} />
              </td>
              <td>
                <StateWord state={look.mark} word={look.word} />
              </td>
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}
