import { useState, type FormEvent, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Act } from '../../../components/act';
import { Field } from '../../../components/field';
import { useContractForm } from '../../../lib/use-contract-form';
import { askRoutes, useAskMail, type MailKind } from '../api/ask-mail';
import { RefusedLine } from './refused-line';

/** Has a sign-in link or a link for a new password mailed. What it says afterwards is the same for known and unknown addresses. */
export function AskMailForm({ kind }: { kind: MailKind }): ReactNode {
  const { t } = useTranslation('accounts');
  const form = useContractForm(askRoutes[kind].body, { email: '' });
  const [sentTo, setSentTo] = useState<string | null>(null);
  const asking = useAskMail(kind);
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const { email } = form.values;
    if (form.check({ email })) asking.mutate({ email }, { onError: form.takeError, onSuccess: () => setSentTo(email) });
  };
  if (sentTo !== null) return <Sent email={sentTo} onAgain={() => setSentTo(null)} />;
  return (
    <form onSubmit={submit} noValidate>
      <div className="door-part">
        <h1 className="h2">{t(`ask.${kind}Title`)}</h1>
        <p className="mid">{t(`ask.${kind}Text`)}</p>
      </div>
      <div className="door-fields door-first">
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
      </div>
      <RefusedLine error={asking.error} />
      <div className="door-acts">
        <Act kind="first" type="submit" size="lg" wide busy={asking.isPending}>
          {t(`ask.${kind}Act`)}
        </Act>
        <div className="spread">
          <Link to="/sign-in">{t('signIn.back')}</Link>
        </div>
      </div>
    </form>
  );
}

function Sent({ email, onAgain }: { email: string; onAgain: () => void }): ReactNode {
  const { t } = useTranslation('accounts');
  return (
    <div className="door-part" role="status">
      <h1 className="h2">{t('ask.sentTitle')}</h1>
      <p className="mid">{t('ask.sentText', { email })}</p>
      <div className="spread door-after">
        <button type="button" className="link-act" onClick={onAgain}>
          {t('ask.again')}
        </button>
        <Link to="/sign-in">{t('signIn.back')}</Link>
      </div>
    </div>
  );
}
