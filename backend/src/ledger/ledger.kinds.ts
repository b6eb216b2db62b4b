/** One builder or plumber of a lot in the place of another. */
interface HandoverPayload {
  kind: string;
  organizationId: string;
  organizationName: string;
  formerId: string;
  formerName: string;
}

/**
 * Every kind of ledger entry and what it carries: a closed union. Payloads hold codes and values, never words in a language, never secrets.
 */
export interface LedgerPayloads {
  'organization-added': { name: string; kind: string };
  'person-invited': { email: string; roles: string[] };
  'person-joined': { personId: string; roles: string[] };
  'person-changed': { personId: string; roles?: string[]; isDisabled?: boolean };
  'invitation-withdrawn': { email: string };
  'operator-joined': { personId: string };
  'password-changed': { personId: string };
  'session-reused': { personId: string };
  'rule-card-drafted': { ruleCardId: string; version: number };
  'rule-card-draft-deleted': { ruleCardId: string; version: number };
  'rule-card-published': { ruleCardId: string; version: number; effectiveFrom: string };
  'closure-added': { date: string; from: string | null; to: string | null; why: string };
  'closure-removed': { date: string };
  'tract-added': { name: string };
  'tract-changed': { name: string; fields: string[] };
  'lot-added': { number: string; address: string; builderId: string };
  'lot-changed': { fields: string[]; permitStatus?: string; permitNumber?: string | null };
  'geometry-set': { unitNumber: number };
  'house-applied': { unitNumber: number; modelId: string; name: string; version: number; keptChanges: string[] };
  'house-model-added': { modelId: string; name: string };
  'house-model-renamed': { modelId: string; name: string; formerName: string };
  'house-model-versioned': { modelId: string; name: string; version: number };
  'house-model-removed': { modelId: string; name: string };
  'party-asked': { kind: string; organizationId: string; organizationName: string };
  'party-joined': { kind: string; organizationId: string; organizationName: string };
  'party-refused': { kind: string; organizationId: string; organizationName: string; why: string | null };
  'handover-asked': HandoverPayload;
  'handover-withdrawn': HandoverPayload;
  'handover-refused': HandoverPayload & { why: string | null };
  'party-replaced': HandoverPayload & { takenOver: number };
  'visit-requested': { visitId: string; stageCode: string; startAt: string; endAt: string; callerName: string | null };
  'visit-booked': { visitId: string; stageCode: string; startAt: string; endAt: string; inspectorName: string };
  'visit-moved': { visitId: string; fromStartAt: string; startAt: string; endAt: string };
  'visit-withdrawn': { visitId: string; reason: string };
  'visit-declined': { visitId: string; reason: string };
  'visit-freed': { visitId: string; reason: string };
  'visit-not-reached': { visitId: string };
  'visit-restored': {
    visitId: string;
    freedVisitId: string;
    stageCode: string;
    startAt: string;
    endAt: string;
    inspectorName: string;
    madeAt: string;
  };
  'visit-first-in-line': {
    visitId: string;
    freedVisitId: string;
    stageCode: string;
    startAt: string;
    endAt: string;
    madeAt: string;
  };
  'plan-chosen': {
    planId: string;
    unitNumber: number;
    stageCode: string;
    system: string;
    method: string;
    medium: string;
    ruleCardVersion: number;
  };
  'test-started': { holdId: string; system: string; ordinal: number; method: string; unitNumber: number };
  'reading-added': {
    holdId: string;
    system: string;
    readingId: string;
    pressurePsi: number | null;
    levelIn: number | null;
    gaugeValve: string | null;
    madeAt: string;
  };
  'reading-struck': { holdId: string; readingId: string; why: string };
  'test-ended': { holdId: string; system: string; ordinal: number; reason: string };
  'test-up': { visitId: string; readingIds: string[]; madeAt: string };
  'no-longer-up': { visitId: string };
  'visit-begun': { visitId: string; takenOver: boolean };
  'visit-begin-undone': { visitId: string };
  outcome: {
    visitId: string;
    kind: string;
    reason: string | null;
    systems: Array<{ unitNumber: number; system: string; answer: string }>;
  };
  'correction-opened': { correctionId: string; number: number; subject: string; severity: string };
  'correction-fixed': { correctionId: string; number: number };
  'correction-accepted': { correctionId: string; number: number };
  'correction-reopened': { correctionId: string; number: number; why: string };
  'plumbing-state': { unitNumber: number; stageCode: string; from: string; to: string };
  comment: { commentId: string };
}
