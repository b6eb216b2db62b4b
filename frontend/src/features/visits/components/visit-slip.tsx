import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Numeral } from '../../../components/numeral';
import { Slip } from '../../../components/slip';
import { useTimeWords } from '../../../lib/time';
import { startOf } from '../calendar-model';
import { isOpen, useVisitLook } from '../visit-look';

export interface VisitSlipProps {
  visit: VisitSummary;
  now: Date;
  form?: 'desk' | 'phone';
  /** Tells tract and time beside the lot: where the place on the page does not. */
  isFull?: boolean;
  /** Added to the state's word: the department, where there are several. */
  also?: string;
  isChosen?: boolean;
  tabIndex?: number;
  onOpen?: (visitId: string) => void;
}

/** A visit as a slip with its sight glass. Its name for assistive readers says lot, state, time and who comes. */
export function VisitSlip(props: VisitSlipProps): ReactNode {
  const { visit, now, form, isFull = false, also, isChosen, tabIndex, onOpen } = props;
  const look = useVisitLook()(visit, now);
  const name = useVisitName()(visit, look.word);
  const { t } = useTranslation('common');
  const words = useTimeWords();
  const time = visit.plannedStartAt === null ? undefined : words.clock(visit.plannedStartAt, visit.zone);
  return (
    <Slip
      title={<Numeral text={t('lot', { number: visit.lotNumber })} />}
      place={isFull ? (visit.tractName ?? visit.address) : undefined}
      time={isFull && time !== undefined ? <Numeral text={time} /> : undefined}
      state={look.mark}
      share={look.share}
      word={also === undefined ? look.word : `${look.word}, ${also}`}
      tone={look.tone}
      waits={look.waits}
      corrections={visit.openCorrections > 0 ? visit.openCorrections : undefined}
      form={form}
      isChosen={isChosen}
      isPast={!isOpen(visit)}
      tabIndex={tabIndex}
      aria-label={name}
      onOpen={onOpen === undefined ? undefined : () => onOpen(visit.id)}
    />
  );
}

/** "Lot 17, Sorrel Bench, test up, 9:15 am, Noor Haverty" */
export function useVisitName(): (visit: VisitSummary, word: string) => string {
  const { t } = useTranslation(['visits', 'common', 'marks']);
  const words = useTimeWords();
  return (visit, word) => {
    const parts = [
      t('common.lot', { number: visit.lotNumber }),
      visit.tractName ?? visit.address,
      word,
      words.clock(startOf(visit), visit.zone),
      visit.inspector?.name,
      visit.openCorrections > 0 ? t('marks.page.openCorrections', { count: visit.openCorrections }) : undefined,
    ];
    return parts.filter((part) => part !== undefined).join(', ');
  };
}
