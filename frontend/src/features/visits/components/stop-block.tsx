import { useRef, useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { Act } from '../../../components/act';
import { Numeral } from '../../../components/numeral';
import { Question } from '../../../components/question';
import { isApiError } from '../../../lib/api-error';
import { localName, useLocale } from '../../../lib/i18n';
import { Failed } from '../../../lib/query-state';
import { useTimeWords } from '../../../lib/time';
import { useBeginVisit } from '../api/begin-visit';
import type { RunStop } from '../api/run';
import { startOf } from '../calendar-model';
import { beginBlock, directionsTo } from '../run-model';
import { EndQuestion } from './end-question';
import { StopCells } from './stop-cells';

/** A stop as a title block at the thumb: where, when, what must stand, the gate, the way there, and I am here. */
export function StopBlock({ stop, isNext, now }: { stop: RunStop; isNext: boolean; now: Date }): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  const words = useTimeWords();
  const locale = useLocale();
  const { visit } = stop;
  const where = [isNext ? t('run.next') : null, visit.address, localName(visit.stageName, locale)];
  return (
    <section className="stop-block" aria-label={t('common.lot', { number: visit.lotNumber })}>
      <div className="stop-head">
        <div className="grow">
          <div className="lab">{where.filter((part) => part !== null).join(', ')}</div>
          <h2 className="v">
            <Numeral text={t('common.lot', { number: visit.lotNumber })} />
            {visit.tractName === null ? null : `, ${visit.tractName}`}
          </h2>
        </div>
        <div>
          <div className="lab">{t('run.arrives')}</div>
          <div className="v">
            <Numeral text={words.clock(startOf(visit), visit.zone)} />
          </div>
        </div>
      </div>
      <StopCells stop={stop} />
      <StopActs stop={stop} now={now} />
    </section>
  );
}

function StopActs({ stop, now }: { stop: RunStop; now: Date }): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  const { visit } = stop;
  const [isReturning, setIsReturning] = useState(false);
  return (
    <>
      <div className="stop-acts">
        <a className="btn lg" href={directionsTo(stop)}>
          {t('run.directions')}
        </a>
        <BeginAct stop={stop} now={now} />
      </div>
      {visit.moves.includes('not-reached') ? (
        <div className="stop-acts">
          <Act onClick={() => setIsReturning(true)}>{t('end.not-reached.act')}</Act>
        </div>
      ) : null}
      {isReturning ? (
        <EndQuestion
          visit={visit}
          move="not-reached"
          onKeep={() => setIsReturning(false)}
          onEnded={() => setIsReturning(false)}
        />
      ) : null}
    </>
  );
}

/** Begins the visit and goes on to its outcome; before the window only from test up, and after one question. */
function BeginAct({ stop: { visit }, now }: { stop: RunStop; now: Date }): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  const words = useTimeWords();
  const navigate = useNavigate();
  const [isAsking, setIsAsking] = useState(false);
  const statement = useRef<{ clientId: string; madeAt: string } | null>(null);
  const beginning = useBeginVisit(() => void navigate(`/visits/${visit.id}/outcome`));
  if (visit.state === 'underway' || visit.state === 'closed') {
    return (
      <Act kind={visit.state === 'underway' ? 'first' : 'other'} size="lg" to={`/visits/${visit.id}/outcome`}>
        {t(visit.state === 'underway' ? 'run.goOn' : 'run.seeOutcome')}
      </Act>
    );
  }
  const block = beginBlock(visit, now.getTime());
  const opensAt = words.clock(visit.window.startAt, visit.zone);
  const isEarly = Date.parse(visit.window.startAt) > now.getTime();
  const begin = (): void => {
    // Pressed again after a lost answer it is the same statement, made when it was first made.
    statement.current ??= { clientId: crypto.randomUUID(), madeAt: new Date().toISOString() };
    beginning.mutate(
      { visitId: visit.id, expectedVersion: visit.version, ...statement.current },
      {
        onError: (error) => {
          if (!isApiError(error) || !error.isUndecided) statement.current = null;
        },
      },
    );
  };
  return (
    <>
      <Act
        kind="first"
        size="lg"
        busy={beginning.isPending}
        cannotYet={block === null ? undefined : t(`run.block.${block}`, { time: opensAt })}
        onClick={() => (isEarly ? setIsAsking(true) : begin())}
      >
        {t('run.here')}
      </Act>
      {beginning.error === null || isAsking ? null : <Failed error={beginning.error} level={3} />}
      <Question
        isOpen={isAsking}
        title={<Numeral text={t('run.early.title', { time: opensAt })} />}
        keepWord={t('run.early.keep')}
        endWord={t('run.early.start')}
        endKind="first"
        busy={beginning.isPending}
        error={beginning.error === null ? undefined : <Failed error={beginning.error} level={3} />}
        onKeep={() => setIsAsking(false)}
        onEnd={begin}
      >
        <Numeral
          text={t('run.early.text', {
            since: visit.upSince === null ? '' : words.dayClock(visit.upSince, visit.zone),
          })}
        />
      </Question>
    </>
  );
}
