import {
  mostUnitsAtOnce,
  type HouseModelDetail,
  type ModelledUnit,
} from '@holdwater/shared-types/lots/house-model.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { unitKey, unitStanding } from '../house-apply-model';
import { useHouseChangeWords } from '../house-change-words';

export interface HouseApplyListProps {
  model: HouseModelDetail;
  units: readonly ModelledUnit[];
  isCut: boolean;
  picked: ReadonlySet<string>;
  onPick: (picked: ReadonlySet<string>) => void;
}

/** The units of a tract's lots with how each house stands to the model; those that have it already cannot be picked. */
export function HouseApplyList({ model, units, isCut, picked, onPick }: HouseApplyListProps): ReactNode {
  const { t } = useTranslation('houses');
  const open = units.filter(({ isSame }) => !isSame);
  const atOnce = open.slice(0, mostUnitsAtOnce);
  const areAllPicked = atOnce.length > 0 && atOnce.every((unit) => picked.has(unitKey(unit)));
  const allWord = t(atOnce.length < open.length ? 'apply.chooseFirst' : 'apply.chooseAll', { count: atOnce.length });
  const toggle = (unit: ModelledUnit, isPicked: boolean): void => {
    const next = new Set(picked);
    if (isPicked) next.add(unitKey(unit));
    else next.delete(unitKey(unit));
    onPick(next);
  };
  return (
    <>
      <div className="house-pick">
        <span className="mid">{t('apply.chosen', { count: picked.size })}</span>
        {open.length > 0 ? (
          <Act size="sm" onClick={() => onPick(new Set(areAllPicked ? [] : atOnce.map(unitKey)))}>
            {areAllPicked ? t('apply.chooseNone') : allWord}
          </Act>
        ) : null}
      </div>
      {isCut ? <p className="s t-brass part-words">{t('apply.cut', { count: units.length })}</p> : null}
      <ul className="part-list house-targets">
        {units.map((unit) => (
          <li key={unitKey(unit)} className="row at-top">
            <label className="check-row grow">
              <input
                type="checkbox"
                disabled={unit.isSame}
                checked={unit.isSame || picked.has(unitKey(unit))}
                onChange={(event) => toggle(unit, event.target.checked)}
              />
              <span>
                <UnitName unit={unit} />
                <span className="s mid house-standing">
                  <Standing unit={unit} modelId={model.id} />
                </span>
              </span>
            </label>
          </li>
        ))}
      </ul>
    </>
  );
}

export function UnitName({ unit }: { unit: ModelledUnit }): ReactNode {
  const { t } = useTranslation('houses');
  return (
    <span className="b">
      {t('apply.lot')} <span className="n">{unit.lotNumber}</span>, {unit.address}
      {unit.unitNumber > 1 || unit.unitLabel !== 'House' ? `, ${unit.unitLabel}` : null}
    </span>
  );
}

function Standing({ unit, modelId }: { unit: ModelledUnit; modelId: string }): ReactNode {
  const { t } = useTranslation('houses');
  const changeWords = useHouseChangeWords();
  const { origin } = unit;
  return t(`apply.state.${unitStanding(unit, modelId)}`, {
    name: origin?.name,
    version: origin?.version,
    parts: changeWords(origin?.changes ?? []),
  });
}
