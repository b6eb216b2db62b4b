import { dwvMethods, type Method } from '@holdwater/shared-types/holds/hold.states.js';
import { emptyHouse, type HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { useMemo, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import { Cutaway } from '../../../drawings/cutaway';
import { levelWords } from '../level-words';

export interface LevelPictureProps {
  house: HouseGeometry | null;
  method: Method | null;
  /** Feet above the finished first floor. */
  fillLevelFt: number | null;
}

/** The house with the water in it: what the level is read of. */
export function LevelPicture({ house, method, fillLevelFt }: LevelPictureProps): ReactNode {
  const { t } = useTranslation('holds');
  const drawn = useMemo(() => house ?? emptyHouse(), [house]);
  const dwvMethod = dwvMethods.find((one) => one === method) ?? null;
  return (
    <div className="level-picture">
      <Cutaway house={drawn} method={dwvMethod} fillLevelFt={fillLevelFt} hasLabels={false} maxHeight={230} />
      {fillLevelFt === null ? null : (
        <p className="row s t-water">
          <Mark name="level" size={24} />
          <Numeral text={levelWords(t, fillLevelFt, house)} />
        </p>
      )}
      {house === null ? <p className="s mid">{t('picture.unmeasured')}</p> : null}
    </div>
  );
}
