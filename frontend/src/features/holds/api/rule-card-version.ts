import {
  readDepartment,
  readRuleCard,
  type RuleCard,
} from '@holdwater/shared-types/departments/departments.contract.js';
import { queryOptions, skipToken } from '@tanstack/react-query';
import { call } from '../../../lib/api';
import { ApiError } from '../../../lib/api-error';
import { queryKeys } from '../../../lib/query-keys';

export interface RuleCardAsked {
  readonly departmentId: string;
  /** A booked visit keeps the version it was booked under; null: the one in force. */
  readonly version: number | null;
}

/** A rule card of a department by its version. A published version never changes, so it is read once. */
export function ruleCardVersionQuery(asked: RuleCardAsked | null) {
  return queryOptions({
    queryKey: [...queryKeys.ruleCards, 'version', asked],
    queryFn: asked === null ? skipToken : ({ signal }) => readVersion(asked, signal),
    staleTime: asked?.version == null ? 30_000 : Infinity,
  });
}

async function readVersion({ departmentId, version }: RuleCardAsked, signal: AbortSignal): Promise<RuleCard> {
  const { department, ruleCards } = await call(readDepartment, { params: { departmentId } }, { signal });
  const brief =
    version === null
      ? department.ruleCard
      : ruleCards.find((card) => card.version === version && card.state === 'published');
  if (!brief) throw new ApiError('no-rule-card', { status: 409 });
  return call(readRuleCard, { params: { ruleCardId: brief.id } }, { signal });
}
