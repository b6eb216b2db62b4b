import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Numeral } from '../../../components/numeral';
import { Question } from '../../../components/question';
import { StateWord } from '../../../components/state-word';
import { useNow } from '../../../lib/clock';
import { Failed } from '../../../lib/query-state';
import { useMe } from '../../../lib/session-context';
import { useTimeWords } from '../../../lib/time';
import { useStartVisit } from '../api/start-visit';

/** "Window opens 9:00 am; test up since Tue 5:08 pm. Start?" Another inspector's visit is taken over knowingly. */
export function StartStrip({ visit }: { visit: VisitSummary }): ReactNode {
  const { t } = useTranslation('outcomes');
  const time = useTimeWords();
  const now = useNow();
  const me = useMe();
  const [isAsking, setIsAsking] = useState(false);
  const starting = useStartVisit();
  const isAnothers = visit.inspector !== null && visit.inspector.id !== me.id;
  const isOpen = Date.parse(visit.window.startAt) <= now.getTime();
  const opens = time.dayClock(visit.window.startAt, visit.zone);
  const up =
    visit.upSince === null ? t('start.notUp') : t('start.upSince', { since: time.dayClock(visit.upSince, visit.zone) });
  const start = (isTakingOver: boolean): void =>
    starting.mutate(
      { visitId: visit.id, expectedVersion: visit.version, ...(isTakingOver ? { isTakingOver } : {}) },
      { onSettled: () => setIsAsking(false) },
    );
  const canBegin = visit.moves.includes('begin');
  return (
    <>
      <div className="start-strip wash-primer">
        <p className="grow">
          <Numeral text={t(isOpen ? 'start.opened' : 'start.opens', { at: opens, up })} />{' '}
          {canBegin ? <b>{t('start.ask')}</b> : <span className="mid">{t(whyNot(visit.state))}</span>}
          {isAnothers ? (
            <span className="row">
              <StateWord state="waits-on" word={t('start.anothers', { name: visit.inspector?.name ?? '' })} />
            </span>
          ) : null}
        </p>
        {canBegin ? (
          <Act
            kind="first"
            size="lg"
            busy={starting.isPending}
            onClick={() => (isAnothers ? setIsAsking(true) : start(false))}
          >
            {t(isAnothers ? 'start.takeOver' : 'start.act')}
          </Act>
        ) : null}
      </div>
      {starting.error === null ? null : <Failed error={starting.error} level={2} />}
      <Question
        isOpen={isAsking}
        title={t('start.overTitle', { name: visit.inspector?.name ?? '' })}
        keepWord={t('start.overKeep')}
        endWord={t('start.takeOver')}
        endKind="first"
        busy={starting.isPending}
        onKeep={() => setIsAsking(false)}
        onEnd={() => start(true)}
      >
        {t('start.overTold', { name: visit.inspector?.name ?? '' })}
      </Question>
    </>
  );
}

function whyNot(state: VisitSummary['state']): 'start.waitWindow' | 'start.notYours' {
  return state === 'booked' ? 'start.waitWindow' : 'start.notYours';
}
