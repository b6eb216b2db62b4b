import type { LedgerEntry } from '@holdwater/shared-types/ledger/ledger.contract.js';

type Payload = LedgerEntry['payload'];

/** What an entry carries is of its kind; the page reads it without trusting it to be there. */
export function textOf(payload: Payload, name: string): string | null {
  const value = payload[name];
  return typeof value === 'string' && value !== '' ? value : null;
}

export function numberOf(payload: Payload, name: string): number | null {
  const value = payload[name];
  return typeof value === 'number' ? value : null;
}

export function listOf(payload: Payload, name: string): unknown[] {
  const value = payload[name];
  return Array.isArray(value) ? (value as unknown[]) : [];
}

/** Texts of a list, others left out. */
export function textsOf(payload: Payload, name: string): string[] {
  return listOf(payload, name).filter((one) => typeof one === 'string');
}
