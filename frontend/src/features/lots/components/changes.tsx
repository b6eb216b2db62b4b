import { useInfiniteQuery, useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { lotLedgerCheckQuery, lotLedgerQuery } from '../api/lot-ledger';
import { ChangeLines } from './change-lines';

/** What changed on the lot, newest first, and whether any entry was altered since. */
export function Changes({ lotId, zone }: { lotId: string; zone: string }): ReactNode {
  const { t } = useTranslation('lots');
  const changes = useInfiniteQuery(lotLedgerQuery(lotId));
  return (
    <section className="title-part" aria-label={t('changes.title')}>
      <div className="spread title-part-head">
        <h2 className="lab">{t('changes.title')}</h2>
        <Verdict lotId={lotId} />
      </div>
      <ChangeLines changes={changes} zone={zone} who={(name) => <Initials name={name} />} />
    </section>
  );
}

/** The title block is narrow: initials, with the name for whoever points at or hears them. */
function Initials({ name }: { name: string | null }): ReactNode {
  return (
    <span title={name ?? undefined}>
      {initials(name)} <span className="hidden-words">{name}</span>
    </span>
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
