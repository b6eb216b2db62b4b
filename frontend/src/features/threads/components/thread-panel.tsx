import { useQuery } from '@tanstack/react-query';
import { useLayoutEffect, useRef, useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Panel } from '../../../components/panel';
import { lotQuery } from '../../lots/api/lot';
import { useThread } from '../use-thread';
import { ThreadFilter, type ThreadView } from './thread-filter';
import { ThreadRule } from './thread-rule';
import { WriteBox } from './write-box';
import '../threads.css';

/** The thread of a lot as a part of its sheet: the newest at the bottom, the write box under it. */
export function ThreadPanel({ lotId }: { lotId: string }): ReactNode {
  const { t } = useTranslation('threads');
  const [view, setView] = useState<ThreadView>('all');
  const lot = useQuery(lotQuery(lotId));
  const zone = lot.data?.zone ?? Intl.DateTimeFormat().resolvedOptions().timeZone;
  const thread = useThread(lotId, zone, view === 'words');
  const place = useRef<HTMLDivElement>(null);
  const last = thread.lines?.at(-1)?.key;
  useLayoutEffect(() => {
    const shown = place.current;
    if (shown !== null && last !== undefined) shown.scrollTop = shown.scrollHeight;
  }, [last]);
  return (
    <Panel title={t('title')} side={<ThreadFilter view={view} onChange={setView} />} isFlush>
      {/* Scrolls by itself, so it can be reached by keyboard. */}
      <div className="thread-scroll" ref={place} tabIndex={0} role="region" aria-label={t('rule')}>
        <ThreadRule thread={thread} zone={zone} />
      </div>
      {lot.data?.abilities.canComment ? <WriteBox lotId={lotId} /> : null}
    </Panel>
  );
}
