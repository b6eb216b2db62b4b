import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import type { RuleCardContent, TestRule } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { Hold, Reading } from '@holdwater/shared-types/holds/hold.contract.js';
import { houseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { LotAbilities, LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { odderly, tallowmere } from '../../../lib/testing/people';

/** An invented lot with its rule card, visit and tests, for specs. */
export const lotId = '1f6f5a44-3a3e-4d1e-9a54-6a4d0a7f0052';
export const visitId = '1f6f5a44-3a3e-4d1e-9a54-6a4d0a7f0a01';
export const ruleCardId = '1f6f5a44-3a3e-4d1e-9a54-6a4d0a7f0c06';
export const holdId = '1f6f5a44-3a3e-4d1e-9a54-6a4d0a7f0b01';
const inspectorId = '3d1a9f0e-51a7-4c55-8a1a-7b8a3f0e9c77';
const zone = 'America/Denver';

export const noAbilities: LotAbilities = {
  canEdit: false,
  canEditGeometry: false,
  canSetPermit: false,
  canAttach: false,
  canRequest: false,
  canTest: false,
  canAddReading: false,
  canSayTestUp: false,
  canFix: false,
  canDecide: false,
  canComment: true,
};
export const plumberAbilities: LotAbilities = {
  ...noAbilities,
  canTest: true,
  canAddReading: true,
  canSayTestUp: true,
  canFix: true,
};

export const house = houseGeometry.parse({
  floors: [
    { name: 'first', elevationFt: 0 },
    { name: 'second', elevationFt: 10 },
  ],
  lowestFittingFt: -2.5,
  highestFittingFt: 13,
  ventTerminalFt: 24.5,
  atticCutFt: 21,
  laundry: { floor: 'second', boxOutletFt: 13.5 },
  plugs: [{ name: 'building drain', elevationFt: -3, ratedPsi: 17 }],
  gaugeFt: 2,
  highestOutletFt: 13,
  waterLowestFittingFt: 2,
  lowestRatedPsi: 80,
});

export function lotOf(parts: Partial<LotDetail> = {}): LotDetail {
  return {
    id: lotId,
    number: '52',
    tract: { id: '1f6f5a44-3a3e-4d1e-9a54-6a4d0a7f0d01', name: 'Millpond' },
    address: '418 Sedge Loop',
    permitNumber: null,
    builderName: odderly.name,
    plumberName: 'Dunlatch Plumbing',
    departmentName: tallowmere.name,
    departmentId: tallowmere.id,
    stages: [],
    currentStage: 'rough-in',
    nextVisit: null,
    openCorrections: 0,
    latitude: null,
    longitude: null,
    zone,
    permit: { number: null, status: 'issued', holder: null },
    mayPlumberRequest: true,
    coverDate: null,
    units: [{ number: 1, label: 'House', geometry: house }],
    access: null,
    parties: [],
    handovers: [],
    ruleCard: { id: ruleCardId, version: 6, effectiveFrom: '2026-01-01' },
    abilities: plumberAbilities,
    ...parts,
  };
}

const dwvRule: TestRule = {
  stageCode: 'rough-in',
  system: 'dwv',
  acceptedMethods: ['attic-cut', 'stack-to-roof'],
  headRule: { kind: 'fill-level', feet: null },
  pressures: [],
  measuredAt: 'gauge',
  standMinutes: null,
  airOnPlastic: false,
  settleMinutes: 0,
  gaugeIncrements: [],
  mayStayIsolated: [],
  levelSeenFrom: ['sight-tube'],
  photoWanted: { reading: false, fix: false, takeDown: false },
};

export const content: RuleCardContent = {
  stages: [
    {
      code: 'rough-in',
      name: { en: 'Rough-in', es: 'Instalación gruesa' },
      inspectionCode: '210',
      order: 1,
      systems: ['dwv', 'water'],
      covers: 'wall',
      minutesPerVisit: 25,
      work: [
        { code: 'nail-plates', label: { en: 'Nail plates' } },
        { code: 'slope', label: { en: 'Slope' } },
      ],
    },
  ],
  tests: [
    dwvRule,
    {
      ...dwvRule,
      system: 'water',
      acceptedMethods: ['gauge'],
      headRule: null,
      pressures: [
        { medium: 'water', minimumPsi: 50, preferredPsi: null },
        { medium: 'air', minimumPsi: 50, preferredPsi: 60 },
      ],
    },
  ],
  asking: {
    windows: [{ label: 'morning', start: '09:00', end: '11:00', days: [], room: 4 }],
    workingDays: [1, 2, 3, 4, 5],
    holidays: { federal: true, adds: [], drops: [] },
    cutoff: '15:00',
    workingDaysAhead: 1,
    horizonWorkingDays: 10,
    lotsPerRequest: 3,
    whoMayRequest: ['superintendent'],
    booking: 'self',
    isPermitNeeded: false,
    reinspectionWindows: null,
  },
  readiness: {
    upBy: { kind: 'clock-time', time: '07:00' },
    reminderHoursBefore: [2],
    whenNotUp: 'stays',
    isExtensionAllowed: false,
    standbyOfferMinutes: 30,
  },
  fees: [],
  corrections: {
    frequent: [{ code: 'drip', label: { en: 'drip at a joint' }, section: '7-204' }],
    sections: [{ section: '7-204', says: { en: 'Joints are tight under the test of the rule card' } }],
    acceptFromPhoto: [],
  },
  weather: { isFeeFree: true, latestHoursBefore: 2 },
  lateness: { minutesBeforeLate: 15 },
  sources: {},
};

const brief = {
  id: ruleCardId,
  departmentId: tallowmere.id,
  version: 6,
  state: 'published' as const,
  effectiveFrom: '2026-01-01',
  effectiveTo: null,
  isInForce: true,
};
export const ruleCard: RuleCard = {
  ...brief,
  departmentName: tallowmere.name,
  zone,
  content,
  publishedAt: '2025-12-01T12:00:00Z',
};
export const departmentAnswer = {
  department: {
    id: tallowmere.id,
    name: tallowmere.name,
    phone: tallowmere.phone,
    zone,
    elevationFt: 4400,
    isOutside: false,
    ruleCard: brief,
  },
  ruleCards: [brief],
  closures: [],
  abilities: { canEditRuleCards: false, canClose: false },
};

export function visitOf(parts: Partial<VisitSummary> = {}): VisitSummary {
  return {
    id: visitId,
    lotId,
    lotNumber: '52',
    tractName: 'Millpond',
    address: '418 Sedge Loop',
    builderName: odderly.name,
    plumberName: 'Dunlatch Plumbing',
    departmentId: tallowmere.id,
    departmentName: tallowmere.name,
    zone,
    stageCode: 'rough-in',
    stageName: { en: 'Rough-in' },
    ruleCardVersion: 6,
    unitNumbers: [1],
    state: 'booked',
    version: 3,
    window: { date: '2026-04-15', label: 'morning', startAt: '2026-04-15T15:00:00Z', endAt: '2026-04-15T17:00:00Z' },
    plannedStartAt: null,
    plannedEndAt: null,
    inspector: { id: inspectorId, name: 'Noor Haverty', phone: null },
    systemsUp: [
      { unitNumber: 1, system: 'dwv', isUp: true },
      { unitNumber: 1, system: 'water', isUp: false },
    ],
    upSince: null,
    upBy: '2026-04-15T13:00:00Z',
    outcome: null,
    endReason: null,
    endNote: null,
    openCorrections: 0,
    isRetest: false,
    hasFirstPlace: false,
    neededBy: null,
    note: null,
    requestedAt: '2026-04-10T15:00:00Z',
    moves: ['say-test-up'],
    ...parts,
  };
}

export function readingOf(parts: Partial<Reading> = {}): Reading {
  return {
    id: '1f6f5a44-3a3e-4d1e-9a54-6a4d0a7f0e01',
    at: '2026-04-14T23:08:00Z',
    receivedAt: '2026-04-14T23:08:10Z',
    pressurePsi: 57,
    levelIn: null,
    temperatureF: null,
    gaugeValve: 'open',
    note: null,
    byName: 'Ruben Achterberg',
    byRole: 'plumber',
    isStruck: false,
    struckWhy: null,
    ...parts,
  };
}

/** A standing test; water pumped with air against a gauge unless told otherwise. */
export function holdOf(parts: Partial<Hold> = {}): Hold {
  return {
    id: holdId,
    lotId,
    unitNumber: 1,
    stageCode: 'rough-in',
    system: 'water',
    ordinal: 1,
    method: 'gauge',
    medium: 'air',
    gauge: { rangePsi: 100, incrementPsi: 1 },
    tape: null,
    fillLevelFt: null,
    ceilingPsi: 80,
    minimumPsi: 50,
    settleMinutes: 0,
    state: 'standing',
    startedAt: '2026-04-14T23:00:00Z',
    endedAt: null,
    endReason: null,
    readings: [readingOf()],
    ...parts,
  };
}

export const dwvHold = holdOf({
  id: '1f6f5a44-3a3e-4d1e-9a54-6a4d0a7f0b02',
  system: 'dwv',
  method: 'attic-cut',
  medium: 'water',
  gauge: null,
  tape: { incrementIn: 0.25 },
  fillLevelFt: 21,
  ceilingPsi: null,
  minimumPsi: null,
  readings: [
    readingOf({ id: '1f6f5a44-3a3e-4d1e-9a54-6a4d0a7f0e02', pressurePsi: null, levelIn: 0, gaugeValve: null }),
  ],
});

/** The answers a page about this lot asks for. */
export function answersFor({
  lot = lotOf(),
  visits = [visitOf()],
  holds = [dwvHold],
}: {
  lot?: LotDetail;
  visits?: readonly VisitSummary[];
  holds?: readonly Hold[];
} = {}) {
  return {
    [`GET /api/lots/${lotId}`]: () => ({ data: lot }),
    [`GET /api/lots/${lotId}/visits`]: () => ({ data: { items: visits } }),
    [`GET /api/lots/${lotId}/holds`]: () => ({ data: { items: holds } }),
    [`GET /api/departments/${tallowmere.id}`]: () => ({ data: departmentAnswer }),
    [`GET /api/rule-cards/${ruleCardId}`]: () => ({ data: ruleCard }),
  };
}
