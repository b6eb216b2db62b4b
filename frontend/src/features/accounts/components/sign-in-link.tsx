import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { useSession } from '../../../app/session';
import { Act } from '../../../components/act';
import { isApiError } from '../../../lib/api-error';
import { useErrorWords } from '../../../lib/errors';
import { useMailedSignIn } from '../api/use-link';
import { LinkTrouble } from './link-trouble';
import { RefusedLine } from './refused-line';

/** A mailed sign-in link. It is used by a press only: mail programs open links to look at them. */
export function SignInLink({ token }: { token: string }): ReactNode {
  const { t } = useTranslation('accounts');
  const { me } = useSession();
  const navigate = useNavigate();
  const using = useMailedSignIn();
  const words = useErrorWords(using.error);
  if (words !== null && isApiError(using.error, 'link-expired')) {
    return (
      <LinkTrouble title={words.title} askKind="sign-in">
        {words.safe}
      </LinkTrouble>
    );
  }
  const go = (): void => using.mutate({ token }, { onSuccess: () => void navigate('/', { replace: true }) });
  return (
    <>
      <div className="door-part">
        <h1 className="h2">{t('link.open')}</h1>
        <p className="mid">{t('link.openText')}</p>
        {me === null ? null : <p className="t-brass">{t('link.otherSignedIn', { name: me.name })}</p>}
      </div>
      <RefusedLine error={using.error} />
      <div className="door-acts">
        <Act kind="first" size="lg" wide busy={using.isPending} onClick={go}>
          {t('link.signInAct')}
        </Act>
      </div>
    </>
  );
}
