import type { Notice } from '@holdwater/shared-types/notices/notice.contract.js';
import { useEffect, useRef, useState } from 'react';
import { useMarkRead } from './api/mark-read';

/**
 * Opening the page reads what it shows. What was unread then stays marked as new as long as the page is open; those that come meanwhile are
 * read as they are shown.
 */
export function useReadOnOpening(notices: readonly Notice[]): ReadonlySet<string> {
  const { mutate } = useMarkRead();
  const sent = useRef(new Set<string>());
  const [fresh, setFresh] = useState<ReadonlySet<string>>(new Set());
  const unread = notices.filter(({ readAt }) => readAt === null).map(({ id }) => id);
  const key = unread.join(' ');
  useEffect(() => {
    const ids = key === '' ? [] : key.split(' ').filter((id) => !sent.current.has(id));
    if (ids.length === 0) return;
    ids.forEach((id) => sent.current.add(id));
    setFresh((before) => new Set([...before, ...ids]));
    // When it fails they are unread again next time, which is true.
    mutate(ids);
  }, [key, mutate]);
  return fresh;
}
