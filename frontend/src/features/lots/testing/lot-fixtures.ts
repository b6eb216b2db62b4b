import type { Hold, Reading } from '@holdwater/shared-types/holds/hold.contract.js';
import { houseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { LotAbilities, LotDetail, LotSummary } from '@holdwater/shared-types/lots/lot.contract.js';
import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { WaitingItem } from '@holdwater/shared-types/visits/calendar.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { odderly, tallowmere } from '../../../lib/testing/people';

/** Invented lots for specs. */
export const uuid = (tail: number): string => `7c1f0a52-6c1e-4f6e-9a86-${String(tail).padStart(12, '0')}`;

const stage = (code: string, order: number, en: string, state: LotSummary['stages'][number]['state']) => ({
  ...{ code, order, state },
  name: { en },
  systems: code === 'rough-in' ? (['dwv', 'water'] as const).slice() : (['dwv'] as const).slice(),
  units: [{ unitNumber: 1, state }],
});

export function lotOf(
  number: string,
  parts: Partial<LotSummary> = {},
  state: LotSummary['stages'][number]['state'] = 'not-tested',
): LotSummary {
  return {
    id: uuid(Number(number)),
    number,
    tract: { id: uuid(900), name: 'Sorrel Bench, phase 2' },
    address: `${400 + Number(number)} Sedge Loop`,
    permitNumber: '26-04137-P',
    builderName: odderly.name,
    plumberName: 'Dunlatch Plumbing',
    departmentName: tallowmere.name,
    departmentId: tallowmere.id,
    stages: [stage('groundwork', 1, 'Groundwork', 'clear'), stage('rough-in', 2, 'Rough-in', state)],
    currentStage: 'rough-in',
    nextVisit: null,
    openCorrections: 0,
    ...parts,
  };
}

const noAbilities: LotAbilities = {
  ...{
    canEdit: false,
    canEditGeometry: false,
    canSetPermit: false,
    canAttach: false,
    canRequest: false,
    canTest: false,
  },
  ...{ canAddReading: false, canSayTestUp: false, canFix: false, canDecide: false, canComment: false },
};

/** The house of the mockups: plug 3 ft under the first floor, cut 21 ft and vent terminal 24.5 ft over it. */
export const house = houseGeometry.parse({
  floors: [
    { name: 'first', elevationFt: 0 },
    { name: 'second', elevationFt: 10 },
  ],
  lowestFittingFt: -2,
  highestFittingFt: 13.5,
  ventTerminalFt: 24.5,
  atticCutFt: 21,
  laundry: { floor: 'second', boxOutletFt: 13.5, branchFt: 10.8 },
  pipeMaterial: 'pvc',
  plugs: [{ name: 'building drain', elevationFt: -3, ratedPsi: 17, nominalIn: 4 }],
});

export function lotDetailOf(abilities: Partial<LotAbilities>, parts: Partial<LotDetail> = {}): LotDetail {
  return {
    ...lotOf('17'),
    ...{ latitude: null, longitude: null, zone: 'America/Denver', mayPlumberRequest: false, coverDate: null },
    permit: { number: '26-04137-P', status: 'issued', holder: null },
    units: [{ number: 1, label: 'House', geometry: house }],
    access: null,
    parties: [
      { kind: 'builder', organization: odderly, status: 'attached', people: [] },
      { kind: 'department', organization: tallowmere, status: 'pending', people: [] },
    ],
    handovers: [],
    ruleCard: null,
    abilities: { ...noAbilities, ...abilities },
    ...parts,
  };
}

export function readingOf(at: string, parts: Partial<Reading> = {}): Reading {
  return {
    id: uuid(Math.trunc(Date.parse(at) / 1000) % 1_000_000),
    ...{ at, receivedAt: at, pressurePsi: 112, levelIn: null, temperatureF: 56, gaugeValve: 'open' as const },
    ...{ note: null, byName: 'Ruben Achterberg', byRole: 'plumber' as const, isStruck: false, struckWhy: null },
    ...parts,
  };
}

export function holdOf(parts: Partial<Hold> = {}): Hold {
  return {
    ...{ id: uuid(300), lotId: uuid(17), unitNumber: 1, stageCode: 'rough-in', system: 'water', ordinal: 1 },
    ...{ method: 'gauge', medium: 'water', gauge: { rangePsi: 160, incrementPsi: 2 }, tape: null, fillLevelFt: null },
    ...{ ceilingPsi: 126, minimumPsi: 100, settleMinutes: 60, state: 'standing', startedAt: '2026-04-14T22:52:00Z' },
    ...{ endedAt: null, endReason: null, readings: [] },
    ...parts,
  };
}

export function waitingOf(lotNumber: string, parts: Partial<WaitingItem> = {}): WaitingItem {
  return {
    ...{ kind: 'no-window', isOnYou: true, waitsOn: odderly.name, lotId: uuid(Number(lotNumber)), lotNumber },
    ...{ tractName: 'Sorrel Bench, phase 2', visitId: null, count: 1, by: null, zone: null, isPastTime: false },
    ...parts,
  };
}

export function visitOf(parts: Partial<VisitSummary> = {}): VisitSummary {
  return {
    ...{
      id: uuid(500),
      lotId: uuid(17),
      lotNumber: '17',
      tractName: 'Sorrel Bench, phase 2',
      address: '417 Sedge Loop',
    },
    ...{ builderName: odderly.name, plumberName: 'Dunlatch Plumbing', departmentId: tallowmere.id },
    ...{
      departmentName: tallowmere.name,
      zone: 'America/Denver',
      stageCode: 'rough-in',
      stageName: { en: 'Rough-in' },
    },
    ...{ ruleCardVersion: 6, unitNumbers: [1], state: 'booked', version: 3, plannedStartAt: null, plannedEndAt: null },
    window: { date: '2030-04-17', label: 'morning', startAt: '2030-04-17T15:00:00Z', endAt: '2030-04-17T17:00:00Z' },
    ...{ inspector: null, systemsUp: [], upSince: null, upBy: null, outcome: null, endReason: null, endNote: null },
    ...{ openCorrections: 0, isRetest: false, hasFirstPlace: false, neededBy: null, note: null, moves: [] },
    requestedAt: '2026-04-13T15:00:00Z',
    ...parts,
  };
}

export function correctionOf(parts: Partial<Correction> = {}): Correction {
  return {
    ...{ id: uuid(700), lotId: uuid(17), lotNumber: '17', tractName: null, unitNumber: 1, stageCode: 'rough-in' },
    ...{ visitId: uuid(500), number: 1, subject: 'dwv', pointCode: null, text: 'Drip at the laundry tee' },
    ...{ place: 'whole-system', floor: 'second', room: 'laundry', severity: 'fix-before-cover', section: '7-204' },
    ...{ state: 'open', version: 1, openedAt: '2026-04-10T16:00:00Z', openedBy: 'Noor Haverty', fixedAt: null },
    ...{ fixedBy: null, fixNote: null, reopenedWhy: null, acceptedAt: null, acceptedBy: null },
    abilities: { canFix: false, canDecide: false },
    ...parts,
  };
}
