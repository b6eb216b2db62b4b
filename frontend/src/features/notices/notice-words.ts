import type { Locale } from '@holdwater/shared-types/common/locale.js';
import type { Notice } from '@holdwater/shared-types/notices/notice.contract.js';
import type { TFunction } from 'i18next';
import { useCallback } from 'react';
import { useTranslation } from 'react-i18next';
import { z } from 'zod';
import { isMarkName, type MarkName } from '../../components/mark-names';
import { localName, useLocale } from '../../lib/i18n';
import { useTimeWords } from '../../lib/time';
import { reasonWords } from '../threads/ledger-words';

const ruleCardNews = z.object({
  sentences: z.object({ en: z.array(z.string()), es: z.array(z.string()) }),
  more: z.number(),
});

export interface NoticeWords {
  /** What happened: "Correction 2 is fixed". */
  readonly title: string;
  /** Who, when, why. */
  readonly text: string;
  /** "Lot 17, Sorrel Bench" */
  readonly place: string;
  readonly mark: MarkName;
}

const marks: Readonly<Record<Notice['kind'], MarkName>> = {
  'visit-requested': 'requested',
  'visit-booked': 'booked',
  'visit-moved': 'booked',
  'visit-changed': 'booked',
  'visit-withdrawn': 'withdrawn',
  'visit-declined': 'declined',
  'visit-freed': 'freed',
  'visit-not-reached': 'requested',
  'visit-restored': 'booked',
  'visit-first-in-line': 'requested',
  'test-up': 'ready',
  'no-longer-up': 'booked',
  'visit-underway': 'underway',
  outcome: 'fail',
  'correction-opened': 'correction-open',
  'correction-fixed': 'correction-fixed',
  'correction-reopened': 'correction-open',
  'correction-accepted': 'correction-accepted',
  comment: 'now',
  'consent-asked': 'waits-on-you',
  'consent-given': 'sent',
  'consent-refused': 'declined',
  handover: 'sent',
  'rule-card-published': 'sent',
};

/** Notices in the reader's language; instants on the wall clock of their department. */
export function useNoticeWords(): (notice: Notice) => NoticeWords {
  const { t } = useTranslation(['notices', 'threads', 'marks', 'common', 'holds']);
  const locale = useLocale();
  const time = useTimeWords();
  return useCallback(
    ({ kind, params }) => {
      const text = (name: string): string => {
        const value = params[name];
        return typeof value === 'string' || typeof value === 'number' ? String(value) : '';
      };
      const zone = text('zone') === '' ? Intl.DateTimeFormat().resolvedOptions().timeZone : text('zone');
      const span = (startAt: string, endAt: string): string =>
        startAt === '' || endAt === '' ? '' : time.dayWindow(startAt, endAt, zone);
      const from = spanOf(params['from']);
      const outcome = text('kind');
      const words = {
        actor: text('actorName') === '' ? t('somebody') : text('actorName'),
        window: span(text('startAt'), text('endAt')),
        from: span(from.startAt, from.endAt),
        stage: stageWords(params['stageName'], locale),
        reason: reasonWords(t, text('reason') === '' ? text('why') : text('reason')),
        number: text('number'),
        excerpt: text('excerpt'),
        version: text('version'),
        department: text('departmentName') || t('notices.ruleCard.aDepartment'),
        changes: kind === 'rule-card-published' ? ruleCardChanges(params['changes'], locale, t) : '',
        day: text('effectiveFrom') === '' ? '' : time.date(text('effectiveFrom')),
        outcome: kind === 'outcome' && isMarkName(outcome) ? t(`marks.${outcome}`) : '',
        former: text('formerName'),
        successor: text('organizationName'),
        count: Number(params['lotCount'] ?? 1),
      };
      const lot = text('lotNumber');
      const place = [lot === '' ? '' : t('common.lot', { number: lot }), text('tractName') || text('address')];
      return {
        title: t(`titles.${kind}`, words),
        text: t(`lines.${kind}`, words),
        place: place.filter(Boolean).join(', '),
        mark: kind === 'outcome' && isMarkName(outcome) ? outcome : marks[kind],
      };
    },
    [t, locale, time],
  );
}

/** What a rule card changes for the reader, in a sentence each; notices from before that was told say nothing of it. */
function ruleCardChanges(value: unknown, locale: Locale, t: TFunction): string {
  const told = ruleCardNews.safeParse(value);
  if (!told.success) return '';
  const { sentences, more } = told.data;
  if (sentences[locale].length === 0) return t('notices.ruleCard.nothing');
  const all = more === 0 ? sentences[locale] : [...sentences[locale], t('notices.ruleCard.more', { count: more })];
  return `${all.join('. ')}.`;
}

function spanOf(value: unknown): { startAt: string; endAt: string } {
  const { startAt, endAt } = typeof value === 'object' && value !== null ? (value as Record<string, unknown>) : {};
  return { startAt: typeof startAt === 'string' ? startAt : '', endAt: typeof endAt === 'string' ? endAt : '' };
}

function stageWords(value: unknown, locale: 'en' | 'es'): string {
  if (typeof value !== 'object' || value === null) return '';
  const { en, es } = value as { en?: unknown; es?: unknown };
  if (typeof en !== 'string') return '';
  return localName({ en, es: typeof es === 'string' ? es : undefined }, locale);
}
