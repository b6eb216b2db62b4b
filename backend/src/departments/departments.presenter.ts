import type { Department, RuleCard, RuleCardBrief } from '@holdwater/shared-types/departments/departments.contract.js';
import type { DepartmentRecord } from './departments.queries.js';
import type { RuleCardVersion } from './rule-cards.queries.js';

/** `today` is the day it is in the department. */
export function presentRuleCardBrief(card: RuleCardVersion, today: string): RuleCardBrief {
  const { id, departmentId, version, state, effectiveFrom, effectiveTo } = card;
  const isInForce = effectiveFrom !== null && effectiveFrom <= today && (effectiveTo === null || today <= effectiveTo);
  return { id, departmentId, version, state, effectiveFrom, effectiveTo, isInForce };
}

/** `isOwn`: for a member of its department, who is told by whom it was changed. */
export function presentRuleCard(
  card: RuleCardVersion,
  department: DepartmentRecord,
  today: string,
  isOwn: boolean,
): RuleCard {
  const { editedBy, editedAt } = card;
  return {
    ...presentRuleCardBrief(card, today),
    departmentName: department.name,
    zone: department.zone,
    content: card.content,
    publishedAt: card.publishedAt?.toISOString() ?? null,
    edited: isOwn && editedBy !== null && editedAt !== null ? { by: editedBy, at: editedAt.toISOString() } : null,
  };
}

export function presentDepartment(
  department: DepartmentRecord,
  inForce: RuleCardVersion | null,
  today: string,
): Department {
  return { ...department, ruleCard: inForce && presentRuleCardBrief(inForce, today) };
}
