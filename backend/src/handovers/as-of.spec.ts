import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import { describe, expect, it } from 'vitest';
import { asOf, isOwnEvidence } from './as-of.js';

const until = new Date('2027-03-02T16:00:00Z');
const [before, after] = ['2027-03-02T15:00:00Z', '2027-03-02T17:00:00Z'];

const reading = (id: string, receivedAt: string, isStruck = false): Hold['readings'][number] => ({
  ...{
    id,
    at: before,
    receivedAt,
    pressurePsi: 110,
    levelIn: null,
    temperatureF: null,
    gaugeValve: 'open',
    note: null,
  },
  ...{ byName: 'Ruben', byRole: 'plumber', isStruck, struckWhy: isStruck ? 'wrong gauge' : null },
});
const hold = (parts: Partial<Hold>): Hold => ({
  ...{ id: 'h', lotId: 'l', unitNumber: 1, stageCode: 'rough-in', system: 'water', ordinal: 1, method: 'gauge' },
  ...{ medium: 'water', gauge: null, tape: null, fillLevelFt: null, ceilingPsi: null, minimumPsi: 100 },
  ...{ settleMinutes: 0, state: 'standing', startedAt: before, endedAt: null, endReason: null, readings: [] },
  ...parts,
});

// product: "the old crew loses write but keeps its own evidence"
describe('a test as it stood when the lot was handed over', () => {
  it('has no reading that came in later', () => {
    const shown = asOf(hold({ readings: [reading('a', before), reading('b', after)] }), until, new Map());
    expect(shown.readings.map(({ id }) => id)).toEqual(['a']);
  });

  it('shows a reading struck later as it stood, and one struck before as struck', () => {
    const struckAt = new Map([
      ['a', new Date(before)],
      ['b', new Date(after)],
    ]);
    const shown = asOf(hold({ readings: [reading('a', before, true), reading('b', before, true)] }), until, struckAt);
    expect(shown.readings.map(({ isStruck, struckWhy }) => [isStruck, struckWhy])).toEqual([
      [true, 'wrong gauge'],
      [false, null],
    ]);
  });

  it('stands where it ended later, and is ended where it ended by then', () => {
    const ended = { state: 'ended' as const, endReason: 'handed-over' as const };
    expect(asOf(hold({ ...ended, endedAt: after }), until, new Map())).toMatchObject({
      state: 'standing',
      endReason: null,
    });
    expect(asOf(hold({ ...ended, endedAt: until.toISOString() }), until, new Map())).toMatchObject(ended);
  });
});

describe('what is whose evidence', () => {
  const past = { organizationId: 'old', until };
  it.each([
    ['plumber', 'old', before, true],
    ['plumber', 'another', before, false],
    ['plumber', 'old', after, false],
    ['builder', 'another', before, true],
    ['builder', 'another', after, false],
  ] as const)('of a %s: a test of %s that came in at %s: %s', (kind, plumberId, receivedAt, isOwn) => {
    expect(isOwnEvidence({ ...past, kind }, { plumberId, receivedAt: new Date(receivedAt) })).toBe(isOwn);
  });
});
