import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';

export interface LinkTroubleProps {
  title: ReactNode;
  children: ReactNode;
  /** What to ask for instead; an invitation can only be sent anew by who invited. */
  askKind: 'sign-in' | 'reset' | 'invitation';
}

/** A mailed link that cannot be used, and how to get one that can. */
export function LinkTrouble({ title, children, askKind }: LinkTroubleProps): ReactNode {
  const { t } = useTranslation('accounts');
  return (
    <div className="door-part" role="alert">
      <h1 className="h2">{title}</h1>
      <p className="mid">{children}</p>
      <div className="row wrap door-after">
        {askKind === 'invitation' ? null : (
          <Act kind="first" to={askKind === 'reset' ? '/sign-in?ask=reset' : '/sign-in?ask=link'}>
            {t('link.askNew')}
          </Act>
        )}
        <Act to="/sign-in">{t('link.toSignIn')}</Act>
      </div>
    </div>
  );
}
