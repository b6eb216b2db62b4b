import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Numeral } from '../../../components/numeral';
import { StateWord } from '../../../components/state-word';
import { localName, useLocale } from '../../../lib/i18n';
import { useTimeWords } from '../../../lib/time';
import { byTime } from '../calendar-model';
import { useVisitLook } from '../visit-look';
import '../visit.css';

export interface VisitListProps {
  visits: readonly VisitSummary[];
  /** The page's zone: a time of another is told with its own. */
  zone: string;
  now: Date;
  chosenVisitId: string | null;
  onOpenVisit: (visitId: string) => void;
}

/** Every visit of the span in order of time, those that ended too. */
export function VisitList({ visits, zone, now, chosenVisitId, onOpenVisit }: VisitListProps): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  const words = useTimeWords();
  const locale = useLocale();
  const lookOf = useVisitLook();
  return (
    <table className="ruled visit-list">
      <thead>
        <tr>
          {(['day', 'lot', 'state', 'window', 'stage', 'department', 'inspector'] as const).map((column) => (
            <th key={column} scope="col">
              {t(`list.${column}`)}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {[...visits].sort(byTime).map((visit) => {
          const look = lookOf(visit, now);
          const { window } = visit;
          return (
            <tr key={visit.id} className={visit.id === chosenVisitId ? 'wash-primer' : undefined}>
              <td>
                <Numeral text={words.date(window.date)} />
              </td>
              <th scope="row">
                <button type="button" className="link-act" onClick={() => onOpenVisit(visit.id)}>
                  <Numeral text={t('common.lot', { number: visit.lotNumber })} />
                </button>{' '}
                <span className="s mid">{visit.tractName ?? visit.address}</span>
              </th>
              <td>
                <StateWord state={look.mark} word={look.word} tone={look.tone} />
              </td>
              <td>
                <Numeral text={words.window(window.startAt, window.endAt, visit.zone)} />
                {visit.zone === zone ? null : <div className="xs mut">{words.zone(visit.zone)}</div>}
              </td>
              <td>{localName(visit.stageName, locale)}</td>
              <td>{visit.departmentName}</td>
              <td>{visit.inspector?.name}</td>
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}
