import { createLot } from '@holdwater/shared-types/lots/lot.contract.js';
import { useRef, type FormEvent, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Panel } from '../../../components/panel';
import { Failed } from '../../../lib/query-state';
import { useContractForm } from '../../../lib/use-contract-form';
import { useCreateLot } from '../api/save-lot';
import { focusFirstFault } from '../focus-fault';
import { createBody, emptyLot } from '../lot-values';
import { AccessFields, PermitFields, PlaceFields, RequestFields, UnitFields } from './lot-fields';
import { PartyField } from './party-field';
import { TractField } from './tract-field';

/** Builder: a new lot; the plumber and the department named are asked whether they join. */
export function NewLotForm({ builderId, tractId }: { builderId: string; tractId: string }): ReactNode {
  const { t } = useTranslation('lots');
  const navigate = useNavigate();
  const place = useRef<HTMLFormElement>(null);
  const form = useContractForm(createLot.body, emptyLot(tractId));
  const creating = useCreateLot();
  const { values, set, faultOf } = form;
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const body = createBody(values, builderId);
    if (!form.check(body)) return focusFirstFault(place.current);
    creating.mutate(body, {
      onError: (error) => {
        form.takeError(error);
        focusFirstFault(place.current);
      },
      onSuccess: (lot) => {
        sayDone({ mark: 'sent', title: t('form.added', { number: lot.number }) });
        void navigate(lot.abilities.canEditGeometry ? `/lots/${lot.id}/edit?part=house` : `/lots/${lot.id}`);
      },
    });
  };
  return (
    <form ref={place} onSubmit={submit} noValidate className="lot-form">
      <Panel title={t('form.place')}>
        <div className="fields">
          <TractField
            builderId={builderId}
            value={values.tractId}
            error={faultOf('tractId')}
            onChange={(id) => set('tractId', id)}
          />
          <PlaceFields form={form} />
        </div>
      </Panel>
      <Panel title={t('form.parties')}>
        <div className="fields two">
          <PartyField
            kind="plumber"
            value={values.plumber}
            error={faultOf('plumberId')}
            onChange={(plumber) => set('plumber', plumber)}
          />
          <PartyField
            kind="department"
            value={values.department}
            error={faultOf('departmentId')}
            onChange={(department) => set('department', department)}
          />
        </div>
        <p className="s mid part-note">{t('parties.consent')}</p>
      </Panel>
      <Panel title={t('form.permit')}>
        <PermitFields form={form} />
      </Panel>
      <Panel title={t('form.units')}>
        <UnitFields form={form} />
      </Panel>
      <Panel title={t('form.access')}>
        <p className="s mid part-note before">{t('form.accessNote')}</p>
        <AccessFields form={form} />
      </Panel>
      <Panel title={t('form.requests')}>
        <RequestFields form={form} />
      </Panel>
      <div className="form-foot">
        {creating.error !== null ? <Failed error={creating.error} /> : null}
        <Act kind="first" size="lg" type="submit" busy={creating.isPending}>
          {values.number.trim() === '' ? t('form.addLot') : t('form.addLotNumber', { number: values.number.trim() })}
        </Act>
      </div>
    </form>
  );
}
