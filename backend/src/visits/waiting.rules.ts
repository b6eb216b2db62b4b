import type { WaitingItem } from '@holdwater/shared-types/visits/calendar.contract.js';
import type { Actor } from '../common/access/actor.js';
import { canAnswerConsent } from '../lots/consents.policy.js';
import { canRequestVisit, isDeskOf, isImpartialInspectorOf, isPlumberOf } from '../lots/lots.policy.js';
import type { VisitRow } from './visit-row.js';
import { partiesOfRow, upByOfRow } from './visits.presenter.js';
import type { OpenConsents, WaitingCorrections, WithoutWindow } from './waiting.queries.js';

type Where = Pick<WaitingItem, 'lotId' | 'lotNumber' | 'tractName'>;

/** What an open visit waits for: to be placed, for its test, for the inspector to finish. A test that is up waits for nobody. */
export function itemsOfVisit(row: VisitRow, actor: Actor, now: Date): WaitingItem[] {
  const lot = partiesOfRow(row);
  const base = { ...whereOfRow(row), visitId: row.id, zone: row.zone };
  if (row.state === 'requested') {
    return [
      {
        ...base,
        kind: 'request-to-place',
        isOnYou: isDeskOf(actor, lot),
        waitsOn: row.departmentName,
        count: 1,
        ...timed(row.windowStartAt, now),
      },
    ];
  }
  if (row.state === 'underway') {
    const isOnYou = row.inspectorId === actor.personId;
    return [
      {
        ...base,
        kind: 'visit-underway',
        isOnYou,
        waitsOn: row.inspectorName ?? row.departmentName,
        count: 1,
        ...timed(row.windowEndAt, now),
      },
    ];
  }
  const missing = row.unitNumbers.length * (row.stage?.systems.length ?? 0) - (row.standing?.length ?? 0);
  if (row.state !== 'booked' || (row.stage?.systems.length ?? 0) === 0) return [];
  const waitsOn = row.plumberName ?? row.builderName;
  return [
    {
      ...base,
      kind: 'test-not-up',
      isOnYou: isPlumberOf(actor, lot),
      waitsOn,
      count: Math.max(missing, 0),
      ...timed(upByOfRow(row), now),
    },
  ];
}

/** Open corrections wait on the plumber, fixed ones on the inspector: of the visit that comes, where one does. */
export function itemsOfCorrections(
  found: WaitingCorrections,
  coming: VisitRow | null,
  actor: Actor,
  now: Date,
): WaitingItem[] {
  const base = { ...whereOf(found), visitId: coming?.id ?? null, zone: found.zone };
  const isComing = coming?.inspectorId === actor.personId;
  const items: WaitingItem[] = [];
  if (found.open > 0) {
    const waitsOn = found.plumberName ?? found.builderName;
    items.push({
      ...base,
      kind: 'correction-to-fix',
      isOnYou: isPlumberOf(actor, found),
      waitsOn,
      count: found.open,
      ...untimed,
    });
  }
  if (found.fixed > 0) {
    const isOnYou = isImpartialInspectorOf(actor, found) && (isComing || !coming?.inspectorId);
    const waitsOn = coming?.inspectorName ?? found.departmentName ?? '';
    items.push({
      ...base,
      kind: 'correction-to-accept',
      isOnYou,
      waitsOn,
      count: found.fixed,
      ...timed(coming?.windowStartAt ?? null, now),
    });
  }
  return items;
}

/** Whoever may ask for a window is waited for; the desk asks only for a caller. */
export function itemOfMissingWindow(found: WithoutWindow, actor: Actor): WaitingItem {
  const isOnYou = canRequestVisit(actor, found) && !isDeskOf(actor, found);
  return {
    ...whereOf(found),
    kind: 'no-window',
    isOnYou,
    waitsOn: found.builderName,
    visitId: null,
    count: 1,
    zone: found.zone,
    ...untimed,
  };
}

/** To the one asked a lot that it has not joined is a number and nothing it could open. */
export function itemOfConsents(found: OpenConsents, actor: Actor, readerIds: readonly string[]): WaitingItem {
  const isAsked = readerIds.includes(found.organizationId);
  return {
    kind: 'consent-to-answer',
    isOnYou: isAsked && canAnswerConsent(actor, found.organizationId),
    waitsOn: found.organizationName,
    lotId: isAsked ? null : found.lotId,
    lotNumber: found.lotNumber,
    tractName: found.tractName,
    visitId: null,
    count: found.count,
    zone: null,
    ...untimed,
  };
}

/** What waits on the reader first; then by time, what has none last; then by lot. */
export function inOrder(items: readonly WaitingItem[]): WaitingItem[] {
  const rank = ({ isOnYou }: WaitingItem) => Number(!isOnYou);
  const time = ({ by }: WaitingItem) => (by === null ? Number.MAX_SAFE_INTEGER : Date.parse(by));
  const lot = ({ tractName, lotNumber }: WaitingItem) => `${tractName ?? ''} ${lotNumber ?? ''}`;
  return [...items].sort(
    (a, b) => rank(a) - rank(b) || time(a) - time(b) || lot(a).localeCompare(lot(b), 'en', { numeric: true }),
  );
}

const untimed = { by: null, isPastTime: false } as const;

function timed(by: Date | null, now: Date): Pick<WaitingItem, 'by' | 'isPastTime'> {
  return by === null ? untimed : { by: by.toISOString(), isPastTime: now > by };
}

function whereOf({ id, number, tractName }: WaitingCorrections | WithoutWindow): Where {
  return { lotId: id, lotNumber: number, tractName };
}

function whereOfRow({ lotId, lotNumber, tractName }: VisitRow): Where {
  return { lotId, lotNumber, tractName };
}
