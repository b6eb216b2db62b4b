import type { RouteAnswer } from '@holdwater/shared-types/common/route.js';
import type { readPastLot } from '@holdwater/shared-types/lots/handover.contract.js';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useParams } from 'react-router-dom';
import { Act } from '../../../components/act';
import { Head, PhoneHead } from '../../../components/head';
import { Lines } from '../../../components/lines';
import { Plain } from '../../../components/plain';
import { useSheetWidth } from '../../../components/use-sheet-width';
import { Failed } from '../../../lib/query-state';
import { useTimeWords } from '../../../lib/time';
import { pastLotQuery } from '../api/handovers';
import { PastChanges } from '../components/past-changes';
import { TestLog } from '../components/test-log';
import '../lots.css';

const ownZone = Intl.DateTimeFormat().resolvedOptions().timeZone;
/** Nothing is written here any more. */
const readsOnly = { canTest: false, canAddReading: false };

/** A lot handed over, for those who were on it: their tests and what changed, up to that moment. */
export function PastLotPage(): ReactNode {
  const { lotId = '' } = useParams();
  const lot = useQuery(pastLotQuery(lotId));
  if (lot.data !== undefined) return <PastLotSheet lot={lot.data} />;
  if (lot.isPending) return <Lines rows={8} />;
  return <Failed error={lot.error} level={1} onRetry={() => void lot.refetch()} />;
}

function PastLotSheet({ lot }: { lot: RouteAnswer<typeof readPastLot> }): ReactNode {
  const { t } = useTranslation(['lots', 'common']);
  const words = useTimeWords();
  const isPhone = useSheetWidth() === 'phone';
  const zone = lot.zone ?? ownZone;
  const title = t('common.lot', { number: lot.lotNumber });
  const place = [lot.tractName, lot.address].filter(Boolean).join(', ');
  const tests = [...lot.holds].sort((a, b) => b.startedAt.localeCompare(a.startedAt));
  return (
    <>
      {isPhone ? (
        <PhoneHead backTo="/past-lots" label={place} title={title} />
      ) : (
        <Head label={place} title={title} acts={<Act to="/past-lots">{t('past.all')}</Act>} />
      )}
      <Plain kind="none" title={t('past.gone', { former: lot.organizationName, name: lot.replacedByName })}>
        {t('past.goneText', { time: words.dayClock(lot.until, zone) })}
      </Plain>
      {tests.map((hold) => (
        <TestLog
          key={hold.id}
          lotId={lot.lotId}
          tests={[hold]}
          systemWord={t(`common.systems.${hold.system}`)}
          zone={zone}
          canAddReading={false}
          canTest={false}
          abilities={readsOnly}
        />
      ))}
      <PastChanges lotId={lot.lotId} zone={zone} />
    </>
  );
}
