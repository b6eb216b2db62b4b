import type { Session } from '@holdwater/shared-types/accounts/auth.contract.js';
import type { Me, OrganizationBrief } from '@holdwater/shared-types/accounts/person.contract.js';
import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';
import type { Locale } from '@holdwater/shared-types/common/locale.js';
import { createContext, useContext } from 'react';

/** The organization a person works for now, with the roles there. */
export interface ChosenOrganization {
  readonly organization: OrganizationBrief;
  readonly roles: readonly MemberRole[];
}

export type SessionState =
  | { readonly kind: 'starting' }
  /** `hasLeft`: by an own sign-out, not because the session ran out or never was. */
  | { readonly kind: 'signed-out'; readonly hasLeft: boolean }
  /** No answer at the start: it is not known whether somebody is signed in. */
  | { readonly kind: 'unknown'; readonly error: unknown }
  | { readonly kind: 'signed-in'; readonly me: Me };

export interface SessionValue {
  readonly state: SessionState;
  /** Null unless signed in. */
  readonly me: Me | null;
  /** The organization chosen on this device; null for an operator's frame and for a person of none. */
  readonly chosen: ChosenOrganization | null;
  readonly isOperatorFrame: boolean;
  /** Takes the answer of any route that signs in. */
  readonly accept: (session: Session) => void;
  readonly replaceMe: (me: Me) => void;
  readonly signOut: () => Promise<void>;
  readonly signOutEverywhere: () => Promise<void>;
  /** `null` chooses the operator's frame. */
  readonly chooseOrganization: (organizationId: string | null) => void;
  /** Changes the language here and keeps it on the person. */
  readonly changeLocale: (locale: Locale) => Promise<void>;
  readonly tryAgain: () => void;
}

export const SessionContext = createContext<SessionValue | null>(null);

/** The session; anywhere below `SessionProvider`. */
export function useSession(): SessionValue {
  const value = useContext(SessionContext);
  if (value === null) throw new Error('useSession needs a SessionProvider above it');
  return value;
}

/** Who is signed in; on pages that only signed-in people reach. */
export function useMe(): Me {
  const { me } = useSession();
  if (me === null) throw new Error('useMe needs somebody signed in');
  return me;
}

/** The organization and roles the reader works with now; null for an operator or a person of none. */
export function useOrganization(): ChosenOrganization | null {
  return useSession().chosen;
}
