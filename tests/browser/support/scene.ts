import { randomUUID } from 'node:crypto';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import type { Correction } from '@holdwater/shared-types/outcomes/outcome.contract.js';
import type { OfferedWindow, VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import type { WorldPerson } from '@holdwater/backend/testing/fixtures/world.js';
import { failedDrain } from '@holdwater/backend/outcomes/outcomes.scenario.js';
import type { Stack } from './stack.js';

const stageCode = 'rough-in';

/** A client's own number for a write, and when it was made. */
export function stamp(): { clientId: string; madeAt: string } {
  return { clientId: randomUUID(), madeAt: new Date().toISOString() };
}

/** The windows somebody may take for a lot now, in order of time; the system clock decides. */
export async function takeableWindows(
  stack: Stack,
  lotId: string,
  as: WorldPerson = 'superintendent',
): Promise<OfferedWindow[]> {
  const body = { lots: [{ lotId }], stageCode };
  const answer = (await stack.call(as, 'post', '/api/visits/offers', body)) as { windows: OfferedWindow[] };
  return answer.windows.filter(({ isTakeable }) => isTakeable);
}

/** Requests a window of a lot: the first takeable one unless another is named. */
export async function request(
  stack: Stack,
  lotId: string,
  { as = 'superintendent', window }: { as?: WorldPerson; window?: OfferedWindow } = {},
): Promise<VisitSummary> {
  const chosen = window ?? (await takeableWindows(stack, lotId, as))[0];
  if (!chosen) throw new Error('no window can be taken');
  const body = { lots: [{ lotId }], stageCode, date: chosen.date, label: chosen.label };
  const answer = (await stack.call(as, 'post', '/api/visits', body)) as { visits: VisitSummary[] };
  const [visit] = answer.visits;
  if (!visit) throw new Error('nothing was requested');
  return visit;
}

/** Both systems of the rough-in standing above what the fixture's rule card asks. */
export async function standUp(stack: Stack, lotId: string): Promise<Hold[]> {
  const shared = { unitNumber: 1, stageCode };
  const dwv = {
    ...{ ...stamp(), ...shared, system: 'dwv', method: 'stack-to-roof', medium: 'water' },
    ...{ tape: { incrementIn: 0.125 }, fillLevelFt: 24, firstReading: { ...stamp(), levelIn: 2 } },
  };
  const water = {
    ...{ ...stamp(), ...shared, system: 'water', method: 'gauge', medium: 'water', ceilingPsi: 160 },
    ...{
      gauge: { rangePsi: 200, incrementPsi: 2 },
      firstReading: { ...stamp(), pressurePsi: 120, gaugeValve: 'open' },
    },
  };
  const path = `/api/lots/${lotId}/holds`;
  return [
    (await stack.call('plumber', 'post', path, dwv)) as Hold,
    (await stack.call('plumber', 'post', path, water)) as Hold,
  ];
}

/** One of the moves of a visit, by whoever may make it. */
export async function move(stack: Stack, as: WorldPerson, visit: VisitSummary, act: string): Promise<VisitSummary> {
  const body = { ...stamp(), expectedVersion: visit.version };
  return (await stack.call(as, 'post', `/api/visits/${visit.id}/${act}`, body)) as VisitSummary;
}

/** Which of the department's inspectors was given the visit. */
export function inspectorOf(stack: Stack, visit: VisitSummary): WorldPerson {
  return visit.inspector?.id === stack.world.people.secondInspector.id ? 'secondInspector' : 'inspector';
}

export interface Scene {
  booked: VisitSummary;
  ready: VisitSummary;
  underway: VisitSummary;
  /** Closed as failed, with an open correction. */
  failed: VisitSummary;
  correction: Correction;
  /** A request of the other department, which its desk has to place. */
  requested: VisitSummary;
  inspector: WorldPerson;
}

/** A visit in every state that can be had before its window opens, so that no page stands empty. */
export async function makeScene(stack: Stack): Promise<Scene> {
  const [first, second, third, fourth] = stack.world.lots.map(({ id }) => id);
  const up = async (lotId: string): Promise<VisitSummary> => {
    const visit = await request(stack, lotId);
    await standUp(stack, lotId);
    return move(stack, 'plumber', visit, 'test-up');
  };
  const failing = await up(String(first));
  const inspector = inspectorOf(stack, failing);
  const begun = await move(stack, inspector, failing, 'begin');
  const outcome = {
    ...stamp(),
    expectedVersion: begun.version,
    result: failedDrain({ text: 'Drip at the tee' }),
    note: 'See the tee',
  };
  const closed = (await stack.call(inspector, 'post', `/api/visits/${begun.id}/outcome`, outcome)) as {
    visit: VisitSummary;
    corrections: Correction[];
  };
  const ready = await up(String(second));
  const other = await up(String(third));
  const underway = await move(stack, inspectorOf(stack, other), other, 'begin');
  const booked = await request(stack, String(fourth));
  await stack.call('plumber', 'post', `/api/lots/${second}/comments`, {
    ...stamp(),
    text: 'Gauge is at the hose bib.',
  });
  const requested = await request(stack, stack.world.otherLot.id, { as: 'otherSuperintendent' });
  const [correction] = closed.corrections;
  if (!correction) throw new Error('the fail carries no correction');
  return {
    booked,
    ready,
    underway,
    failed: closed.visit,
    correction,
    requested,
    inspector: inspectorOf(stack, underway),
  };
}
