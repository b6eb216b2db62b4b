import { useQueryClient } from '@tanstack/react-query';
import { useEffect, type ReactNode } from 'react';
import { startRealtime } from '../../lib/realtime';
import { Themed } from '../themed';
import { AppLayout } from './app-layout';

/** The whole frame of somebody signed in: theme of the controls, live changes, bars and ribbon. */
export function Frame(): ReactNode {
  const queryClient = useQueryClient();
  useEffect(() => startRealtime(queryClient), [queryClient]);
  return (
    <Themed>
      <AppLayout />
    </Themed>
  );
}
