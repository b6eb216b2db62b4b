import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { EndQuestion, type EndMove } from './end-question';
import '../visit.css';

export interface VisitActsProps {
  visit: VisitSummary;
  /** Opens the choice of another window; without it there is no such act here. */
  onMove?: () => void;
  onEnded?: () => void;
}

const ends: readonly EndMove[] = ['withdraw', 'decline', 'not-reached', 'free-closure'];

/** The moves the server lets this reader make now, as acts. */
export function VisitActs({ visit, onMove, onEnded }: VisitActsProps): ReactNode {
  const { t } = useTranslation('visits');
  const [ending, setEnding] = useState<EndMove | null>(null);
  const can = (move: VisitSummary['moves'][number]): boolean => visit.moves.includes(move);
  const isTesting = can('say-test-up') || can('no-longer-up') || can('find-not-up');
  const isOnSite = can('close') || can('undo-begin') || can('begin');
  if (visit.moves.length === 0) return <p className="side-part s mid">{t('visit.noMoves')}</p>;
  return (
    <div className="side-part visit-acts">
      {isOnSite ? (
        <Act kind="first" to={can('begin') ? '/run' : `/visits/${visit.id}/outcome`}>
          {t(can('begin') ? 'visit.acts.run' : 'visit.acts.outcome')}
        </Act>
      ) : null}
      {isTesting ? (
        <Act to={`/lots/${visit.lotId}/test`}>{t(can('say-test-up') ? 'visit.acts.testUp' : 'visit.acts.notUp')}</Act>
      ) : null}
      {can('move') && onMove !== undefined ? <Act onClick={onMove}>{t('visit.acts.move')}</Act> : null}
      {ends.filter(can).map((move) => (
        <Act key={move} kind={move === 'not-reached' ? 'other' : 'ending'} onClick={() => setEnding(move)}>
          {t(`end.${move}.act`)}
        </Act>
      ))}
      {ending === null ? null : (
        <EndQuestion visit={visit} move={ending} onKeep={() => setEnding(null)} onEnded={() => onEnded?.()} />
      )}
    </div>
  );
}
