import type { RuleCard, RuleCardBrief } from '@holdwater/shared-types/departments/departments.contract.js';
import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { departmentQuery } from './api/department';
import { ruleCardQuery } from './api/rule-card';

export interface Against {
  /** The other versions of the department, the newest first. */
  readonly others: readonly RuleCardBrief[];
  /** The one beside it; null for none. */
  readonly card: RuleCard | null;
  readonly choose: (ruleCardId: string | null) => void;
}

const none = 'none';

/** The version a rule card is read against: the one chosen in the address; for a draft, without a choice, the one in force. */
export function useAgainst({ id, state, departmentId }: RuleCard, isPublic: boolean): Against {
  const [search, setSearch] = useSearchParams();
  const department = useQuery({ ...departmentQuery(departmentId), enabled: !isPublic });
  const versions = department.data?.ruleCards ?? [];
  const others = versions.filter((card) => card.id !== id).sort((a, b) => b.version - a.version);
  const usual = state === 'draft' ? (department.data?.department.ruleCard?.id ?? null) : null;
  const asked = search.get('against');
  const chosenId = asked === none ? null : (others.find((card) => card.id === asked)?.id ?? usual);
  const card = useQuery({ ...ruleCardQuery(chosenId ?? ''), enabled: chosenId !== null });
  return {
    others,
    card: chosenId === null ? null : (card.data ?? null),
    choose: (ruleCardId) =>
      setSearch(
        (before) => {
          before.set('against', ruleCardId ?? none);
          return before;
        },
        { replace: true },
      ),
  };
}
