import type { ReactNode } from 'react';
import { useSession } from '../../../app/session';
import { Lines } from '../../../components/lines';
import { PublicRuleCards } from '../components/public-rule-cards';
import { RuleCardDesk } from '../components/rule-card-desk';
import '../departments.css';

/** The rule cards: for anyone one version in one column; signed in with the versions beside it, and the desk's acts for the desk. */
export function RuleCardPage(): ReactNode {
  const { state } = useSession();
  // Before it is known who reads, the public answer would be shown first and then replaced.
  if (state.kind === 'starting') return <Lines />;
  return state.kind === 'signed-in' ? <RuleCardDesk /> : <PublicRuleCards />;
}
