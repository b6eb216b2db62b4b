import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { VisitSummary } from '@holdwater/shared-types/visits/visit.contract.js';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { LotModel } from '../lots/lot.model.js';
import { ruleCardContent } from '../testing/fixtures/rule-card-content.js';
import { addLots, book, nextDay, readVisit, setRuleCard } from '../testing/fixtures/visits.js';
import { createWorld, type World } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp, testNow } from '../testing/test-app.js';
import { FreeNotUp } from './free-not-up.service.js';
import { VisitModel } from './visit.model.js';

let server: TestApp;
let world: World;
beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
});
afterAll(() => server?.close());

type UpBy = RuleCardContent['readiness']['upBy'];
const readiness = (
  upBy: UpBy,
  whenNotUp: 'goes-to-standby' | 'stays' = 'goes-to-standby',
): RuleCardContent['readiness'] => ({
  ...ruleCardContent().readiness,
  upBy,
  whenNotUp,
});
const sevenOClock: UpBy = { kind: 'clock-time', time: '07:00' };
const useRuleCard = (upBy: UpBy, whenNotUp?: 'stays') =>
  setRuleCard(server, world.ruleCard.id, ruleCardContent({ readiness: readiness(upBy, whenNotUp) }));
const newVisit = async (wish: Parameters<typeof book>[2] = {}) => {
  const [lot] = await addLots(server, world, 1);
  return book(world, lot as LotModel, wish);
};
/** What the sweep frees when it is `now`. */
async function sweepAt(now: string): Promise<string[]> {
  server.clock.set(now);
  return server.get(FreeNotUp).sweepDeadlines(server.clock.now());
}

beforeEach(async () => {
  await VisitModel.update(
    { state: 'withdrawn', endedAt: server.clock.now() },
    { where: { state: ['booked', 'ready', 'underway'] } },
  );
  server.clock.set(testNow);
  await useRuleCard(sevenOClock);
});

describe('the deadline', () => {
  it('frees a booked visit once it has passed, not at its very minute, and tells it once', async () => {
    const visit = await newVisit();
    expect(visit.upBy).toBe('2027-03-03T14:00:00.000Z'); // 7:00 am in Denver, MST
    expect(await sweepAt('2027-03-03T14:00:00Z')).toEqual([]);
    expect(await sweepAt('2027-03-03T14:00:01Z')).toEqual([visit.id]);
    expect(await sweepAt('2027-03-03T14:00:30Z')).toEqual([]);
    expect(await readVisit(world, visit.id)).toMatchObject({
      state: 'freed',
      endReason: 'not-up',
      version: 1,
      moves: [],
    });
    const events = await server.db.query<{ kind: string; actor_id: string | null; payload: Record<string, unknown> }>(
      `SELECT kind, actor_id, payload FROM outbox_events WHERE visit_id = :id AND kind = 'visit-freed'`,
      { replacements: { id: visit.id }, type: QueryTypes.SELECT },
    );
    expect(events).toMatchObject([{ actor_id: null, payload: { reason: 'not-up', visit: { calendarSequence: 1 } } }]);
  });

  it('leaves a test that is up, a stage that asks for none, a request, and a visit underway', async () => {
    const up = await newVisit();
    const begun = await newVisit();
    const final = await newVisit({ stageCode: 'final' });
    expect(final).toMatchObject({ upBy: null, systemsUp: [] });
    await VisitModel.update({ state: 'ready', readyAt: server.clock.now() }, { where: { id: up.id } });
    const now = server.clock.now();
    await VisitModel.update(
      { state: 'underway', begunAt: now, begunBy: world.people.inspector.id, begunFrom: 'ready' },
      { where: { id: begun.id } },
    );
    expect(await sweepAt('2027-03-03T15:00:00Z')).toEqual([]);
  });

  it('frees nothing where the rule card lets it stay', async () => {
    await useRuleCard(sevenOClock, 'stays');
    const visit = await newVisit();
    expect(await sweepAt('2027-03-03T15:00:00Z')).toEqual([]);
    expect((await readVisit(world, visit.id)).state).toBe('booked');
  });

  it('is some hours before each window', async () => {
    await useRuleCard({ kind: 'hours-before', hours: 16 });
    const early = await newVisit({ label: 'early' });
    const late = await newVisit({ label: 'late' });
    expect(early.upBy).toBe('2027-03-02T22:30:00.000Z');
    expect(await sweepAt('2027-03-02T22:30:01Z')).toEqual([early.id]);
    expect(await sweepAt('2027-03-03T04:30:01Z')).toEqual([late.id]);
  });

  it('is by the clock on the wall: after clocks went forward an hour earlier by the sun', async () => {
    server.clock.set('2027-03-11T16:30:00Z');
    // Monday 2027-03-15, MDT: 7:00 am is 13:00 Z (IANA tz; daylight time begins 2027-03-14)
    const visit = await newVisit({ date: '2027-03-15' });
    expect(visit.upBy).toBe('2027-03-15T13:00:00.000Z');
    expect(await sweepAt('2027-03-15T13:00:00Z')).toEqual([]);
    expect(await sweepAt('2027-03-15T13:00:01Z')).toEqual([visit.id]);
  });

  it('does not free a window that was moved to after its own deadline, nor one that is over', async () => {
    const visit = await newVisit({ date: '2027-03-04', label: 'late' });
    server.clock.set('2027-03-03T15:00:00Z');
    const body = { expectedVersion: 0, date: nextDay, label: 'late' };
    expect((await world.as('desk').post(`/api/visits/${visit.id}/move`, body)).status).toBe(200);
    expect(await sweepAt('2027-03-03T15:10:00Z')).toEqual([]);
    server.clock.set(testNow);
    const over = await newVisit();
    expect(await sweepAt('2027-03-03T16:00:00Z')).toEqual([]);
    expect((await readVisit(world, over.id)).state).toBe('booked');
  });

  it('passes for every visit once, however many sweep at the same moment', async () => {
    const visits: VisitSummary[] = [];
    for (const label of ['early', 'mid', 'noon']) visits.push(await newVisit({ label }));
    server.clock.set('2027-03-03T14:05:00Z');
    const sweeps = await Promise.all([1, 2, 3].map(() => server.get(FreeNotUp).sweepDeadlines(server.clock.now())));
    expect(sweeps.flat().sort()).toEqual(visits.map(({ id }) => id).sort());
  });
});

describe('the sweep of a running server', () => {
  it('is done by workers alone', async () => {
    const visit = await newVisit();
    server.clock.set('2027-03-03T14:05:00Z');
    await server.get(FreeNotUp).sweep();
    expect((await readVisit(world, visit.id)).state).toBe('booked');
    const worker = await startTestApp({
      database: server.database,
      now: '2027-03-03T14:05:00Z',
      environment: { ROLE: 'worker' },
    });
    await worker.get(FreeNotUp).sweep();
    expect((await readVisit(world, visit.id)).state).toBe('freed');
    await worker.close();
  });
});
