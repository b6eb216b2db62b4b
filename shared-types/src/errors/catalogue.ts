import type { MissingThing } from './missing-things.js';

/**
 * Every error a person can meet, once. The code is the key of its words in both languages (`errors.<code>`); the same body goes over HTTP
 * and the socket. A refusal that is expected has a code of its own.
 */
export const errorCatalogue = {
  // request
  'bad-input': 400,
  'too-large': 413,
  'not-found': 404,
  'signed-out': 401,
  'not-allowed': 403,
  'idempotency-key-reused': 409,
  'stale-state': 409,
  busy: 503,
  internal: 500,
  // accounts
  'sign-in-failed': 401,
  'sign-in-throttled': 429,
  'link-expired': 410,
  'password-common': 400,
  'session-reused': 401,
  'already-member': 409,
  'last-owner': 409,
  'email-taken': 409,
  // departments
  'rule-card-overlap': 409,
  'rule-card-not-draft': 409,
  'rule-card-in-the-past': 400,
  'rule-card-incomplete': 400,
  'no-rule-card': 409,
  // lots
  'lot-number-taken': 409,
  'tract-name-taken': 409,
  'house-model-name-taken': 409,
  'house-model-in-use': 409,
  'houses-changed-by-hand': 409,
  'house-cannot-be': 409,
  'party-pending': 409,
  'party-already-attached': 409,
  'party-has-visit': 409,
  // visits
  'window-past': 409,
  'window-closed': 409,
  'window-full': 409,
  'window-unknown': 400,
  'cut-off-passed': 409,
  'beyond-horizon': 409,
  'too-many-lots': 400,
  'permit-not-issued': 409,
  'may-not-request': 403,
  'open-visit-exists': 409,
  'corrections-open': 409,
  'stage-unknown': 400,
  'stage-passed': 409,
  'lot-without-department': 409,
  'move-not-allowed': 409,
  'window-not-open': 409,
  'undo-too-late': 409,
  'visit-of-another': 409,
  // plans
  'no-house': 409,
  'plan-not-usable': 409,
  // holds
  'hold-standing': 409,
  'hold-ended': 409,
  'reading-struck': 409,
  'reading-missing': 409,
  'reading-out-of-gauge': 400,
  'method-not-accepted': 409,
  'over-limit': 409,
  'reading-in-the-future': 400,
  'said-too-late': 409,
  // outcomes
  'fail-needs-a-correction': 400,
  'answers-missing': 400,
  'pass-with-open-correction': 400,
  'correction-unfixed': 409,
} as const satisfies Record<string, number>;

export type ErrorCode = keyof typeof errorCatalogue;
/** What refusals carry whose words are made of it; every other carries what it likes. */
interface TypedParams {
  'not-found': { what?: MissingThing };
}
export type ErrorParams<C extends ErrorCode> = C extends keyof TypedParams ? TypedParams[C] : Record<string, unknown>;
export const errorCodes = Object.keys(errorCatalogue) as ErrorCode[];
