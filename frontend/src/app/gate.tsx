import type { ReactNode } from 'react';
import { useMatches } from 'react-router-dom';
import type { RouteHandle } from './route-handle';
import { SignedIn } from './signed-in';

export interface GateProps {
  /** The frame of somebody signed in. */
  frame: ReactNode;
  /** The frame of anybody else, for pages that anyone may read. */
  openFrame: ReactNode;
}

/** One gate for all pages but those that sign in, so that the frame stays while its person walks from page to page. */
export function Gate({ frame, openFrame }: GateProps): ReactNode {
  const isOpen = useMatches().some((match) => (match.handle as RouteHandle | undefined)?.isOpen === true);
  return <SignedIn otherwise={isOpen ? openFrame : undefined}>{frame}</SignedIn>;
}
