import type { Correction, NewCorrection } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import { describe, expect, it } from 'vitest';
import { emptyOutcome, emptySystem, toRecord, type OutcomeDraft, type Subject } from './outcome-draft';
import { verdictOf } from './outcome-verdict';

// The rules are those of the project's own definitions ("Visit outcome from its systems"); no published source.

const subjects: Subject[] = [
  { unitNumber: 1, system: 'dwv' },
  { unitNumber: 1, system: 'water' },
];
const drip: NewCorrection = {
  clientId: '3d1a9f0e-51a7-4c55-8a1a-7b8a3f0e9d01',
  unitNumber: 1,
  subject: 'dwv',
  text: 'Drip at the shower tee',
  place: { x: 0.7, y: 0.5 },
  severity: 'fix-before-cover',
};

function answered(
  dwv: 'pass' | 'fail' | 'not-seen' | null,
  water: typeof dwv,
  more: Partial<OutcomeDraft> = {},
): OutcomeDraft {
  const systems = { '1.dwv': { ...emptySystem, answer: dwv }, '1.water': { ...emptySystem, answer: water } };
  return { ...emptyOutcome, systems, ...more };
}

const earlier = (state: 'open' | 'fixed'): Correction[] => [
  {
    ...drip,
    id: '3d1a9f0e-51a7-4c55-8a1a-7b8a3f0e9d02',
    lotId: drip.clientId,
    lotNumber: '52',
    tractName: null,
    stageCode: 'rough-in',
    visitId: drip.clientId,
    number: 1,
    pointCode: null,
    place: 'whole-system',
    floor: null,
    room: null,
    section: null,
    state,
    version: 1,
    openedAt: '2026-04-10T15:00:00Z',
    openedBy: 'Noor Haverty',
    fixedAt: null,
    fixedBy: null,
    fixNote: null,
    reopenedWhy: null,
    acceptedAt: null,
    acceptedBy: null,
    abilities: { canFix: false, canDecide: true },
  },
];

describe('what a draft comes to', () => {
  it('is nothing before anything is answered, and names what is missing', () => {
    expect(verdictOf(emptyOutcome, subjects, []).why).toEqual({ code: 'nothing' });
    expect(verdictOf(answered('pass', null), subjects, []).why).toEqual({ code: 'answer', subject: subjects[1] });
  });

  it('passes when every system passes, and fails when one was not seen', () => {
    expect(verdictOf(answered('pass', 'pass'), subjects, [])).toMatchObject({ kind: 'pass', why: null });
    expect(verdictOf(answered('pass', 'not-seen'), subjects, [])).toMatchObject({ kind: 'fail', isNotSeen: true });
  });

  it('a fail needs one correction of that system', () => {
    expect(verdictOf(answered('fail', 'pass'), subjects, []).why?.code).toBe('fail-bare');
    expect(verdictOf(answered('fail', 'pass', { corrections: [drip] }), subjects, [])).toMatchObject({
      kind: 'fail',
      open: { dwv: 1, water: 0, work: 0 },
    });
    expect(verdictOf(answered('fail', 'pass'), subjects, earlier('open')).kind).toBe('fail');
  });

  it('cannot pass over a correction to fix before cover; accepted, a fixed one is out of the way', () => {
    expect(verdictOf(answered('pass', 'pass'), subjects, earlier('open')).why?.code).toBe('pass-open');
    const [one] = earlier('fixed');
    const accepted = answered('pass', 'pass', { decisions: { [one?.id ?? '']: { is: 'accept' } } });
    expect(verdictOf(accepted, subjects, earlier('fixed')).kind).toBe('pass');
  });

  it('the work fails by a correction to fix before cover, not by a note', () => {
    const onWork = (severity: NewCorrection['severity']): OutcomeDraft =>
      answered('pass', 'pass', { corrections: [{ ...drip, subject: 'work', severity }] });
    expect(verdictOf(onWork('fix-before-cover'), subjects, []).kind).toBe('fail');
    expect(verdictOf(onWork('note'), subjects, []).kind).toBe('pass');
  });

  it('a reopened one needs its reason and stays open', () => {
    const [one] = earlier('fixed');
    const id = one?.id ?? '';
    const without = answered('fail', 'pass', { decisions: { [id]: { is: 'reopen', why: ' ' } } });
    expect(verdictOf(without, subjects, earlier('fixed')).why?.code).toBe('reopen-why');
    const withWhy = answered('fail', 'pass', { decisions: { [id]: { is: 'reopen', why: 'still wet' } } });
    expect(verdictOf(withWhy, subjects, earlier('fixed'))).toMatchObject({ kind: 'fail', open: { dwv: 1 } });
    expect(toRecord(withWhy, subjects, 4, () => false).result).toMatchObject({
      reopened: [{ correctionId: id, why: 'still wet' }],
    });
  });

  it('not ready and no access need only their reason', () => {
    expect(verdictOf({ ...emptyOutcome, kind: 'no-access' }, subjects, []).why?.code).toBe('reason');
    const locked: OutcomeDraft = { ...emptyOutcome, kind: 'no-access', noAccess: 'locked' };
    expect(verdictOf(locked, subjects, []).kind).toBe('no-access');
    expect(toRecord(locked, subjects, 4, () => false)).toEqual({
      expectedVersion: 4,
      note: null,
      result: { kind: 'no-access', reason: 'locked' },
    });
  });
});

it('a level is sent as a level, a gauge with what its needle did', () => {
  const draft: OutcomeDraft = {
    ...emptyOutcome,
    systems: {
      '1.dwv': { ...emptySystem, answer: 'pass', reading: '1.5', needle: 'jumped' },
      '1.water': { ...emptySystem, answer: 'pass', reading: '111', needle: 'jumped' },
    },
  };
  const { result } = toRecord(draft, subjects, 4, ({ system }) => system === 'dwv');
  expect(result).toMatchObject({
    systems: [
      { system: 'dwv', answer: 'pass', needle: null, levelIn: 1.5 },
      { system: 'water', answer: 'pass', needle: 'jumped', pressurePsi: 111 },
    ],
  });
});
