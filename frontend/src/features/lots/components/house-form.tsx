import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { FormEvent, ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Failed } from '../../../lib/query-state';
import { useSetGeometry } from '../api/save-lot';
import { useHouseForm } from '../use-house-form';
import { HouseOriginLine } from './house-origin-line';
import { HouseParts } from './house-parts';
import { HouseSplit } from './house-split';
import { HouseTake } from './house-take';

export interface HouseFormProps {
  lotId: string;
  unit: LotDetail['units'][number];
  /** The builder whose house models the reader may give; null for the other parties. */
  builderId: string | null;
}

/** The house as it will be tested, measured from the finished first floor; its section is drawn as it is typed. */
export function HouseForm({ lotId, unit, builderId }: HouseFormProps): ReactNode {
  const { t } = useTranslation(['lots', 'houses', 'common']);
  const navigate = useNavigate();
  const { form, place, refusals, takeHouse, takeError } = useHouseForm(unit.geometry);
  const saving = useSetGeometry(lotId, unit.number);
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const geometry = takeHouse();
    if (geometry === null) return;
    saving.mutate(geometry, {
      onError: takeError,
      onSuccess: () => {
        sayDone({ mark: 'sent', title: t('house.saved') });
        void navigate(`/lots/${lotId}`);
      },
    });
  };
  return (
    <HouseSplit draft={form.values}>
      <form ref={place} onSubmit={submit} noValidate className="lot-form">
        <HouseOriginLine origin={unit.model} isLinked={builderId !== null} />
        {builderId === null ? null : <HouseTake builderId={builderId} lotId={lotId} unit={unit} />}
        <HouseParts form={form} refusals={refusals} />
        <div className="form-foot">
          {saving.error !== null ? <Failed error={saving.error} /> : null}
          <Act kind="first" size="lg" type="submit" busy={saving.isPending}>
            {t('house.save')}
          </Act>
          {builderId !== null && unit.geometry !== null ? (
            <Act to={`/lots/houses/new?lot=${lotId}&unit=${unit.number}`}>{t('houses.acts.saveAsModel')}</Act>
          ) : null}
          <p className="s mid">{t('common.localCode')}</p>
        </div>
      </form>
    </HouseSplit>
  );
}
