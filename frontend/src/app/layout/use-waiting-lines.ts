import { useTranslation } from 'react-i18next';
import { useNow } from '../../lib/clock';
import { localDateOf } from '../../lib/local-days';
import { useTimeWords } from '../../lib/time';
import type { Calendar } from './ribbon-days';
import { countOf, lotsOf, waitingGroups, type WaitingGroup } from './waiting-groups';
import { useWaiting } from './counts';

export interface WaitingLine {
  readonly text: string;
  /** Where it is done; null where there is nothing to open. */
  readonly to: string | null;
  readonly isPastTime: boolean;
}

export interface WaitingWords {
  readonly title: string;
  readonly isOnYou: boolean;
  readonly lines: readonly WaitingLine[];
}

const dayMs = 24 * 3_600_000;

/** What waits in words: how much on the reader, or what others have not done, and the two most pressing lines. Null when nothing does. */
export function useWaitingWords(calendar: Calendar | undefined): WaitingWords | null {
  const { t } = useTranslation('app');
  const lineOf = useLineWords();
  const requestLines = useRequestLines(calendar);
  const groups = waitingGroups(useWaiting(), useNow());
  const onYou = groups.filter(({ isOnYou }) => isOnYou);
  const [first] = groups;
  if (first === undefined) return null;
  const isRequests = onYou.length > 0 && onYou.every(({ kind }) => kind === 'request-to-place');
  const title =
    onYou.length === 0
      ? t(`waiting.titles.${first.kind}`, { count: countOf(groups.filter(({ kind }) => kind === first.kind)) })
      : t(isRequests ? 'waiting.requestsOnYou' : 'waiting.onYou', { count: countOf(onYou) });
  const lines = groups.flatMap((group) => {
    const own = isRequests && group.isOnYou ? requestLines(group) : [];
    return own.length > 0 ? own : [lineOf(group)];
  });
  return { title, isOnYou: onYou.length > 0, lines: lines.slice(0, 2) };
}

/** A clock time of the next 24 hours by itself, of another day with it. */
function useSoonWords(): (at: string, zone: string) => string {
  const words = useTimeWords();
  const now = useNow();
  return (at, zone) => {
    const isNear = Math.abs(Date.parse(at) - now.getTime()) < dayMs;
    const clock = words.clock(at, zone);
    return isNear ? clock : `${words.weekday(localDateOf(at, zone))} ${clock}`;
  };
}

function useLineWords(): (group: WaitingGroup) => WaitingLine {
  const { t } = useTranslation('app');
  const soon = useSoonWords();
  return (group) => {
    const { kind, isOnYou, waitsOn, by, isPastTime, count } = group;
    const { shown, more } = lotsOf(group);
    const numbers = `${shown.join(', ')}${more > 0 ? ` +${more}` : ''}`;
    const lots = t('waiting.lots', { lots: numbers, count: shown.length + more });
    const at = by === null ? '' : t('waiting.by', { time: soon(by.at, by.zone) });
    const what = isOnYou
      ? t(`waiting.kinds.${kind}`, { count, lots })
      : kind === 'test-not-up' && by !== null
        ? numbers
        : t(`waiting.theirs.${kind}`, { count, lots: numbers });
    const told = isOnYou ? what : t('waiting.ofName', { name: shortName(waitsOn), what });
    return { text: [told, at].filter((part) => part !== '').join(', '), to: pathOf(group), isPastTime };
  };
}

/** To the desk what presses about the requests: those with a need-by time, and since when the oldest waits. */
function useRequestLines(calendar: Calendar | undefined): (group: WaitingGroup) => WaitingLine[] {
  const { t } = useTranslation('app');
  const soon = useSoonWords();
  return ({ items, isPastTime }) => {
    const ids = items.map(({ visitId }) => visitId);
    const visits = (calendar?.visits ?? []).filter(({ id }) => ids.includes(id));
    const needed = visits.filter(({ neededBy }) => neededBy !== null).sort(byInstant(({ neededBy }) => neededBy));
    const [oldest] = [...visits].sort(byInstant(({ requestedAt }) => requestedAt));
    const [first] = needed;
    const line = (text: string): WaitingLine => ({ text, to: '/requests', isPastTime });
    return [
      ...(first === undefined || first.neededBy === null
        ? []
        : [line(t('waiting.needed', { count: needed.length, at: soon(first.neededBy, first.zone) }))]),
      ...(oldest === undefined ? [] : [line(t('waiting.oldest', { at: soon(oldest.requestedAt, oldest.zone) }))]),
    ];
  };
}

type Visit = Calendar['visits'][number];

function byInstant(of: (visit: Visit) => string | null): (a: Visit, b: Visit) => number {
  return (a, b) => Date.parse(of(a) ?? '') - Date.parse(of(b) ?? '');
}

/** "Noor Haverty" is Noor, "Dunlatch Plumbing" Dunlatch: the place is narrow, and who it is stands on the lot. */
function shortName(name: string): string {
  return name.split(' ')[0] ?? name;
}

/** Where what waits is done: one lot on its sheet, several where they are done together. */
function pathOf({ kind, items, isOnYou }: WaitingGroup): string | null {
  const [first, ...others] = items;
  if (kind === 'consent-to-answer' && isOnYou) return '/consents';
  if (kind === 'request-to-place' && isOnYou) return '/requests';
  if (others.length === 0) {
    if (kind === 'visit-underway' && isOnYou && first?.visitId) return `/visits/${first.visitId}/outcome`;
    return first?.lotId ? `/lots/${first.lotId}` : null;
  }
  const lotIds = [...new Set(items.flatMap(({ lotId }) => (lotId === null ? [] : [lotId])))];
  if (kind === 'no-window' && isOnYou) return `/calendar?request=${lotIds.join(',')}`;
  if (kind === 'correction-to-fix' && isOnYou) return '/corrections';
  return isOnYou ? '/lots?filter=you' : '/lots';
}
