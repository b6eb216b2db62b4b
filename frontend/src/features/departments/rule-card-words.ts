import { ruleCardWords, type RuleCardWords } from '@holdwater/shared-types/departments/rule-card-words.js';
import { useMemo } from 'react';
import { useLocale } from '../../lib/i18n';

/** The wording of rule cards in the reader's language, the same that mails are written with. */
export function useRuleCardWords(): RuleCardWords {
  const locale = useLocale();
  return useMemo(() => ruleCardWords(locale), [locale]);
}
