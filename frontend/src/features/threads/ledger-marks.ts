import type { LedgerEntry } from '@holdwater/shared-types/ledger/ledger.contract.js';
import { isMarkName, type MarkName } from '../../components/mark-names';
import { textOf } from './ledger-payload';

const byKind: Readonly<Record<string, MarkName>> = {
  'visit-requested': 'requested',
  'visit-booked': 'booked',
  'visit-moved': 'booked',
  'visit-withdrawn': 'withdrawn',
  'visit-declined': 'declined',
  'visit-freed': 'freed',
  'visit-not-reached': 'requested',
  'visit-restored': 'booked',
  'visit-first-in-line': 'requested',
  'visit-begun': 'underway',
  'visit-begin-undone': 'booked',
  'plan-chosen': 'not-tested',
  'test-started': 'under-test',
  'reading-added': 'test-few',
  'reading-struck': 'test-few',
  'test-ended': 'test-ended',
  'test-up': 'ready',
  'no-longer-up': 'booked',
  'correction-opened': 'correction-open',
  'correction-fixed': 'correction-fixed',
  'correction-accepted': 'correction-accepted',
  'correction-reopened': 'correction-open',
};

/** The mark beside an entry of the ledger; null where no state has one. */
export function ledgerMark({ kind, payload }: LedgerEntry): MarkName | null {
  const state = kind === 'outcome' ? textOf(payload, 'kind') : kind === 'plumbing-state' ? textOf(payload, 'to') : null;
  if (state !== null) return isMarkName(state) ? state : null;
  return byKind[kind] ?? null;
}
