/**
 * Who may reach a route at all. What they may do to one particular lot or visit is decided by that resource's policy, named here so that
 * a reader finds it; missing and forbidden look alike (404).
 */
export type Access =
  { readonly kind: 'anyone' } | { readonly kind: 'signed-in'; readonly policy: string } | { readonly kind: 'operator' };

/** No sign-in asked for: only for sign-in itself, health and `/api/public/`. */
export const anyone: Access = { kind: 'anyone' };

/** Any signed-in person; `policy` names the predicate that decides the rest, or `own` for what is one's own. */
export const signedIn = (policy: string): Access => ({ kind: 'signed-in', policy });

export const operatorOnly: Access = { kind: 'operator' };

export const ACCESS = 'holdwater:access';
