import { useInfiniteQuery, useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Numeral } from '../../../components/numeral';
import { QueryState } from '../../../lib/query-state';
import { useTimeWords } from '../../../lib/time';
import { useLedgerWords } from '../../threads/ledger-words';
import { lotLedgerCheckQuery, lotLedgerQuery } from '../api/lot-ledger';

/** What changed on the lot, newest first, and whether any entry was altered since. */
export function Changes({ lotId, zone }: { lotId: string; zone: string }): ReactNode {
  const { t } = useTranslation('lots');
  const words = useTimeWords();
  const ledgerWords = useLedgerWords();
  const changes = useInfiniteQuery(lotLedgerQuery(lotId));
  return (
    <section className="title-part" aria-label={t('changes.title')}>
      <div className="spread title-part-head">
        <h2 className="lab">{t('changes.title')}</h2>
        <Verdict lotId={lotId} />
      </div>
      <QueryState query={changes}>
        {({ pages }) => (
          <ol className="changes" reversed>
            {pages
              .flatMap(({ items }) => items)
              .map((entry) => (
                <li key={entry.sequence}>
                  <span className="n mut">{entry.sequence}</span>
                  <span className="mid nw">
                    <Numeral text={words.day(entry.at, zone)} />
                  </span>
                  <span>
                    <Numeral text={ledgerWords(entry, zone)} />
                  </span>
                  <span className="mid" title={entry.actorName ?? undefined}>
                    {initials(entry.actorName)} <span className="hidden-words">{entry.actorName}</span>
                  </span>
                </li>
              ))}
          </ol>
        )}
      </QueryState>
      {changes.hasNextPage ? (
        <button type="button" className="link-act s" onClick={() => void changes.fetchNextPage()}>
          {t('changes.more')}
        </button>
      ) : null}
    </section>
  );
}

function initials(name: string | null): string {
  return (name ?? '')
    .split(/\s+/)
    .map((part) => part.charAt(0))
    .join('')
    .slice(0, 3);
}

/** "41 entries, no entry altered": worked out anew by the server each time it is read. */
function Verdict({ lotId }: { lotId: string }): ReactNode {
  const { t } = useTranslation('lots');
  const check = useQuery(lotLedgerCheckQuery(lotId));
  if (check.data === undefined) return check.isError ? <span className="xs mid">{t('changes.notChecked')}</span> : null;
  const { isWhole, entries, firstBroken } = check.data;
  return isWhole ? (
    <span className="xs t-green b">{t('changes.whole', { count: entries })}</span>
  ) : (
    <span className="xs t-red b" role="alert">
      {t('changes.altered', { entry: firstBroken ?? 0 })}
    </span>
  );
}
