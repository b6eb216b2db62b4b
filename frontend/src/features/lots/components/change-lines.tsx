import type { LedgerEntry } from '@holdwater/shared-types/ledger/ledger.contract.js';
import type { InfiniteData, UseInfiniteQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Numeral } from '../../../components/numeral';
import { QueryState } from '../../../lib/query-state';
import { useTimeWords } from '../../../lib/time';
import { useLedgerWords } from '../../threads/ledger-words';

export interface ChangeLinesProps {
  changes: UseInfiniteQueryResult<InfiniteData<{ items: LedgerEntry[] }>>;
  zone: string;
  /** Who did it, as there is room for. */
  who: (name: string | null) => ReactNode;
}

/** Entries of a lot's ledger, newest first, some at a time. */
export function ChangeLines({ changes, zone, who }: ChangeLinesProps): ReactNode {
  const { t } = useTranslation('lots');
  const words = useTimeWords();
  const ledgerWords = useLedgerWords();
  return (
    <>
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
                  <span className="mid">{who(entry.actorName)}</span>
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
    </>
  );
}
