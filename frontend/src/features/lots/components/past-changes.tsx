import { useInfiniteQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Panel } from '../../../components/panel';
import { pastLotLedgerQuery } from '../api/handovers';
import { ChangeLines } from './change-lines';

/** What changed on a lot until it was handed over, newest first. */
export function PastChanges({ lotId, zone }: { lotId: string; zone: string }): ReactNode {
  const { t } = useTranslation('lots');
  const changes = useInfiniteQuery(pastLotLedgerQuery(lotId));
  return (
    <Panel title={t('past.changes')}>
      <ChangeLines changes={changes} zone={zone} who={(name) => name} />
    </Panel>
  );
}
