import { createOrganization } from '@holdwater/shared-types/accounts/organizations.contract.js';
import { organizationKinds, type OrganizationKind } from '@holdwater/shared-types/accounts/roles.js';
import type { FormEvent, ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Choice } from '../../../components/choice';
import { sayDone } from '../../../components/done-line';
import { Field } from '../../../components/field';
import { Failed } from '../../../lib/query-state';
import { useContractForm } from '../../../lib/use-contract-form';
import { useCreateOrganization } from '../api/create-organization';

const empty = {
  name: '',
  kind: 'builder' as OrganizationKind,
  phone: '',
  ownerName: '',
  ownerEmail: '',
  zone: '',
  elevationFt: '',
};

/** What is sent: only a department has a zone and an elevation, and a telephone is left out when there is none. */
function bodyOf({ phone, zone, elevationFt, ...rest }: typeof empty) {
  return {
    ...rest,
    ...(phone.trim() !== '' && { phone }),
    ...(rest.kind === 'department' && {
      zone: zone.trim(),
      elevationFt: elevationFt.trim() === '' ? Number.NaN : Number(elevationFt),
    }),
  };
}

/** Adds an organization with its first owner, who is invited by email. */
export function OrganizationForm(): ReactNode {
  const { t } = useTranslation(['operations', 'common']);
  const form = useContractForm(createOrganization.body, empty);
  const adding = useCreateOrganization();
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const body = bodyOf(form.values);
    if (!form.check(body)) return;
    adding.mutate(body, {
      onError: form.takeError,
      onSuccess: ({ name }) => {
        sayDone({
          mark: 'sent',
          title: t('organizations.added', { name }),
          text: t('organizations.addedText', { email: form.values.ownerEmail }),
        });
        form.reset();
      },
    });
  };
  const field = (name: 'name' | 'phone' | 'ownerName' | 'ownerEmail' | 'zone' | 'elevationFt') => ({
    value: form.values[name],
    error: form.faultOf(name),
    autoComplete: 'off',
    onChange: (event: { target: { value: string } }) => form.set(name, event.target.value),
  });
  return (
    <form onSubmit={submit} noValidate className="fields">
      <Field label={t('organizations.name')} maxLength={120} {...field('name')} />
      <Choice
        label={t('organizations.kind')}
        isLabelShown
        stacked
        options={organizationKinds.map((value) => ({ value, label: t(`common.kinds.${value}`) }))}
        value={form.values.kind}
        onChange={(kind) => form.set('kind', kind)}
      />
      <Field label={t('organizations.phone')} type="tel" isOptional {...field('phone')} />
      {form.values.kind === 'department' ? (
        <>
          <Field label={t('organizations.zone')} hint={t('organizations.zoneHint')} {...field('zone')} />
          <Field
            label={t('organizations.elevation')}
            inputMode="numeric"
            unit={t('organizations.feet')}
            {...field('elevationFt')}
          />
        </>
      ) : null}
      <Field label={t('organizations.ownerName')} maxLength={120} {...field('ownerName')} />
      <Field
        label={t('organizations.ownerEmail')}
        type="email"
        hint={t('organizations.ownerHint')}
        {...field('ownerEmail')}
      />
      {adding.error === null ? null : <Failed error={adding.error} level={3} />}
      <div>
        <Act kind="first" type="submit" busy={adding.isPending}>
          {t('organizations.addAct')}
        </Act>
      </div>
    </form>
  );
}
