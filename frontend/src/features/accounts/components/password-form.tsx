import { changePassword } from '@holdwater/shared-types/accounts/auth.contract.js';
import type { FormEvent, ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { sayDone } from '../../../components/done-line';
import { Failed } from '../../../lib/query-state';
import { useContractForm } from '../../../lib/use-contract-form';
import { useChangePassword } from '../api/change-password';
import { PasswordField } from './password-field';

/** Changes the password; the other sessions end. */
export function PasswordForm(): ReactNode {
  const { t } = useTranslation('accounts');
  const form = useContractForm(changePassword.body, { currentPassword: '', password: '' });
  const changing = useChangePassword();
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    if (!form.check(form.values)) return;
    changing.mutate(form.values, {
      onError: form.takeError,
      onSuccess: () => {
        form.reset();
        sayDone({ mark: 'sent', title: t('settings.changed') });
      },
    });
  };
  return (
    <form onSubmit={submit} noValidate className="fields">
      <PasswordField
        label={t('settings.current')}
        labelPlace="above"
        autoComplete="current-password"
        value={form.values.currentPassword}
        error={form.faultOf('currentPassword')}
        onChange={(value) => form.set('currentPassword', value)}
      />
      <PasswordField
        label={t('settings.next')}
        labelPlace="above"
        autoComplete="new-password"
        hint={t('link.passwordHint')}
        value={form.values.password}
        error={form.faultOf('password')}
        onChange={(value) => form.set('password', value)}
      />
      {changing.error === null ? null : <Failed error={changing.error} level={3} />}
      <div>
        <Act type="submit" busy={changing.isPending}>
          {t('settings.change')}
        </Act>
      </div>
    </form>
  );
}
