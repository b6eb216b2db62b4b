import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useQuery } from '@tanstack/react-query';
import { useEffect, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Numeral } from '../../../components/numeral';
import { Plain } from '../../../components/plain';
import { StateWord } from '../../../components/state-word';
import { TaskHead } from '../../../components/task-head';
import { localName, useLocale } from '../../../lib/i18n';
import { QueryState } from '../../../lib/query-state';
import { useMe } from '../../../lib/session-context';
import { useTimeWords } from '../../../lib/time';
import { findStanding } from '../../holds/standing-tests';
import { visitOutcomeQuery } from '../../lots/api/visit-outcome';
import { dropKeptOutcome } from '../kept-outcome';
import { stageOf, subjectsOf } from '../outcome-draft';
import { useAsksWords } from '../use-asks-words';
import { OutcomeForm } from './outcome-form';
import { RecordedOutcome } from './recorded-outcome';
import { StartStrip } from './start-strip';

export interface VisitOutcomeProps {
  visit: VisitSummary;
  lot: LotDetail;
  holds: readonly Hold[];
  corrections: readonly Correction[];
  ruleCard: RuleCard;
}

/** In every other state nothing can be recorded any more, and what was typed is let go. */
const startable: readonly VisitSummary['state'][] = ['booked', 'ready', 'underway'];

/** What can be done with the visit now: start it, answer it, or read what was recorded. */
export function VisitOutcome(props: VisitOutcomeProps): ReactNode {
  const { visit, corrections, ruleCard } = props;
  const { t } = useTranslation('outcomes');
  const { id: personId } = useMe();
  const hasEnded = !startable.some((state) => state === visit.state);
  useEffect(() => {
    if (hasEnded) dropKeptOutcome({ personId, visitId: visit.id });
  }, [hasEnded, personId, visit.id]);
  const stage = stageOf(ruleCard.content, visit.stageCode);
  const head = <OutcomeHead visit={visit} />;
  if (visit.state === 'closed') return <Closed visit={visit} corrections={corrections} head={head} />;
  if (stage === null) {
    return (
      <>
        {head}
        <Plain kind="none" title={t('page.noStage')} />
      </>
    );
  }
  if (visit.state === 'underway' && visit.moves.includes('close'))
    return <OutcomeForm key={visit.id} {...props} stage={stage} head={head} />;
  if (visit.state === 'booked' || visit.state === 'ready') {
    return (
      <>
        {head}
        <StartStrip visit={visit} />
        <Asked {...props} />
      </>
    );
  }
  return (
    <>
      {head}
      <Plain
        kind="none"
        title={t(visit.state === 'underway' ? 'page.underwayTitle' : 'page.nothingTitle')}
        acts={<Act to={`/lots/${visit.lotId}`}>{t('page.toLot')}</Act>}
      >
        {t(visit.state === 'underway' ? 'page.underwayText' : 'page.nothingText', {
          name: visit.inspector?.name ?? visit.departmentName,
        })}
      </Plain>
    </>
  );
}

function OutcomeHead({ visit }: { visit: VisitSummary }): ReactNode {
  const { t } = useTranslation('outcomes');
  const time = useTimeWords();
  const locale = useLocale();
  const window = time.dayWindow(visit.window.startAt, visit.window.endAt, visit.zone);
  return (
    <TaskHead
      backTo="/run"
      label={[visit.address, localName(visit.stageName, locale)].join(', ')}
      title={<Numeral text={t('page.title', { lot: visit.lotNumber })} />}
      right={visit.state === 'closed' ? undefined : <StateWord state={visit.state} />}
      cells={[
        { label: t('page.window'), value: <Numeral text={window} /> },
        { label: t('page.zone'), value: time.zone(visit.zone) },
        { label: t('page.plumber'), value: visit.plumberName ?? t('page.noPlumber') },
      ]}
    />
  );
}

/** What the rule card asks of each system, before the visit is started. */
function Asked({ visit, holds, ruleCard }: VisitOutcomeProps): ReactNode {
  const { t } = useTranslation(['outcomes', 'common']);
  const asks = useAsksWords(ruleCard, visit.stageCode);
  const stage = stageOf(ruleCard.content, visit.stageCode);
  if (stage === null) return null;
  const hasUnits = visit.unitNumbers.length > 1;
  return (
    <ul className="asked">
      {subjectsOf(visit, stage).map((subject) => {
        const hold = findStanding(holds, subject, visit.stageCode);
        const name = t(`common.systems.${subject.system}`);
        return (
          <li key={`${subject.unitNumber}.${subject.system}`}>
            <StateWord
              state={hold === null ? 'booked' : 'ready'}
              size={24}
              word={hasUnits ? t('subject.ofUnit', { system: name, unit: subject.unitNumber }) : name}
            />
            <span className="s mid">
              <Numeral text={asks(subject.system, hold)} />
              {hold === null ? `, ${t('subject.noTest')}` : null}
            </span>
          </li>
        );
      })}
      <li>
        <StateWord state="not-looked-at" size={24} word={t('work.title')} />
        <span className="s mid">{t('work.points', { count: stage.work.length })}</span>
      </li>
    </ul>
  );
}

function Closed({
  visit,
  corrections,
  head,
}: {
  visit: VisitSummary;
  corrections: readonly Correction[];
  head: ReactNode;
}): ReactNode {
  const outcome = useQuery(visitOutcomeQuery(visit.lotId, visit.id));
  return (
    <>
      {head}
      <QueryState query={outcome}>
        {(recorded) => (
          <RecordedOutcome
            visit={visit}
            outcome={recorded}
            corrections={corrections.filter(({ visitId }) => visitId === visit.id)}
          />
        )}
      </QueryState>
    </>
  );
}
