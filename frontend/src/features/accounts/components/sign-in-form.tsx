import { signIn } from '@holdwater/shared-types/accounts/auth.contract.js';
import type { FormEvent, ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Act } from '../../../components/act';
import { Field } from '../../../components/field';
import { useContractForm } from '../../../lib/use-contract-form';
import { useSignIn } from '../api/sign-in';
import { PasswordField } from './password-field';
import { RefusedLine } from './refused-line';

/** Email and password, as cells of the title block. */
export function SignInForm(): ReactNode {
  const { t } = useTranslation('accounts');
  const form = useContractForm(signIn.body, { email: '', password: '' });
  const sending = useSignIn();
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    if (!form.check(form.values)) return;
    sending.mutate(form.values, { onError: form.takeError });
  };
  return (
    <form onSubmit={submit} noValidate aria-labelledby="sign-in-title">
      <h1 className="hidden-words" id="sign-in-title">
        {t('signIn.title')}
      </h1>
      <div className="door-fields">
        <Field
          label={t('signIn.email')}
          labelPlace="inside"
          type="email"
          autoComplete="username"
          autoFocus
          value={form.values.email}
          error={form.faultOf('email')}
          onChange={(event) => form.set('email', event.target.value)}
        />
        <PasswordField
          label={t('signIn.password')}
          autoComplete="current-password"
          value={form.values.password}
          error={form.faultOf('password')}
          onChange={(password) => form.set('password', password)}
        />
      </div>
      <RefusedLine error={sending.error} />
      <div className="door-acts">
        <Act kind="first" type="submit" size="lg" wide busy={sending.isPending} busyWord={t('signIn.busy')}>
          {t('signIn.act')}
        </Act>
        <div className="spread">
          <Link to="/sign-in?ask=link">{t('signIn.askLink')}</Link>
          <Link to="/sign-in?ask=reset">{t('signIn.forgot')}</Link>
        </div>
      </div>
    </form>
  );
}
