import type { HouseOrigin } from '@holdwater/shared-types/lots/house-origin.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { useHouseChangeWords } from '../house-change-words';

/** Which house model a unit's house was taken from, and what was changed on the lot since; nothing for one measured on its own. */
export function HouseOriginLine({
  origin,
  isLinked,
}: {
  origin: HouseOrigin | null | undefined;
  /** For the builder's own people, who may read the model. */
  isLinked: boolean;
}): ReactNode {
  const { t } = useTranslation('houses');
  const changeWords = useHouseChangeWords();
  if (!origin) return null;
  const { id, name, version, newestVersion, changes } = origin;
  const words = t('origin.from', { name, version });
  return (
    <p className="s mid house-origin">
      {isLinked ? <Link to={`/lots/houses/${id}`}>{words}</Link> : words}
      {'. '}
      {changes.length === 0 ? t('origin.same') : t('origin.changed', { parts: changeWords(changes) })}
      {isLinked && version < newestVersion ? ` ${t('origin.newer', { version: newestVersion })}` : null}
    </p>
  );
}
