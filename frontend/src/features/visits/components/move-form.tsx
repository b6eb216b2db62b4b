import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Numeral } from '../../../components/numeral';
import { Plain } from '../../../components/plain';
import { QueryState } from '../../../lib/query-state';
import { useTimeWords } from '../../../lib/time';
import { useMoveVisit } from '../api/move-visit';
import { windowKey } from '../offer-reasons';
import { useMoveWindows } from '../use-move-windows';
import { TakenWindow } from './taken-window';
import { WindowChoice, type ChoosableWindow } from './window-choice';

export interface MoveFormProps {
  visit: VisitSummary;
  onKeep: () => void;
  onMoved: () => void;
}

/** How many windows are shown before more are asked for. */
const shownAtFirst = 8;

/** Another window for the same visit: the calendar entry stays the same one. */
export function MoveForm({ visit, onKeep, onMoved }: MoveFormProps): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  const words = useTimeWords();
  const [key, setKey] = useState<string | null>(null);
  const [isAll, setIsAll] = useState(false);
  const query = useMoveWindows(visit);
  const lot = t('common.lot', { number: visit.lotNumber });
  const inline = t('word.lot', { number: visit.lotNumber });
  const moving = useMoveVisit((moved) => {
    const to = words.dayWindow(moved.window.startAt, moved.window.endAt, moved.zone);
    sayDone({
      mark: moved.state === 'requested' ? 'requested' : 'booked',
      title: t('move.done', { lot, to }),
      text: t('done.told'),
    });
    onMoved();
  });
  const move = ({ date, label }: Pick<ChoosableWindow, 'date' | 'label'>): void =>
    moving.mutate({ visitId: visit.id, expectedVersion: visit.version, date, label });
  return (
    <div>
      <p className="side-part">
        <span className="lab">{t('move.from')}</span>
        <Numeral text={words.dayWindow(visit.window.startAt, visit.window.endAt, visit.zone)} />
      </p>
      <TakenWindow
        error={moving.error}
        zone={visit.zone}
        actWord={t('move.here')}
        busy={moving.isPending}
        onTake={move}
      />
      <QueryState query={query}>
        {(windows) => {
          const shown = isAll ? windows : windows.slice(0, shownAtFirst);
          const chosen = windows.find((window) => windowKey(window) === key);
          return (
            <>
              {windows.length === 0 ? (
                <Plain kind="empty" level={3} title={t('move.noneTitle')}>
                  {t('move.noneText', { department: visit.departmentName })}
                </Plain>
              ) : (
                <WindowChoice label={t('move.to')} windows={shown} value={key} zone={visit.zone} onChoose={setKey} />
              )}
              {windows.length > shown.length ? (
                <Act kind="text" size="sm" onClick={() => setIsAll(true)}>
                  {t('offer.more', { count: windows.length - shown.length })}
                </Act>
              ) : null}
              <div className="side-part visit-acts">
                <Act
                  kind="first"
                  size="lg"
                  busy={moving.isPending}
                  cannotYet={chosen === undefined ? t('req.missing.window') : undefined}
                  onClick={() => (chosen === undefined ? undefined : move(chosen))}
                >
                  <Numeral
                    text={
                      chosen === undefined
                        ? t('move.act', { lot: inline })
                        : t('move.actTo', {
                            lot: inline,
                            to: words.dayWindow(chosen.startAt, chosen.endAt, visit.zone),
                          })
                    }
                  />
                </Act>
                <Act onClick={onKeep}>{t('move.keep')}</Act>
              </div>
            </>
          );
        }}
      </QueryState>
    </div>
  );
}
