import { updateMe } from '@holdwater/shared-types/accounts/auth.contract.js';
import type { FormEvent, ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useMe } from '../../../app/session';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Field } from '../../../components/field';
import { Failed } from '../../../lib/query-state';
import { useContractForm } from '../../../lib/use-contract-form';
import { useUpdateMe } from '../api/update-me';

/** One's own name and telephone. */
export function AboutForm(): ReactNode {
  const { t } = useTranslation('accounts');
  const me = useMe();
  const form = useContractForm(updateMe.body, { name: me.name, phone: me.phone ?? '' });
  const saving = useUpdateMe();
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const phone = form.values.phone.trim();
    const body = { name: form.values.name, phone: phone === '' ? null : phone };
    if (!form.check(body)) return;
    saving.mutate(body, {
      onError: form.takeError,
      onSuccess: () => sayDone({ mark: 'sent', title: t('settings.saved') }),
    });
  };
  return (
    <form onSubmit={submit} noValidate className="fields">
      <Field
        label={t('settings.name')}
        autoComplete="name"
        maxLength={120}
        value={form.values.name}
        error={form.faultOf('name')}
        onChange={(event) => form.set('name', event.target.value)}
      />
      <Field
        label={t('settings.phone')}
        type="tel"
        autoComplete="tel"
        isOptional
        hint={t('settings.phoneHint')}
        value={form.values.phone}
        error={form.faultOf('phone')}
        onChange={(event) => form.set('phone', event.target.value)}
      />
      <Field label={t('settings.email')} value={me.email} readOnly />
      {saving.error === null ? null : <Failed error={saving.error} level={3} />}
      <div>
        <Act kind="first" type="submit" busy={saving.isPending}>
          {t('settings.save')}
        </Act>
      </div>
    </form>
  );
}
