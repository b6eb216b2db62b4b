import { updateLot, type LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import { useRef, type FormEvent, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Panel } from '../../../components/panel';
import { Failed } from '../../../lib/query-state';
import { useContractForm } from '../../../lib/use-contract-form';
import { useUpdateLot } from '../api/save-lot';
import { focusFirstFault } from '../focus-fault';
import { updateBody, valuesOf } from '../lot-values';
import { AccessFields, PermitFields, PlaceFields, RequestFields } from './lot-fields';
import { PartiesEditor } from './parties-editor';

/** A lot that stands; whoever may set the permit only sees that. */
export function EditLotForm({ lot }: { lot: LotDetail }): ReactNode {
  const { t } = useTranslation('lots');
  const navigate = useNavigate();
  const place = useRef<HTMLFormElement>(null);
  const form = useContractForm(updateLot.body, valuesOf(lot));
  const saving = useUpdateLot(lot.id);
  const { canEdit, canSetPermit } = lot.abilities;
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const body = updateBody(form.values, canEdit);
    if (!form.check(body)) return focusFirstFault(place.current);
    saving.mutate(body, {
      onError: (error) => {
        form.takeError(error);
        focusFirstFault(place.current);
      },
      onSuccess: () => {
        sayDone({ mark: 'sent', title: t('form.saved', { number: form.values.number }) });
        void navigate(`/lots/${lot.id}`);
      },
    });
  };
  return (
    <div className="lot-form">
      <form ref={place} onSubmit={submit} noValidate>
        {canEdit ? (
          <Panel title={t('form.place')}>
            <div className="fields">
              <PlaceFields form={form} />
            </div>
          </Panel>
        ) : null}
        {canEdit || canSetPermit ? (
          <Panel title={t('form.permit')}>
            <PermitFields form={form} />
          </Panel>
        ) : null}
        {canEdit ? (
          <>
            <Panel title={t('form.access')}>
              <p className="s mid part-note before">{t('form.accessNote')}</p>
              <AccessFields form={form} />
            </Panel>
            <Panel title={t('form.requests')}>
              <RequestFields form={form} />
            </Panel>
          </>
        ) : null}
        <div className="form-foot">
          {saving.error !== null ? <Failed error={saving.error} /> : null}
          <Act kind="first" size="lg" type="submit" busy={saving.isPending}>
            {t('form.save', { number: lot.number })}
          </Act>
        </div>
      </form>
      {canEdit || lot.abilities.canAttach ? (
        <Panel title={t('form.parties')}>
          <PartiesEditor lot={lot} />
          <p className="s mid part-note">{t('parties.consent')}</p>
        </Panel>
      ) : null}
    </div>
  );
}
