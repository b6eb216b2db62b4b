import type { LedgerEntry } from '@holdwater/shared-types/ledger/ledger.contract.js';
import { renderHook } from '@testing-library/react';
import i18next from 'i18next';
import { afterAll, describe, expect, it } from 'vitest';
// The server's own union of kinds, as text: an entry it learns to write must have words here.
import kindsSource from '../../../../backend/src/ledger/ledger.kinds.ts?raw';
import { useLedgerWords } from './ledger-words';

const kinds = [...kindsSource.matchAll(/^ {2}'?([a-z-]+)'?: \{/gm)].map(([, kind]) => kind ?? '');
const zone = 'America/Denver';

const entryOf = (kind: string, payload: Record<string, unknown> = {}): LedgerEntry => ({
  sequence: 1,
  at: '2026-04-14T23:08:00Z',
  kind,
  actorName: 'Ruben Achterberg',
  actorRole: 'plumber',
  payload,
  hash: '0',
});

/** Something under every name that an entry may carry. */
const everything = {
  name: 'Millpond',
  kind: 'plumber',
  email: 'ada@dunlatch.example.test',
  roles: ['plumber'],
  version: 7,
  effectiveFrom: '2026-05-01',
  date: '2026-05-01',
  from: '08:00',
  to: '12:00',
  why: 'road closed',
  fields: ['address', 'coverDate'],
  number: 52,
  address: '418 Sedge Loop',
  unitNumber: 1,
  organizationName: 'Dunlatch Plumbing',
  stageCode: 'rough-in',
  startAt: '2026-04-15T15:00:00Z',
  endAt: '2026-04-15T17:00:00Z',
  inspectorName: 'Noor Haverty',
  reason: 'weather',
  system: 'water',
  subject: 'work',
  ordinal: 2,
  method: 'gauge',
  pressurePsi: 118,
};

function say(kind: string, payload: Record<string, unknown> = {}): string {
  const { result } = renderHook(() => useLedgerWords());
  return result.current(entryOf(kind, payload), zone);
}

afterAll(() => i18next.changeLanguage('en'));

describe.each(['en', 'es'] as const)('in %s', (language) => {
  it('every kind the server writes has words, with no hole and no code in them', async () => {
    await i18next.changeLanguage(language);
    expect(kinds.length).toBeGreaterThan(35);
    const bare = kinds.filter((kind) => {
      const states = kind === 'plumbing-state' ? { from: 'under-test', to: 'clear' } : {};
      const words = say(kind, { ...everything, ...states, ...(kind === 'outcome' ? { kind: 'fail' } : {}) });
      return words === '' || words === kind || words.includes('{{') || words.includes('ledger.');
    });
    expect(bare).toEqual([]);
  });
});

describe('the words of an entry', () => {
  it('tell windows on the clock of the department', async () => {
    await i18next.changeLanguage('en');
    const window = { startAt: '2026-04-15T15:00:00Z', endAt: '2026-04-15T17:00:00Z' };
    expect(say('visit-booked', { ...window, inspectorName: 'Noor Haverty' })).toBe(
      'Window booked: Wed, Apr 15, 9:00–11:00 am, Noor Haverty',
    );
  });

  it('know codes from words of a person', () => {
    expect(say('visit-withdrawn', { reason: 'weather' })).toBe('Visit withdrawn: weather');
    expect(say('visit-freed', { reason: 'Flood. <b>Road</b> closed' })).toBe('Window freed: Flood. <b>Road</b> closed');
    expect(say('correction-reopened', { number: 2, why: 'still wet' })).toBe('Correction 2 reopened: still wet');
  });

  it('tell a reading by what it was read on', () => {
    expect(say('reading-added', { system: 'water', pressurePsi: 118, levelIn: null, gaugeValve: 'open' })).toBe(
      'Water reads 118 psi',
    );
    expect(say('reading-added', { system: 'water', pressurePsi: 108, levelIn: null, gaugeValve: 'shut' })).toBe(
      'Water gauge reads 108 psi, valve shut',
    );
    expect(say('reading-added', { system: 'dwv', pressurePsi: null, levelIn: 1.5 })).toBe(
      'DWV level 1.5 in below the rim',
    );
  });

  it('tell an outcome by its systems, or by its reason', () => {
    const systems = [
      { unitNumber: 1, system: 'dwv', answer: 'fail' },
      { unitNumber: 1, system: 'water', answer: 'not-seen' },
    ];
    expect(say('outcome', { kind: 'fail', reason: null, systems })).toBe('Outcome fail: DWV fail, Water not seen');
    expect(say('outcome', { kind: 'no-access', reason: 'locked', systems: [] })).toBe('Outcome no access: locked');
  });

  it('give a kind of a newer server by its code', () => {
    expect(say('moon-landed')).toBe('moon-landed');
  });
});
