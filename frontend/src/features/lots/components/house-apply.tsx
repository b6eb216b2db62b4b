import {
  mostUnitsAtOnce,
  type HouseModelDetail,
  type ModelledUnit,
} from '@holdwater/shared-types/lots/house-model.contract.js';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Plain } from '../../../components/plain';
import { Failed } from '../../../lib/query-state';
import { useApplyHouseModel } from '../api/house-models';
import { unitKey, wishedUnits, type OwnHouseAnswers } from '../house-apply-model';
import { HouseApplyList } from './house-apply-list';
import { HouseAsk } from './house-ask';

export interface HouseApplyProps {
  model: HouseModelDetail;
  /** The units to choose from. */
  units: readonly ModelledUnit[];
  /** There are more than are shown. */
  isCut: boolean;
  areAllPicked?: boolean;
}

/** Choose the lots, answer for those whose house was changed by hand, then give the model to all of them in one act. */
export function HouseApply({ model, units, isCut, areAllPicked = false }: HouseApplyProps): ReactNode {
  const { t } = useTranslation('houses');
  const navigate = useNavigate();
  const open = units.filter(({ isSame }) => !isSame);
  const [keys, setKeys] = useState<ReadonlySet<string>>(
    new Set(areAllPicked ? open.slice(0, mostUnitsAtOnce).map(unitKey) : []),
  );
  const [isAsking, setAsking] = useState(false);
  const [answers, setAnswers] = useState<OwnHouseAnswers>({});
  const applying = useApplyHouseModel(model.id);
  const picked = open.filter((unit) => keys.has(unitKey(unit)));
  const byHand = picked.filter((unit) => unit.isByHand);
  const wished = isAsking ? wishedUnits(picked, answers) : picked;
  const send = (): void => {
    if (byHand.length > 0 && !isAsking) return setAsking(true);
    applying.mutate(
      { expectedVersion: model.version, units: wishedUnits(picked, answers) },
      {
        onSuccess: ({ lots }) => {
          sayDone({ mark: 'sent', title: t('apply.done', { count: lots, name: model.name }) });
          void navigate(`/lots/houses/${model.id}`);
        },
      },
    );
  };
  if (units.length === 0) {
    return (
      <Plain kind="empty" title={t('apply.empty')} acts={<Act to="/lots">{t('acts.toLots')}</Act>}>
        {t('apply.emptyText')}
      </Plain>
    );
  }
  const missing = wished.length === 0 ? t(isAsking ? 'apply.allLeft' : 'apply.noneChosen') : null;
  const tooMany = wished.length > mostUnitsAtOnce ? t('apply.tooMany', { most: mostUnitsAtOnce }) : null;
  return (
    <>
      {isAsking ? (
        <HouseAsk
          units={byHand}
          answers={answers}
          onAnswer={(unit, answer) => setAnswers((before) => ({ ...before, [unitKey(unit)]: answer }))}
        />
      ) : (
        <HouseApplyList model={model} units={units} isCut={isCut} picked={keys} onPick={setKeys} />
      )}
      <div className="form-foot">
        {applying.error !== null ? <Failed error={applying.error} /> : null}
        <div className="row wrap">
          <Act
            kind="first"
            size="lg"
            busy={applying.isPending}
            cannotYet={missing ?? tooMany ?? undefined}
            onClick={send}
          >
            {t('apply.give', { count: wished.length })}
          </Act>
          {isAsking ? <Act onClick={() => setAsking(false)}>{t('apply.backToList')}</Act> : null}
        </div>
      </div>
    </>
  );
}
