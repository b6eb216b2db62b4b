import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Numeral } from '../../../components/numeral';
import { useNow } from '../../../lib/clock';
import { QueryState } from '../../../lib/query-state';
import { useLotLive } from '../../../lib/realtime';
import { visitQuery } from '../api/visit';
import { MoveForm } from './move-form';
import { PlaceForm } from './place-form';
import { SidePanel } from './side-panel';
import { VisitActs } from './visit-acts';
import { VisitFacts } from './visit-facts';

export interface VisitPanelProps {
  visitId: string;
  onClose: () => void;
  /** The day a request is placed on, where the page is about one. */
  placeDate?: string;
  /** More below: a board's own lists. */
  children?: ReactNode;
}

/** One visit beside the page: how it stands, and the moves the server lets its reader make. */
export function VisitPanel({ visitId, onClose, placeDate, children }: VisitPanelProps): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  const query = useQuery(visitQuery(visitId));
  const visit = query.data;
  useLotLive(visit?.lotId);
  return (
    <SidePanel
      label={visit === undefined ? t('visit.label') : (visit.tractName ?? visit.address)}
      title={visit === undefined ? t('visit.label') : <Numeral text={t('common.lot', { number: visit.lotNumber })} />}
      onClose={onClose}
    >
      <QueryState query={query}>
        {(known) => <OneVisit key={known.id} visit={known} placeDate={placeDate} onDone={onClose} />}
      </QueryState>
      {children}
    </SidePanel>
  );
}

function OneVisit({
  visit,
  placeDate,
  onDone,
}: {
  visit: VisitSummary;
  placeDate?: string;
  onDone: () => void;
}): ReactNode {
  const now = useNow();
  const [isMoving, setIsMoving] = useState(false);
  if (isMoving && visit.moves.includes('move')) {
    return <MoveForm visit={visit} onKeep={() => setIsMoving(false)} onMoved={() => setIsMoving(false)} />;
  }
  return (
    <>
      <VisitFacts visit={visit} now={now} />
      {visit.moves.includes('place') ? (
        <PlaceForm visit={visit} date={placeDate ?? visit.window.date} onPlaced={onDone} />
      ) : null}
      <VisitActs visit={visit} onMove={() => setIsMoving(true)} onEnded={onDone} />
    </>
  );
}
