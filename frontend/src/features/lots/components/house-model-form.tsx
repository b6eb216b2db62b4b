import type { HouseGeometry, HouseGeometryGiven } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { renameHouseModel } from '@holdwater/shared-types/lots/house-model.contract.js';
import type { FormEvent, ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Field } from '../../../components/field';
import { Panel } from '../../../components/panel';
import { Failed } from '../../../lib/query-state';
import { useContractForm } from '../../../lib/use-contract-form';
import { focusFirstFault } from '../focus-fault';
import { useHouseForm } from '../use-house-form';
import { HouseParts } from './house-parts';
import { HouseSplit } from './house-split';

export interface HouseModelFormProps {
  house: HouseGeometry | null;
  /** Null where the model has its name already. */
  name: string | null;
  /** What stands before the fields: what becomes of the lots. */
  note: string;
  saveWord: string;
  saving: { readonly isPending: boolean; readonly error: unknown };
  onSave: (house: HouseGeometryGiven, name: string, onError: (error: unknown) => void) => void;
}

/** A house to be saved under a name, or as the next version of one. */
export function HouseModelForm({ house, name, note, saveWord, saving, onSave }: HouseModelFormProps): ReactNode {
  const { t } = useTranslation(['houses', 'common']);
  const { form, place, refusals, takeHouse, takeError } = useHouseForm(house);
  const naming = useContractForm(renameHouseModel.body, { name: name ?? '' });
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const isNamed = name === null || naming.check(naming.values);
    const geometry = takeHouse();
    if (!isNamed) return focusFirstFault(place.current);
    if (geometry === null) return;
    onSave(geometry, naming.values.name, (error) => {
      naming.takeError(error);
      takeError(error);
    });
  };
  return (
    <HouseSplit draft={form.values}>
      <form ref={place} onSubmit={submit} noValidate className="lot-form">
        {name === null ? (
          <p className="s mid house-origin">{note}</p>
        ) : (
          <Panel title={t('form.name')}>
            <Field
              label={t('form.nameLabel')}
              hint={note}
              maxLength={60}
              value={naming.values.name}
              error={naming.faultOf('name')}
              onChange={(event) => naming.set('name', event.target.value)}
            />
          </Panel>
        )}
        <HouseParts form={form} refusals={refusals} />
        <div className="form-foot">
          {saving.error !== null ? <Failed error={saving.error} /> : null}
          <Act kind="first" size="lg" type="submit" busy={saving.isPending}>
            {saveWord}
          </Act>
          <p className="s mid">{t('common.localCode')}</p>
        </div>
      </form>
    </HouseSplit>
  );
}
