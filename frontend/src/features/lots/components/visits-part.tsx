import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useQuery, type UseQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Mark } from '../../../components/mark';
import { markTones } from '../../../components/mark-names';
import { Numeral } from '../../../components/numeral';
import { Panel } from '../../../components/panel';
import { useNow } from '../../../lib/clock';
import { localName, useLocale } from '../../../lib/i18n';
import { QueryState } from '../../../lib/query-state';
import { useTimeWords } from '../../../lib/time';
import { useEndWords } from '../../visits/end-words';
import { useVisitLook } from '../../visits/visit-look';
import { visitOutcomeQuery } from '../api/visit-outcome';

export interface VisitsPartProps {
  query: Pick<UseQueryResult<{ items: VisitSummary[] }>, 'data' | 'error' | 'isPending' | 'refetch'>;
}

/** Every visit of the lot with its outcome, newest first. */
export function VisitsPart({ query }: VisitsPartProps): ReactNode {
  const { t } = useTranslation('lots');
  return (
    <Panel title={t('visitList.title')} isFlush>
      <QueryState query={query}>
        {({ items }) =>
          items.length === 0 ? (
            <p className="mid part-words">{t('visitList.none')}</p>
          ) : (
            <ul className="part-list">
              {items.map((visit) => (
                <OneVisit key={visit.id} visit={visit} />
              ))}
            </ul>
          )
        }
      </QueryState>
    </Panel>
  );
}

function OneVisit({ visit }: { visit: VisitSummary }): ReactNode {
  const { t } = useTranslation('lots');
  const locale = useLocale();
  const words = useTimeWords();
  const look = useVisitLook()(visit, useNow());
  const ended = useEndWords()(visit);
  const { window, zone } = visit;
  return (
    <li className="row at-top">
      <Mark name={look.mark} size={24} />
      <div className="grow">
        <div className="b">
          <Numeral text={words.dayWindow(window.startAt, window.endAt, zone)} />
        </div>
        <div className="s mid">
          {localName(visit.stageName, locale)}
          {visit.isRetest ? `, ${t('visitList.retest')}` : null}
          {visit.inspector === null ? null : `, ${visit.inspector.name}`}
        </div>
        <div className="s">
          <span className={`b t-${look.tone ?? markTones[look.mark]}`}>{look.word}</span>
          {ended === null ? null : <span className="mid">, {ended}</span>}
        </div>
        {visit.state === 'closed' ? <SystemAnswers visit={visit} /> : null}
      </div>
    </li>
  );
}

/** "DWV fail, water not seen", with the inspector's note. */
function SystemAnswers({ visit }: { visit: VisitSummary }): ReactNode {
  const { t } = useTranslation(['lots', 'marks', 'common']);
  const isSeen = visit.outcome?.kind === 'pass' || visit.outcome?.kind === 'fail';
  const outcome = useQuery({ ...visitOutcomeQuery(visit.lotId, visit.id), enabled: isSeen });
  if (outcome.data === undefined) return null;
  const { systems, note } = outcome.data;
  const hasUnits = visit.unitNumbers.length > 1;
  return (
    <>
      <div className="row wrap s">
        {systems.map(({ unitNumber, system, answer, note: systemNote }) => (
          <span key={`${unitNumber} ${system}`} className="row">
            <Mark name={answer} size={16} />
            <span>
              {hasUnits ? `${t('common.unit', { number: unitNumber })}, ` : null}
              {t(`common.systems.${system}`)} {t(`marks.${answer}`)}
              {systemNote ? <span className="mid">: {systemNote}</span> : null}
            </span>
          </span>
        ))}
      </div>
      {note ? <div className="s mid">{note}</div> : null}
    </>
  );
}
