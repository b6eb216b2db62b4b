import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Numeral } from '../../../components/numeral';
import { useTimeWords } from '../../../lib/time';
import type { Requesting } from '../use-requesting';

export interface RequestActProps {
  requesting: Requesting;
  busy: boolean;
  onSend: () => void;
}

/** The one act of a request: it names what it books, or says what is missing. */
export function RequestAct({ requesting, busy, onSend }: RequestActProps): ReactNode {
  const { t } = useTranslation(['visits', 'common']);
  const words = useTimeWords();
  const { lots, asked, chosen, query } = requesting;
  const booking = query.data?.booking ?? 'self';
  const zone = query.data?.zone;
  const count = Math.max(lots.length, 1);
  if (chosen === null || zone === undefined || asked === null) {
    return (
      <Act kind="first" size="lg" wide cannotYet={t(missing(requesting))}>
        {t(`req.act.${booking}`, { count })}
      </Act>
    );
  }
  const { date, startAt, endAt } = chosen.window;
  const when = `${words.weekday(date)} ${words.window(startAt, endAt, zone)}`;
  return (
    <Act kind="first" size="lg" wide busy={busy} onClick={onSend}>
      <Numeral text={t(`req.actWhen.${booking}`, { count, when })} />
    </Act>
  );
}

function missing({ lots, asked, offers }: Requesting): string {
  if (lots.length === 0) return 'req.missing.lot';
  if (lots.some(({ fault, error }) => fault !== null || error !== null)) return 'req.missing.lotFault';
  if (asked === null) return 'req.missing.reading';
  return offers.length === 0 ? 'req.missing.offer' : 'req.missing.window';
}
