import { useInfiniteQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Numeral } from '../../../components/numeral';
import { Panel } from '../../../components/panel';
import { QueryState } from '../../../lib/query-state';
import { useTimeWords } from '../../../lib/time';
import { useLedgerWords } from '../../threads/ledger-words';
import { pastLotLedgerQuery } from '../api/handovers';

/** What changed on a lot until it was handed over, newest first. */
export function PastChanges({ lotId, zone }: { lotId: string; zone: string }): ReactNode {
  const { t } = useTranslation('lots');
  const words = useTimeWords();
  const ledgerWords = useLedgerWords();
  const changes = useInfiniteQuery(pastLotLedgerQuery(lotId));
  return (
    <Panel title={t('past.changes')}>
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
                  <span className="mid">{entry.actorName ?? ''}</span>
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
    </Panel>
  );
}
