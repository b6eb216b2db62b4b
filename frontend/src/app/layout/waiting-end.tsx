import type { WaitingItem } from '@holdwater/shared-types/visits/calendar.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { RibbonEnd } from '../../drawings/week-ribbon';
import { useTimeWords, type TimeWords } from '../../lib/time';
import { useWaiting } from './counts';

/** The right end of the ribbon: how much waits on you, and the two most pressing lines. */
export function WaitingEnd(): ReactNode {
  const { t } = useTranslation('app');
  const words = useTimeWords();
  const waiting = useWaiting();
  const onYou = waiting.filter((item) => item.isOnYou);
  const total = onYou.reduce((sum, item) => sum + item.count, 0);
  const lines = waiting.slice(0, 2);
  if (lines.length === 0) return <span className="xs mut ribbon-rest">{t('waiting.nothing')}</span>;
  return (
    <RibbonEnd
      title={total > 0 ? t('waiting.onYou', { count: total }) : t('waiting.onOthers', { count: waiting.length })}
      lines={lines.map((item, index) => (
        <WaitingLine key={index} item={item} words={words} />
      ))}
    />
  );
}

function WaitingLine({ item, words }: { item: WaitingItem; words: TimeWords }): ReactNode {
  const { t } = useTranslation('app');
  const what = t(`waiting.kinds.${item.kind}`, { count: item.count, lot: item.lotNumber ?? '' });
  const by = item.by !== null && item.zone !== null ? t('waiting.by', { time: words.clock(item.by, item.zone) }) : '';
  const text = [item.isOnYou ? what : `${item.waitsOn}: ${what}`, by].filter((part) => part !== '').join(', ');
  const to = pathOf(item);
  const look = `xs ${item.isPastTime ? 't-red' : 'mid'}`;
  return to === null ? (
    <span className={look}>{text}</span>
  ) : (
    <Link className={look} to={to}>
      {text}
    </Link>
  );
}

/** Where what waits is done. */
function pathOf(item: WaitingItem): string | null {
  if (item.kind === 'consent-to-answer') return '/consents';
  if (item.kind === 'request-to-place') return '/requests';
  if (item.kind === 'visit-underway' && item.visitId !== null) return `/visits/${item.visitId}/outcome`;
  return item.lotId === null ? null : `/lots/${item.lotId}`;
}
