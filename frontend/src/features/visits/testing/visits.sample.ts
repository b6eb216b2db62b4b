import type { LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { OfferedWindow, VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { Calendar } from '../../../app/layout/ribbon-days';
import { odderly, tallowmere } from '../../../lib/testing/people';
import { addDays, instantOf } from '../../../lib/local-days';
import type { DayBoard } from '../api/day-board';
import type { Offers } from '../api/offers';
import type { Run } from '../api/run';

/** Invented windows, visits and lots for specs, around the week of Apr 13, 2026. */
export const zone = 'America/Denver';
export const sampleNow = '2026-04-14T19:48:00Z';

const base = '7c1c0d5e-2f5b-4a53-9c36-0000000000';
export const idOf = (number: number): string => `${base}${String(number).padStart(2, '0')}`;

export const noor = { id: idOf(90), name: 'Noor Haverty', phone: '555-0171' };
export const gil = { id: idOf(91), name: 'Gil Strand', phone: null };

const clocks: Readonly<Record<string, readonly [string, string]>> = {
  early: ['07:30', '09:00'],
  mid: ['09:00', '11:00'],
  noon: ['11:00', '13:00'],
  late: ['13:30', '15:30'],
};

export function windowOf(date: string, label: string) {
  const [from, to] = clocks[label] ?? ['09:00', '11:00'];
  return { date, label, startAt: instantOf(date, from, zone), endAt: instantOf(date, to, zone) };
}

/** A booked visit of lot 17, Wed 9:00–11:00 am, planned at 9:15, its water not up; `up` and `parts` change it. */
export function visitOf(
  number: number,
  parts: Partial<VisitSummary> = {},
  plannedAt: string | null = '09:15',
): VisitSummary {
  const window = parts.window ?? windowOf('2026-04-15', 'mid');
  const start = plannedAt === null ? null : instantOf(window.date, plannedAt, zone);
  return {
    id: idOf(number),
    lotId: idOf(number),
    lotNumber: String(number),
    tractName: 'Sorrel Bench',
    address: `${400 + number} Sedge Loop`,
    builderName: odderly.name,
    plumberName: 'Dunlatch Plumbing',
    departmentId: tallowmere.id,
    departmentName: tallowmere.name,
    zone,
    stageCode: 'rough-in',
    stageName: { en: 'Rough-in', es: 'Instalación en bruto' },
    ruleCardVersion: 6,
    unitNumbers: [1],
    state: 'booked',
    version: 3,
    window,
    plannedStartAt: start,
    plannedEndAt: start === null ? null : new Date(Date.parse(start) + 40 * 60_000).toISOString(),
    inspector: start === null ? null : noor,
    systemsUp: [
      { unitNumber: 1, system: 'dwv', isUp: true },
      { unitNumber: 1, system: 'water', isUp: false },
    ],
    upSince: null,
    upBy: instantOf(window.date, '07:00', zone),
    outcome: null,
    endReason: null,
    endNote: null,
    openCorrections: 0,
    isRetest: false,
    hasFirstPlace: false,
    neededBy: null,
    note: null,
    requestedAt: '2026-04-13T15:05:00Z',
    moves: [],
    ...parts,
  };
}

/** Every required system of a visit standing. */
export const allUp: VisitSummary['systemsUp'] = [
  { unitNumber: 1, system: 'dwv', isUp: true },
  { unitNumber: 1, system: 'water', isUp: true },
];

export function calendarOf(visits: readonly VisitSummary[], lanes = 1): Calendar {
  const dates = Array.from({ length: 12 }, (_, day) => addDays('2026-04-13', day));
  const laneOf = (departmentId: string, name: string, index: number): Calendar['lanes'][number] => ({
    departmentId,
    name,
    zone,
    isOwn: false,
    ruleCardVersion: 6,
    days: dates.map((date) => dayOf(date, index === 0 ? ['early', 'mid', 'noon', 'late'] : ['mid', 'late'])),
  });
  return {
    now: sampleNow,
    zone,
    today: '2026-04-14',
    lanes: [
      laneOf(tallowmere.id, tallowmere.name, 0),
      ...(lanes > 1 ? [laneOf(idOf(80), 'Vennick Building Department', 1)] : []),
    ],
    visits: [...visits],
  };
}

export function dayOf(date: string, labels: readonly string[]): DayBoard['day'] {
  const isWeekend = ['2026-04-18', '2026-04-19'].includes(date);
  const isClosed = date === '2026-04-24';
  return {
    date,
    isWorkingDay: !isWeekend,
    closed: isClosed ? [{ from: null, to: null, why: 'staff day' }] : [],
    windows:
      isWeekend || isClosed
        ? []
        : labels.map((label, index) => ({
            ...windowOf(date, label),
            room: 6,
            roomLeft: index === 1 ? 4 : index,
            up: null,
            isTakeable: date > '2026-04-15' && index > 0,
            cutoffAt: null,
          })),
  };
}

export function offerOf(date: string, label: string, parts: Partial<OfferedWindow> = {}): OfferedWindow {
  return { ...windowOf(date, label), roomLeft: 4, isTakeable: true, whyNot: null, ...parts };
}

export function offersOf(parts: Partial<Offers> = {}): Offers {
  return {
    departmentId: tallowmere.id,
    departmentName: tallowmere.name,
    departmentPhone: tallowmere.phone,
    zone,
    booking: 'self',
    ruleCardVersion: 6,
    lotsPerRequest: 3,
    firstDate: '2026-04-16',
    lastDate: '2026-04-24',
    cutoffAt: '2026-04-14T21:00:00Z',
    now: sampleNow,
    upByFor: 'clock-time',
    windows: [
      offerOf('2026-04-15', 'mid', { isTakeable: false, whyNot: 'cut-off-passed' }),
      offerOf('2026-04-16', 'mid'),
      offerOf('2026-04-16', 'noon', { roomLeft: 0, isTakeable: false, whyNot: 'full' }),
      offerOf('2026-04-16', 'late', { roomLeft: 5 }),
      offerOf('2026-04-17', 'mid', { roomLeft: 3 }),
    ],
    ...parts,
  };
}

export function lotOf(number: number, parts: Partial<LotDetail> = {}): LotDetail {
  return {
    id: idOf(number),
    number: String(number),
    tract: { id: idOf(70), name: 'Sorrel Bench' },
    address: `${400 + number} Sedge Loop`,
    permitNumber: null,
    builderName: odderly.name,
    plumberName: 'Dunlatch Plumbing',
    departmentName: tallowmere.name,
    departmentId: tallowmere.id,
    stages: [
      {
        code: 'rough-in',
        name: { en: 'Rough-in' },
        order: 1,
        systems: ['dwv', 'water'],
        state: 'not-tested',
        units: [{ unitNumber: 1, state: 'not-tested' }],
      },
    ],
    currentStage: 'rough-in',
    nextVisit: null,
    openCorrections: 0,
    latitude: null,
    longitude: null,
    zone,
    permit: { number: null, status: 'issued', holder: null },
    mayPlumberRequest: false,
    coverDate: null,
    units: [{ number: 1, label: 'House', geometry: null }],
    access: null,
    parties: [],
    handovers: [],
    ruleCard: null,
    abilities: {
      canEdit: true,
      canEditGeometry: true,
      canSetPermit: true,
      canAttach: true,
      canRequest: true,
      canTest: false,
      canAddReading: true,
      canSayTestUp: false,
      canFix: false,
      canDecide: false,
      canComment: true,
    },
    ...parts,
  };
}

export function boardOf(parts: Partial<DayBoard> = {}): DayBoard {
  return {
    date: '2026-04-15',
    now: sampleNow,
    zone,
    day: {
      ...dayOf('2026-04-15', []),
      windows: dayOf('2026-04-16', ['early', 'mid', 'noon', 'late']).windows.map((window) => ({
        ...window,
        ...windowOf('2026-04-15', window.label),
      })),
    },
    inspectors: [
      {
        ...noor,
        visits: [
          visitOf(9, { window: windowOf('2026-04-15', 'early'), state: 'ready', systemsUp: allUp }, '08:10'),
          visitOf(17),
        ],
      },
      { ...gil, visits: [] },
    ],
    requests: [
      visitOf(5, { state: 'requested', window: windowOf('2026-04-15', 'noon'), moves: ['place', 'decline'] }, null),
    ],
    ...parts,
  };
}

export function stopOf(visit: VisitSummary, order = 1): Run['stops'][number] {
  return {
    visit,
    order,
    access: { gateCode: '4417', contactName: null, contactPhone: null, hazards: null },
    latitude: 39.1,
    longitude: -106.2,
    asks: [
      { unitNumber: 1, system: 'dwv', method: 'attic-cut', minimumPsi: null, levelFt: 24 },
      { unitNumber: 1, system: 'water', method: 'gauge', minimumPsi: 100, levelFt: null },
    ],
  };
}

export function runOf(stops: Run['stops'], parts: Partial<Run> = {}): Run {
  return { date: '2026-04-15', now: sampleNow, zone, inspector: { id: noor.id, name: noor.name }, stops, ...parts };
}
