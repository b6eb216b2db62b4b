import { askPasswordReset, askSignInLink } from '@holdwater/shared-types/accounts/auth.contract.js';
import { useMutation } from '@tanstack/react-query';
import { call } from '../../../lib/api';

/** What a person without their password may have mailed. */
export type MailKind = 'link' | 'reset';

export const askRoutes = { link: askSignInLink, reset: askPasswordReset } as const;

/** Has a link mailed; the answer never tells whether the address is known. */
export function useAskMail(kind: MailKind) {
  return useMutation({ mutationFn: (body: { email: string }) => call(askRoutes[kind], { body }) });
}
