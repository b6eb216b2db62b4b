import type { Notice } from '@holdwater/shared-types/notices/notice.contract.js';
import { useInfiniteQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Head } from '../../../components/head';
import { Numeral } from '../../../components/numeral';
import { Plain } from '../../../components/plain';
import { localDateOf } from '../../../lib/local-days';
import { QueryState } from '../../../lib/query-state';
import { useTimeWords } from '../../../lib/time';
import { noticesQuery } from '../api/notices';
import { NoticeRow } from '../components/notice-row';
import { useReadOnOpening } from '../use-read-on-opening';
import '../notices.css';

/** What the reader was told, newest first; opening the page reads it. */
export function NoticesPage(): ReactNode {
  const { t } = useTranslation(['notices', 'common']);
  const query = useInfiniteQuery(noticesQuery());
  const items = query.data?.pages.flatMap((page) => page.items) ?? [];
  const fresh = useReadOnOpening(items);
  return (
    <>
      <title>{`${t('title')} · Holdwater`}</title>
      <Head
        label={t('label')}
        title={t('title')}
        cells={[{ label: t('newOnes'), value: query.data === undefined ? '' : fresh.size }]}
      />
      <QueryState query={query}>{() => <NoticeDays items={items} fresh={fresh} />}</QueryState>
      {query.hasNextPage ? (
        <div className="more-row">
          <Act busy={query.isFetchingNextPage} onClick={() => void query.fetchNextPage()}>
            {t('common.more')}
          </Act>
        </div>
      ) : null}
    </>
  );
}

function NoticeDays({ items, fresh }: { items: readonly Notice[]; fresh: ReadonlySet<string> }): ReactNode {
  const { t } = useTranslation('notices');
  const time = useTimeWords();
  const zone = Intl.DateTimeFormat().resolvedOptions().timeZone;
  const days = [...new Set(items.map(({ at }) => localDateOf(at, zone)))];
  const today = localDateOf(new Date(), zone);
  if (items.length === 0) {
    return (
      <Plain kind="empty" title={t('empty.title')}>
        {t('empty.text')}
      </Plain>
    );
  }
  return days.map((day) => (
    <section key={day} aria-labelledby={`day-${day}`}>
      <h2 className="notice-day h3" id={`day-${day}`}>
        <Numeral text={time.date(day)} />
        {time.nearDay(day, today) === null ? null : <span className="mut">, {time.nearDay(day, today)}</span>}
      </h2>
      <ol>
        {items
          .filter(({ at }) => localDateOf(at, zone) === day)
          .map((notice) => (
            <NoticeRow key={notice.id} notice={notice} isNew={fresh.has(notice.id)} zone={zone} />
          ))}
      </ol>
    </section>
  ));
}
