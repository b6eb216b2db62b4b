import { ConfigProvider } from 'antd';
import enUS from 'antd/locale/en_US';
import esES from 'antd/locale/es_ES';
import { useState, type ReactNode } from 'react';
import { useLocale } from '../lib/i18n';
import { antdTheme, readCspNonce } from '../theme/antd-theme';
import { useThemeChoice } from '../theme/theme-choice';

const antdLocales = { en: enUS, es: esES };

/** antd in our theme and language, its style tags with the page's nonce. Not on the sign-in page, which uses none of it. */
export function Themed({ children }: { children: ReactNode }): ReactNode {
  const { theme } = useThemeChoice();
  const locale = useLocale();
  const [nonce] = useState(readCspNonce);
  return (
    <ConfigProvider theme={antdTheme(theme)} locale={antdLocales[locale]} csp={nonce === '' ? undefined : { nonce }}>
      {children}
    </ConfigProvider>
  );
}
