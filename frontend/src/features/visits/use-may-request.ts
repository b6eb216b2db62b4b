import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';
import { useOrganization } from '../../lib/session-context';

/** Whose bars carry the act (interface guide, section 4). Whether a lot may be asked for is the server's word on that lot. */
const asking: readonly MemberRole[] = ['superintendent', 'plumber', 'desk'];

/** Whether asking for a window is offered here at all. */
export function useMayRequest(): boolean {
  const chosen = useOrganization();
  return chosen !== null && asking.some((role) => chosen.roles.includes(role));
}
