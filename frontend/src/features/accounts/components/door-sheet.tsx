import { lazy, Suspense, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { BrandMark } from '../../../components/brand-mark';
import { LanguageChoice } from '../../../app/layout/language-choice';
import { useIsPhone } from '../../../lib/use-media';
import './door-sheet.css';

const Picture = lazy(async () => ({ default: (await import('./sign-in-picture')).SignInPicture }));

/** The sheet before one is signed in: the cutaway drawn large, and as its title block whatever there is to do. */
export function DoorSheet({ children }: { children: ReactNode }): ReactNode {
  const { t } = useTranslation('accounts');
  const isPhone = useIsPhone();
  return (
    <div className="sheet door">
      {isPhone ? null : <DoorPicture />}
      <main className="door-block">
        <div className="door-brand">
          <div className="row">
            <BrandMark size={40} />
            <span className="door-name">Holdwater</span>
          </div>
          <p className="mid">{t('signIn.lead')}</p>
        </div>
        {children}
        <div className="tb c2">
          <Link className="c door-cell" to="/rule-cards">
            <span className="lab">{t('signIn.open')}</span>
            <span className="v">{t('signIn.ruleCards')}</span>
          </Link>
          <div className="c">
            <LanguageChoice isLabelShown />
          </div>
        </div>
      </main>
      {isPhone ? <DoorPicture isSmall /> : null}
    </div>
  );
}

function DoorPicture({ isSmall = false }: { isSmall?: boolean }): ReactNode {
  return (
    <div className="door-picture" aria-hidden="true">
      <Suspense fallback={null}>
        <Picture isSmall={isSmall} />
      </Suspense>
    </div>
  );
}
