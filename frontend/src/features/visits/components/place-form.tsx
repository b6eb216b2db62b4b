import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Field } from '../../../components/field';
import { Numeral } from '../../../components/numeral';
import { Plain } from '../../../components/plain';
import { QueryState } from '../../../lib/query-state';
import { useTimeWords } from '../../../lib/time';
import { dayBoardQuery, type DayBoard } from '../api/day-board';
import { usePlaceVisit } from '../api/place-visit';
import { windowKey } from '../offer-reasons';
import { TakenWindow } from './taken-window';
import { WindowChoice } from './window-choice';

export interface PlaceFormProps {
  visit: VisitSummary;
  /** The day it is placed on; the ribbon chooses another. */
  date: string;
  onPlaced: () => void;
}

/** Desk: places a request in a window of a day, with an inspector or the first free one. */
export function PlaceForm({ visit, date, onPlaced }: PlaceFormProps): ReactNode {
  const { t } = useTranslation('visits');
  const words = useTimeWords();
  const board = useQuery(dayBoardQuery(visit.departmentId, date));
  return (
    <section className="place" aria-label={t('place.title')}>
      <div className="side-part">
        <h3 className="h3">
          <Numeral text={t('place.on', { day: words.date(date) })} />
        </h3>
        <p className="s mid">
          {date === visit.window.date
            ? t('place.wishedDay')
            : t('place.otherDay', { day: words.date(visit.window.date) })}
        </p>
      </div>
      <QueryState query={board}>
        {(day) => <PlaceOnDay key={`${visit.id} ${date}`} visit={visit} board={day} onPlaced={onPlaced} />}
      </QueryState>
    </section>
  );
}

function PlaceOnDay({
  visit,
  board,
  onPlaced,
}: {
  visit: VisitSummary;
  board: DayBoard;
  onPlaced: () => void;
}): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  const words = useTimeWords();
  const { windows } = board.day;
  const wished = windows.find((window) => windowKey(window) === windowKey(visit.window) && window.isTakeable);
  const [key, setKey] = useState<string | null>(wished === undefined ? null : windowKey(wished));
  const [inspectorId, setInspectorId] = useState('');
  const chosen = windows.find((window) => windowKey(window) === key && window.isTakeable);
  const lot = t('common.lot', { number: visit.lotNumber });
  const inline = t('word.lot', { number: visit.lotNumber });
  const placing = usePlaceVisit((placed) => {
    const when = words.dayWindow(placed.window.startAt, placed.window.endAt, placed.zone);
    sayDone({
      mark: 'booked',
      title: t('place.done', { lot, when }),
      text: t('place.doneText', { name: placed.inspector?.name ?? '' }),
    });
    onPlaced();
  });
  const place = (window: { date: string; label: string }): void =>
    placing.mutate({
      visitId: visit.id,
      expectedVersion: visit.version,
      date: window.date,
      label: window.label,
      ...(inspectorId !== '' && { inspectorId }),
    });
  if (windows.length === 0) {
    return (
      <Plain kind="empty" level={3} title={t('place.closedTitle')}>
        {t('place.closedText')}
      </Plain>
    );
  }
  return (
    <>
      <TakenWindow
        error={placing.error}
        zone={board.zone}
        actWord={t('place.here')}
        busy={placing.isPending}
        onTake={place}
      />
      <WindowChoice
        label={t('place.window')}
        windows={windows}
        value={key}
        zone={board.zone}
        isOneDay
        onChoose={setKey}
      />
      <div className="side-part fields">
        <Field label={t('place.inspector')}>
          {(control) => (
            <select {...control} value={inspectorId} onChange={(event) => setInspectorId(event.target.value)}>
              <option value="">{t('place.firstFree')}</option>
              {board.inspectors.map((inspector) => (
                <option key={inspector.id} value={inspector.id}>
                  {t('place.inspectorLoad', {
                    name: inspector.name,
                    count: inspector.visits.filter(({ window }) => key === null || windowKey(window) === key).length,
                  })}
                </option>
              ))}
            </select>
          )}
        </Field>
        <Act
          kind="first"
          size="lg"
          wide
          busy={placing.isPending}
          cannotYet={chosen === undefined ? t('req.missing.window') : undefined}
          onClick={() => (chosen === undefined ? undefined : place(chosen))}
        >
          <Numeral
            text={
              chosen === undefined
                ? t('place.act', { lot: inline })
                : t('place.actAt', { lot: inline, when: words.dayWindow(chosen.startAt, chosen.endAt, board.zone) })
            }
          />
        </Act>
      </div>
    </>
  );
}
