import type { Locale } from '@holdwater/shared-types/common/locale.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { sayDone } from '../../components/done-line';
import { Choice } from '../../components/choice';
import { useLocale } from '../../lib/i18n';
import { useSession } from '../../lib/session-context';

/** Each language by its own name, whatever the page's language is. */
const names: readonly { value: Locale; label: string }[] = [
  { value: 'en', label: 'English' },
  { value: 'es', label: 'Español' },
];

/** English or Spanish; kept on the person when somebody is signed in. */
export function LanguageChoice({ isLabelShown = false }: { isLabelShown?: boolean }): ReactNode {
  const { t } = useTranslation('app');
  const locale = useLocale();
  const { changeLocale } = useSession();
  const change = (next: Locale): void => {
    changeLocale(next).catch(() => sayDone({ mark: 'no-signal', title: t('languageNotKept') }));
  };
  return <Choice label={t('language')} isLabelShown={isLabelShown} options={names} value={locale} onChange={change} />;
}
