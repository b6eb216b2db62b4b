import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import { useQuery } from '@tanstack/react-query';
import { useLayoutEffect, useRef, useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useParams } from 'react-router-dom';
import { Mark } from '../../../components/mark';
import { isMarkName } from '../../../components/mark-names';
import { Numeral } from '../../../components/numeral';
import { TaskHead } from '../../../components/task-head';
import { QueryState } from '../../../lib/query-state';
import { useTimeWords } from '../../../lib/time';
import { lotQuery } from '../../lots/api/lot';
import { ThreadFilter, type ThreadView } from '../components/thread-filter';
import { ThreadRule } from '../components/thread-rule';
import { WriteBox } from '../components/write-box';
import { useThread } from '../use-thread';
import '../threads.css';

/** The thread of a lot on a page of its own. */
export function ThreadPage(): ReactNode {
  const { t } = useTranslation(['threads', 'common']);
  const { lotId = '' } = useParams();
  const lot = useQuery(lotQuery(lotId));
  const name = lot.data === undefined ? '' : t('common.lot', { number: lot.data.number });
  return (
    <div className="thread-page">
      <TaskHead
        backTo={`/lots/${lotId}`}
        label={[name, lot.data?.tract?.name ?? lot.data?.address].filter(Boolean).join(', ')}
        title={t('title')}
      />
      <QueryState query={lot}>{(detail) => <LotThread lot={detail} />}</QueryState>
    </div>
  );
}

function LotThread({ lot }: { lot: LotDetail }): ReactNode {
  const [view, setView] = useState<ThreadView>('all');
  const zone = lot.zone ?? Intl.DateTimeFormat().resolvedOptions().timeZone;
  const thread = useThread(lot.id, zone, view === 'words');
  const end = useRef<HTMLDivElement>(null);
  const last = thread.lines?.at(-1)?.key;
  useLayoutEffect(() => {
    if (last !== undefined) end.current?.scrollIntoView({ block: 'end' });
  }, [last, view]);
  return (
    <>
      <div className="thread-strip">
        <VisitWords lot={lot} />
        <ThreadFilter view={view} onChange={setView} />
      </div>
      <div className="thread-body">
        <ThreadRule thread={thread} zone={zone} />
        <div ref={end} className="thread-end" />
      </div>
      {lot.abilities.canComment ? (
        <div className="thread-foot">
          <WriteBox lotId={lot.id} />
        </div>
      ) : null}
    </>
  );
}

/** "Test up, visit Wed, Apr 15, 9:00 am": what the words are about now. */
function VisitWords({ lot }: { lot: LotDetail }): ReactNode {
  const { t } = useTranslation(['threads', 'marks']);
  const time = useTimeWords();
  const visit = lot.nextVisit;
  if (visit === null) return <p className="grow mid">{t('noVisit')}</p>;
  const mark = isMarkName(visit.state) ? visit.state : 'booked';
  const isUp = visit.state === 'ready';
  return (
    <p className={isUp ? 'grow row b t-water' : 'grow row'}>
      <Mark name={mark} size={24} />
      <span>
        <Numeral text={t('visit', { state: t(`marks.${mark}`), at: time.dayClock(visit.startAt, visit.zone) })} />
      </span>
    </p>
  );
}
