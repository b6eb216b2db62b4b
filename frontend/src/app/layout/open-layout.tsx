import { Suspense, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link, Outlet, useLocation } from 'react-router-dom';
import { Act } from '../../components/act';
import { BrandMark } from '../../components/brand-mark';
import { DoneLine } from '../../components/done-line';
import { Lines } from '../../components/lines';
import { Themed } from '../themed';
import { LanguageChoice } from './language-choice';

/** The frame of pages that anyone may read, for those who are not signed in. */
export function OpenLayout(): ReactNode {
  const { t } = useTranslation('app');
  const { pathname } = useLocation();
  return (
    <div className="sheet framed open">
      <a className="skip btn" href="#page">
        {t('skip')}
      </a>
      <header className="top">
        <Link className="brand" to="/sign-in" aria-label="Holdwater">
          <BrandMark size={26} />
          <span className="brand-word">Holdwater</span>
        </Link>
        <nav className="nav" aria-label={t('sheetsName')}>
          <ul>
            <li>
              <Link to="/rule-cards" aria-current={pathname.startsWith('/rule-cards') ? 'page' : undefined}>
                {t('sheets.ruleCards')}
              </Link>
            </li>
          </ul>
        </nav>
        <div className="cell">
          <LanguageChoice />
        </div>
        <div className="cell">
          <Act size="sm" to="/sign-in">
            {t('signIn')}
          </Act>
        </div>
      </header>
      <main id="page" tabIndex={-1}>
        <Themed>
          <Suspense fallback={<Lines />}>
            <Outlet />
          </Suspense>
        </Themed>
      </main>
      <DoneLine />
    </div>
  );
}
