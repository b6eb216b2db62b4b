import type { TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Cell } from '../../../components/cells';
import { Numeral } from '../../../components/numeral';

/** How long the rule card wants the test to stand. */
export function StandCell({ rule }: { rule: TestRule | null }): ReactNode {
  const { t } = useTranslation('plans');
  const minutes = rule?.standMinutes ?? null;
  const words = minutes === null ? t('section.untilSeen') : t('section.minutes', { count: minutes });
  return <Cell label={t('section.stand')}>{rule === null ? t('section.notKnown') : <Numeral text={words} />}</Cell>;
}
