import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { useCallback } from 'react';
import { useTranslation } from 'react-i18next';
import { visitMark } from '../../app/layout/ribbon-days';
import type { MarkName, MarkTone } from '../../components/mark-names';

/** A test that is not up is told in brass from this long before its deadline. */
const nearMs = 24 * 3_600_000;

export interface VisitLook {
  readonly mark: MarkName;
  readonly word: string;
  readonly tone?: MarkTone;
  /** Share of the required systems standing, 0 to 1. */
  readonly share: number;
  readonly waits?: 'waits-on-you' | 'waits-on' | 'past-time';
}

type Looked = Pick<
  VisitSummary,
  'state' | 'outcome' | 'systemsUp' | 'upBy' | 'unitNumbers' | 'hasFirstPlace' | 'moves'
>;

/** Systems of a visit that are required and not standing, each once. */
export function missingSystems({ systemsUp }: Pick<VisitSummary, 'systemsUp'>): ('dwv' | 'water')[] {
  return [...new Set(systemsUp.filter(({ isUp }) => !isUp).map(({ system }) => system))];
}

/** How urgent a booked visit is whose test is not up. */
export function upUrgency(visit: Pick<VisitSummary, 'state' | 'upBy'>, now: Date): 'none' | 'near' | 'past' {
  if (visit.state !== 'booked' || visit.upBy === null) return 'none';
  const leftMs = Date.parse(visit.upBy) - now.getTime();
  if (leftMs < 0) return 'past';
  return leftMs <= nearMs ? 'near' : 'none';
}

/** Whether the outcome, an end or the inspector is all that is told of it. */
export function isOpen({ state }: Pick<VisitSummary, 'state'>): boolean {
  return state === 'requested' || state === 'booked' || state === 'ready' || state === 'underway';
}

/** States that stand on no board any more. */
export function isGone({ state }: Pick<VisitSummary, 'state'>): boolean {
  return state === 'withdrawn' || state === 'declined' || state === 'freed';
}

/** The mark, word and colour of a visit, wherever it is shown. */
export function useVisitLook(): (visit: Looked, now: Date) => VisitLook {
  const { t } = useTranslation(['visits', 'marks']);
  return useCallback(
    (visit, now) => {
      const mark = visitMark(visit);
      const up = visit.systemsUp.filter(({ isUp }) => isUp).length;
      const share = visit.systemsUp.length === 0 ? 0 : up / visit.systemsUp.length;
      const urgency = upUrgency(visit, now);
      const missing = missingSystems(visit).map((system) => t(`word.systems.${system}`));
      const base = { mark, share, word: t(`marks.${mark}`) };
      if (visit.state === 'requested' && visit.hasFirstPlace) return { ...base, word: t('word.firstInLine') };
      if (visit.state !== 'booked') return base;
      const word = mark === 'part-up' ? t('word.missing', { systems: missing.join(', ') }) : t('word.notUp');
      if (urgency === 'none') return mark === 'part-up' ? { ...base, word } : base;
      const isOnYou = visit.moves.includes('say-test-up');
      return {
        ...base,
        word,
        tone: urgency === 'past' ? 'red' : 'brass',
        waits: urgency === 'past' ? 'past-time' : isOnYou ? 'waits-on-you' : 'waits-on',
      };
    },
    [t],
  );
}
