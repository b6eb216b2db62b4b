import type { HousePart } from '@holdwater/shared-types/lots/house-differences.js';
import { useTranslation } from 'react-i18next';
import { useLocale } from '../../lib/i18n';

/** The parts of a house in the reader's words, as a list. */
export function useHouseChangeWords(): (parts: readonly HousePart[]) => string {
  const { t } = useTranslation('houses');
  const locale = useLocale();
  return (parts) =>
    new Intl.ListFormat(locale, { type: 'conjunction' }).format(parts.map((part) => t(`parts.${part}`)));
}
