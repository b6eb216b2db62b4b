import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import { ruleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import { ruleCardFaults } from '@holdwater/shared-types/departments/rule-card-faults.js';
import { isApiError } from '../../../lib/api-error';

/** What is wrong by path, as codes that have words. */
export type Faults = Readonly<Record<string, string>>;

/** The contract's own faults: with these a draft cannot be saved. */
export function contractFaults(content: RuleCardContent): Faults {
  const parsed = ruleCardContent.safeParse(content, { error: (issue) => codeOf(issue) });
  if (parsed.success) return {};
  // the first fault of a field is the one to mend first
  const named = parsed.error.issues.map(({ path, message }): [string, string] => [path.join('.'), message]);
  return Object.fromEntries(named.reverse());
}

/** What keeps it from being published, for a content that can be saved. */
export function publishingFaults(content: RuleCardContent): Faults {
  const faults = contractFaults(content);
  return Object.keys(faults).length > 0 ? faults : ruleCardFaults(content);
}

/** The server's word, named by the place in the content. */
export function refusedFaults(error: unknown): Faults {
  if (!isApiError(error)) return {};
  return Object.fromEntries(Object.entries(error.fields).map(([path, code]) => [path.replace(/^content\./, ''), code]));
}

function codeOf(issue: { code: string; input?: unknown; origin?: string }): string {
  if (issue.code === 'invalid_type') return typeof issue.input === 'number' ? 'must-be-a-number' : 'required';
  if (issue.code === 'too_small' && (issue.origin === 'string' || issue.origin === 'array')) return 'required';
  if (issue.code === 'too_big' && issue.origin === 'string') return 'too-long';
  if (issue.code === 'too_big' && issue.origin === 'array') return 'too-many';
  return issue.code === 'too_small' || issue.code === 'too_big' ? 'out-of-range' : 'wrong';
}
