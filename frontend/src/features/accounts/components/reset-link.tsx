import { resetPassword } from '@holdwater/shared-types/accounts/auth.contract.js';
import type { FormEvent, ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { Act } from '../../../components/act';
import { isApiError } from '../../../lib/api-error';
import { useErrorWords } from '../../../lib/errors';
import { useContractForm } from '../../../lib/use-contract-form';
import { usePasswordReset } from '../api/use-link';
import { LinkTrouble } from './link-trouble';
import { PasswordField } from './password-field';
import { RefusedLine } from './refused-line';

/** A mailed link for a new password. */
export function ResetLink({ token }: { token: string }): ReactNode {
  const { t } = useTranslation('accounts');
  const navigate = useNavigate();
  const form = useContractForm(resetPassword.body, { password: '' });
  const setting = usePasswordReset();
  const words = useErrorWords(setting.error);
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const body = { token, password: form.values.password };
    if (!form.check(body)) return;
    setting.mutate(body, { onError: form.takeError, onSuccess: () => void navigate('/', { replace: true }) });
  };
  if (words !== null && isApiError(setting.error, 'link-expired')) {
    return (
      <LinkTrouble title={words.title} askKind="reset">
        {words.safe}
      </LinkTrouble>
    );
  }
  return (
    <form onSubmit={submit} noValidate>
      <div className="door-part">
        <h1 className="h2">{t('link.resetTitle')}</h1>
        <p className="mid">{t('link.resetText')}</p>
      </div>
      <div className="door-fields door-first">
        <PasswordField
          label={t('link.newPassword')}
          autoComplete="new-password"
          autoFocus
          value={form.values.password}
          error={form.faultOf('password')}
          hint={t('link.passwordHint')}
          onChange={(password) => form.set('password', password)}
        />
      </div>
      <RefusedLine error={setting.error} />
      <div className="door-acts">
        <Act kind="first" type="submit" size="lg" wide busy={setting.isPending}>
          {t('link.resetAct')}
        </Act>
      </div>
    </form>
  );
}
