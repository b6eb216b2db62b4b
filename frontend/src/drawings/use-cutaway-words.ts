import { useTranslation } from 'react-i18next';
import type { HeadRow } from './cutaway-heads';

const knownFloors: readonly string[] = ['basement', 'first', 'second', 'third', 'fourth'];

/** Words of a row of heads: "Second floor", "Attic floor", "Test plug". A floor with a name of its own keeps it. */
export function useRowWords(): (row: Pick<HeadRow, 'kind' | 'name'>) => string {
  const { t } = useTranslation('marks');
  return ({ kind, name }) => {
    if (kind === 'attic') return t('cutaway.attic');
    if (kind === 'plug') return t('cutaway.testPlug');
    const code = name.toLowerCase();
    return knownFloors.includes(code) ? t(`cutaway.floor.${code}`) : t('cutaway.floorNamed', { name });
  };
}
