import { QueryClientProvider } from '@tanstack/react-query';
import { Suspense, useState, type ReactNode } from 'react';
import { createQueryClient } from '../lib/query-client';
import { useThemeChoice } from '../theme/theme-choice';
import { BlankSheet } from './blank-sheet';
import { SessionProvider } from './session';

/** Everything every page stands on: queries, session, theme. What only signed-in pages need comes with their frame. */
export function Providers({ children }: { children: ReactNode }): ReactNode {
  const [queryClient] = useState(createQueryClient);
  // Follows the device for as long as the page is open, on every page.
  useThemeChoice();
  return (
    <QueryClientProvider client={queryClient}>
      <SessionProvider>
        <Suspense fallback={<BlankSheet />}>{children}</Suspense>
      </SessionProvider>
    </QueryClientProvider>
  );
}
