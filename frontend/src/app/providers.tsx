import { QueryClientProvider, useQueryClient } from '@tanstack/react-query';
import { ConfigProvider } from 'antd';
import enUS from 'antd/locale/en_US';
import esES from 'antd/locale/es_ES';
import { Suspense, useEffect, useState, type ReactNode } from 'react';
import { Lines } from '../components/lines';
import { useLocale } from '../lib/i18n';
import { createQueryClient } from '../lib/query-client';
import { startRealtime } from '../lib/realtime';
import { antdTheme, readCspNonce } from '../theme/antd-theme';
import { useThemeChoice } from '../theme/theme-choice';
import { SessionProvider } from './session';

const antdLocales = { en: enUS, es: esES };

/** Everything a page stands on: queries, session, live changes, theme, words. */
export function Providers({ children }: { children: ReactNode }): ReactNode {
  const [queryClient] = useState(createQueryClient);
  return (
    <QueryClientProvider client={queryClient}>
      <Suspense fallback={null}>
        <Themed>
          <SessionProvider>
            <Live />
            <Suspense fallback={<Lines />}>{children}</Suspense>
          </SessionProvider>
        </Themed>
      </Suspense>
    </QueryClientProvider>
  );
}

function Themed({ children }: { children: ReactNode }): ReactNode {
  const { theme } = useThemeChoice();
  const locale = useLocale();
  const [nonce] = useState(readCspNonce);
  return (
    <ConfigProvider theme={antdTheme(theme)} locale={antdLocales[locale]} csp={nonce === '' ? undefined : { nonce }}>
      {children}
    </ConfigProvider>
  );
}

function Live(): ReactNode {
  const queryClient = useQueryClient();
  useEffect(() => startRealtime(queryClient), [queryClient]);
  return null;
}
