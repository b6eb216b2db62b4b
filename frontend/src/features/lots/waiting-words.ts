import type { WaitingItem } from '@holdwater/shared-types/visits/calendar.contract.js';
import { useCallback } from 'react';
import { useTranslation } from 'react-i18next';
import type { MarkName } from '../../components/mark-names';
import { useTimeWords } from '../../lib/time';
import type { LotRow } from './lots-model';

/** The lozenge of what waits: on the reader, on another, or past its time. */
export function waitingMark({ isPastTime, isOnYou }: WaitingItem): MarkName {
  if (isPastTime) return 'past-time';
  return isOnYou ? 'waits-on-you' : 'waits-on';
}

/** "waits on Ruben, up by 7:00 am". */
export function useWaitingWords(): (item: WaitingItem) => string {
  const { t } = useTranslation('lots');
  const words = useTimeWords();
  return useCallback(
    (item) => {
      const who = item.isOnYou ? t('waits.you') : t('waits.other', { name: item.waitsOn });
      const by =
        item.by === null || item.zone === null ? '' : t('waits.by', { time: words.dayClock(item.by, item.zone) });
      return [`${who}: ${t(`waits.kinds.${item.kind}`, { count: item.count })}`, by]
        .filter((one) => one !== '')
        .join(', ');
    },
    [t, words],
  );
}

/** Where a lot stands at the stage shown, in a few words. */
export function useStandsWords(): (row: LotRow) => string {
  const { t } = useTranslation('lots');
  return useCallback(
    ({ lot, state }) => {
      if (lot.departmentId === null) return t('stands.noDepartment');
      if (lot.openCorrections > 0) return t('stands.openCorrections', { count: lot.openCorrections });
      if (state === 'clear') return t('stands.clear');
      if (state === 'put-back-due') return t('stands.putBack');
      const visit = lot.nextVisit;
      if (visit === null) return t(state === 'under-test' ? 'stands.standingNoWindow' : 'stands.noWindow');
      if (visit.state === 'booked') return t(state === 'under-test' ? 'stands.partUp' : 'stands.nothingUp');
      return t(`stands.visit.${visit.state}`);
    },
    [t],
  );
}
