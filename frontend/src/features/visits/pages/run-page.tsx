import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useSearchParams } from 'react-router-dom';
import { Act } from '../../../components/act';
import { Head, PhoneHead } from '../../../components/head';
import { Lines } from '../../../components/lines';
import { Numeral } from '../../../components/numeral';
import { Plain } from '../../../components/plain';
import { useNow } from '../../../lib/clock';
import { QueryState } from '../../../lib/query-state';
import { useCoversDates, useShownDate } from '../../../lib/shown-date';
import { useTimeWords } from '../../../lib/time';
import { useIsPhone } from '../../../lib/use-media';
import { runQuery, type Run } from '../api/run';
import { NoDepartment } from '../components/no-department';
import { StaleStrip } from '../components/stale-strip';
import { StopBlock } from '../components/stop-block';
import { StopRoad } from '../components/stop-road';
import { doneCount, nextStop, stopCount } from '../run-model';
import { useOwnDepartment } from '../use-own-department';
import '../run.css';

/** An inspector's day: the own one, or for the desk that of the inspector in the address. */
export function RunPage(): ReactNode {
  const department = useOwnDepartment();
  return department === null ? <NoDepartment /> : <DayRun key={department.id} departmentId={department.id} />;
}

function DayRun({ departmentId }: { departmentId: string }): ReactNode {
  const now = useNow();
  const [search] = useSearchParams();
  const [shownDate] = useShownDate();
  const inspectorId = search.get('inspector') ?? undefined;
  const query = useQuery(runQuery({ departmentId, date: shownDate ?? undefined, inspectorId }));
  const date = query.data?.date ?? shownDate;
  useCoversDates(date, date);
  return (
    <QueryState query={query} loading={<Lines rows={7} hasVessel />}>
      {(run) => (
        <>
          <RunHead run={run} now={now} />
          <StaleStrip error={query.error} readAtMs={query.dataUpdatedAt} zone={run.zone}>
            <StaleRun />
          </StaleStrip>
          {run.stops.length === 0 ? <NoStops /> : <Stops run={run} now={now} />}
        </>
      )}
    </QueryState>
  );
}

function RunHead({ run, now }: { run: Run; now: Date }): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  const isPhone = useIsPhone();
  const progress = t('run.progress', { done: doneCount(run.stops), count: stopCount(run.stops) });
  const title = t('run.title', { day: words.date(run.date) });
  const clock = words.clock(now, run.zone);
  if (isPhone) {
    return (
      <PhoneHead
        label={`${run.inspector.name}, ${progress}`}
        title={<Numeral text={title} />}
        right={
          <span className="run-now">
            <span className="lab">{t('run.nowLabel')}</span>
            <span className="t-primer">
              <Numeral text={clock} />
            </span>
          </span>
        }
      />
    );
  }
  return (
    <Head
      label={run.inspector.name}
      title={<Numeral text={title} />}
      cells={[
        { label: t('run.stops'), value: <Numeral text={progress} /> },
        { label: t('cal.zone'), value: words.zone(run.zone, now) },
        { label: t('run.nowLabel'), value: <Numeral text={clock} /> },
      ]}
    />
  );
}

function StaleRun(): ReactNode {
  return useTranslation('visits').t('stale.run');
}

function NoStops(): ReactNode {
  const { t } = useTranslation('visits');
  return (
    <Plain kind="empty" title={t('run.noneTitle')} acts={<Act to="/calendar">{t('run.toCalendar')}</Act>}>
      {t('run.noneText')}
    </Plain>
  );
}

/** Road and stop: on a phone the stop stands at the thumb under the road, else beside it. */
function Stops({ run, now }: { run: Run; now: Date }): ReactNode {
  const { t } = useTranslation('visits');
  const [search, setSearch] = useSearchParams();
  const next = nextStop(run.stops);
  const picked = run.stops.find(({ visit }) => visit.id === search.get('stop'));
  const shown = picked ?? next;
  const pick = (visitId: string): void => {
    const after = new URLSearchParams(search);
    after.set('stop', visitId);
    setSearch(after, { replace: true });
  };
  return (
    <div className="run">
      <div className="run-road">
        <StopRoad run={run} now={now} onOpen={pick} />
      </div>
      {shown === null ? (
        <div className="stop-block">
          <Plain kind="empty" level={2} mark="sent" title={t('run.allDoneTitle')}>
            {t('run.allDoneText')}
          </Plain>
        </div>
      ) : (
        <StopBlock key={shown.visit.id} stop={shown} isNext={shown.visit.id === next?.visit.id} now={now} />
      )}
    </div>
  );
}
