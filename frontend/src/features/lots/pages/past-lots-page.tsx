import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Act } from '../../../components/act';
import { Head, PhoneHead } from '../../../components/head';
import { Numeral } from '../../../components/numeral';
import { Plain } from '../../../components/plain';
import { useSheetWidth } from '../../../components/use-sheet-width';
import { QueryState } from '../../../lib/query-state';
import { useTimeWords } from '../../../lib/time';
import { pastLotsQuery } from '../api/handovers';
import '../lots.css';

const ownZone = Intl.DateTimeFormat().resolvedOptions().timeZone;

/** Lots that went to another plumber or builder, whose evidence until then stays readable. */
export function PastLotsPage(): ReactNode {
  const { t } = useTranslation('lots');
  const words = useTimeWords();
  const isPhone = useSheetWidth() === 'phone';
  const lots = useQuery(pastLotsQuery());
  return (
    <>
      {isPhone ? (
        <PhoneHead backTo="/lots" label={t('head.label')} title={t('past.title')} />
      ) : (
        <Head
          label={t('head.label')}
          title={t('past.title')}
          cells={[{ label: t('consents.count'), value: lots.data?.items.length ?? '' }]}
        />
      )}
      <QueryState query={lots}>
        {({ items }) =>
          items.length === 0 ? (
            <Plain kind="empty" title={t('past.emptyTitle')} acts={<Act to="/lots">{t('form.toLots')}</Act>}>
              {t('past.emptyText')}
            </Plain>
          ) : (
            <table className="ruled">
              <thead>
                <tr>
                  <th scope="col">{t('table.lot')}</th>
                  <th scope="col">{t('title.address')}</th>
                  <th scope="col">{t('past.until')}</th>
                  <th scope="col">{t('past.wentTo')}</th>
                </tr>
              </thead>
              <tbody>
                {items.map((lot) => (
                  <tr key={lot.lotId}>
                    <th scope="row">
                      <Link to={`/past-lots/${lot.lotId}`}>
                        <span className="n">{lot.lotNumber}</span> {lot.tractName ?? ''}
                      </Link>
                    </th>
                    <td data-label={t('title.address')}>{lot.address}</td>
                    <td data-label={t('past.until')}>
                      <Numeral text={words.dayClock(lot.until, lot.zone ?? ownZone)} />
                    </td>
                    <td data-label={t('past.wentTo')}>{lot.replacedByName}</td>
                  </tr>
                ))}
              </tbody>
            </table>
          )
        }
      </QueryState>
    </>
  );
}
