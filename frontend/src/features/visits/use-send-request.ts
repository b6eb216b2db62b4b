import { requestVisits, type OfferedWindow } from '@holdwater/shared-types/visits/visit.contract.js';
import { useTranslation } from 'react-i18next';
import { sayDone } from '../../components/done-line';
import { isApiError, type ApiErrorCode } from '../../lib/api-error';
import { instantOf } from '../../lib/local-days';
import { useTimeWords } from '../../lib/time';
import { useContractForm } from '../../lib/use-contract-form';
import { useRequestVisits } from './api/request-visits';
import type { RequestWords } from './components/request-more';
import type { Requesting } from './use-requesting';

export interface SendRequest {
  readonly send: (window: OfferedWindow | undefined) => void;
  readonly isPending: boolean;
  /** Why it did not go through; null when the reason stands under its field. */
  readonly error: unknown;
  readonly faultOf: (name: string) => string | undefined;
}

/** The window is gone: none is chosen until the reader chooses again. */
const goneCodes: readonly ApiErrorCode[] = [
  'window-full',
  'window-past',
  'window-closed',
  'window-unknown',
  'cut-off-passed',
];

interface Sending {
  readonly requesting: Requesting;
  readonly values: RequestWords;
  readonly hasCaller: boolean;
  readonly onSent: () => void;
}

/** Sends a request of one window for all lots chosen, after the contract's own look at what was typed. */
export function useSendRequest({ requesting, values, hasCaller, onSent }: Sending): SendRequest {
  const { t } = useTranslation(['visits', 'common']);
  const words = useTimeWords();
  const form = useContractForm(requestVisits.body, {});
  const { asked, choose, query } = requesting;
  const zone = query.data?.zone ?? 'UTC';
  const asking = useRequestVisits(({ visits }) => {
    const [first] = visits;
    if (first === undefined) return;
    const isBooked = visits.every(({ state }) => state !== 'requested');
    const when = words.dayWindow(first.window.startAt, first.window.endAt, first.zone);
    sayDone({
      mark: isBooked ? 'booked' : 'requested',
      title: t(isBooked ? 'done.booked' : 'done.requested', { count: visits.length, when }),
      text: t('done.told'),
    });
    onSent();
  });

  const send = (window: OfferedWindow | undefined): void => {
    if (asked === null || window === undefined) return;
    const body = { ...asked, date: window.date, label: window.label, ...wordsOf(values, hasCaller, zone) };
    if (!form.check(body)) return focusFault();
    asking.mutate(body, {
      onError: (error) => {
        form.takeError(error);
        if (isApiError(error) && goneCodes.includes(error.code)) choose(null);
      },
    });
  };
  const isAtField = isApiError(asking.error) && Object.keys(asking.error.fields).some((name) => form.faultOf(name));
  return { send, isPending: asking.isPending, error: isAtField ? null : asking.error, faultOf: form.faultOf };
}

/** Half a need-by time is sent as it is, so that the contract refuses it by name. */
function wordsOf(values: RequestWords, hasCaller: boolean, zone: string) {
  const { callerName, note, neededDate, neededTime } = values;
  return {
    ...(hasCaller && { callerName }),
    ...(note.trim() !== '' && { note }),
    ...(neededDate !== '' && { neededBy: neededTime === '' ? neededDate : instantOf(neededDate, neededTime, zone) }),
  };
}

function focusFault(): void {
  // After the faults are drawn.
  requestAnimationFrame(() =>
    document.querySelector<HTMLElement>('.side [aria-invalid], .side-page [aria-invalid]')?.focus(),
  );
}
