import type { Notice } from '@holdwater/shared-types/notices/notice.contract.js';

/** Where a notice leads: mostly the lot it is about. */
export function noticeLink({ kind, lotId, params }: Notice): string | null {
  if (kind === 'consent-asked') return '/consents';
  if (kind === 'rule-card-published') {
    const ruleCardId = params['ruleCardId'];
    return typeof ruleCardId === 'string' ? `/rule-cards/${ruleCardId}` : '/rule-cards';
  }
  if (lotId === null) return null;
  // those who were replaced read only what there was until then
  if (params['hasLeft'] === true) return `/past-lots/${lotId}`;
  return kind === 'comment' ? `/lots/${lotId}/thread` : `/lots/${lotId}`;
}
