import { randomUUID } from 'node:crypto';
import type { WaitingItem } from '@holdwater/shared-types/visits/calendar.contract.js';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { LotConsentModel } from '../lots/lot-consent.model.js';
import type { LotModel } from '../lots/lot.model.js';
import { addClosedVisit, addCorrection, addLots, ask, book, standTest } from '../testing/fixtures/visits.js';
import { createWorld, type World, type WorldPerson } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp, testNow } from '../testing/test-app.js';
import { VisitModel } from './visit.model.js';

let server: TestApp;
let world: World;
beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
});
afterAll(() => server?.close());
beforeEach(() => server.clock.set(testNow));

async function waiting(by: WorldPerson, lot?: LotModel): Promise<WaitingItem[]> {
  const { body } = await world.as(by).get('/api/waiting');
  const items = body.items as WaitingItem[];
  return lot ? items.filter(({ lotId }) => lotId === lot.id) : items;
}
const newLot = async () => (await addLots(server, world, 1))[0] as LotModel;
const brief = (items: WaitingItem[]) =>
  items.map(({ kind, isOnYou, waitsOn, count }) => [kind, isOnYou, waitsOn, count]);

describe('what waits', () => {
  it('a test not up: on the plumber, by the deadline, red after it', async () => {
    const lot = await newLot();
    await book(world, lot);
    expect(brief(await waiting('plumber', lot))).toEqual([['test-not-up', true, 'Dunlatch Plumbing', 2]]);
    expect(brief(await waiting('superintendent', lot))).toEqual([['test-not-up', false, 'Dunlatch Plumbing', 2]]);
    expect(brief(await waiting('helper', lot))).toEqual([['test-not-up', false, 'Dunlatch Plumbing', 2]]);
    expect(await waiting('plumber', lot)).toMatchObject([
      { by: '2027-03-03T13:30:00.000Z', isPastTime: false, zone: 'America/Denver' },
    ]);
    server.clock.set('2027-03-03T13:30:01Z');
    expect(await waiting('plumber', lot)).toMatchObject([{ isPastTime: true }]);
    await standTest(server, world, lot, 'water');
    expect(brief(await waiting('plumber', lot))).toEqual([['test-not-up', true, 'Dunlatch Plumbing', 1]]);
    await VisitModel.update({ state: 'ready', readyAt: server.clock.now() }, { where: { lotId: lot.id } });
    expect(await waiting('plumber', lot)).toEqual([]);
  });

  it('a visit underway: on its inspector, until the window ends', async () => {
    const lot = await newLot();
    const visit = await book(world, lot, { label: 'mid' });
    const now = server.clock.now();
    await VisitModel.update(
      { state: 'underway', begunAt: now, begunBy: visit.inspector?.id, begunFrom: 'booked' },
      { where: { id: visit.id } },
    );
    expect(brief(await waiting('secondInspector', lot))).toEqual([['visit-underway', true, 'Gil Strand', 1]]);
    expect(brief(await waiting('inspector', lot))).toEqual([['visit-underway', false, 'Gil Strand', 1]]);
  });

  it('corrections: open ones on the plumber, fixed ones on the inspector; notes on nobody', async () => {
    const lot = await newLot();
    const failed = await addClosedVisit(server, world, lot, 'fail');
    const first = await addCorrection(world, failed, 1);
    await addCorrection(world, failed, 2, { state: 'fixed' });
    await addCorrection(world, failed, 3, { severity: 'note' });
    expect(brief(await waiting('plumber', lot))).toEqual([
      ['correction-to-fix', true, 'Dunlatch Plumbing', 1],
      ['correction-to-accept', false, 'Tallowmere', 1],
    ]);
    expect(brief(await waiting('inspector', lot))).toContainEqual(['correction-to-accept', true, 'Tallowmere', 1]);
    await first.update({
      state: 'fixed',
      fixedAt: server.clock.now(),
      fixedBy: world.people.plumber.id,
      fixNote: 'Set one',
    });
    // nothing open any more and no visit coming: a window is missing
    expect(brief(await waiting('superintendent', lot))).toEqual([
      ['no-window', true, 'Odderly Homes', 1],
      ['correction-to-accept', false, 'Tallowmere', 2],
    ]);
    await book(world, lot, { label: 'noon' });
    const named = (await waiting('secondInspector', lot)).find(({ kind }) => kind === 'correction-to-accept');
    expect(named).toMatchObject({ isOnYou: true, waitsOn: 'Gil Strand', by: '2027-03-03T18:00:00.000Z' });
    expect((await waiting('inspector', lot)).find(({ kind }) => kind === 'correction-to-accept')).toMatchObject({
      isOnYou: false,
    });
  });

  it('a window missing: after one was freed, or while a test stands; not after a withdrawal', async () => {
    const [freed, tested, withdrawn, passed] = [await newLot(), await newLot(), await newLot(), await newLot()];
    const [one, two] = [
      await book(world, freed, { date: '2027-03-04' }),
      await book(world, withdrawn, { date: '2027-03-04' }),
    ];
    await VisitModel.update({ state: 'freed', endedAt: server.clock.now() }, { where: { id: one.id } });
    await VisitModel.update({ state: 'withdrawn', endedAt: server.clock.now() }, { where: { id: two.id } });
    await standTest(server, world, tested, 'dwv');
    await addClosedVisit(server, world, passed, 'pass');
    expect(brief(await waiting('superintendent', freed))).toEqual([['no-window', true, 'Odderly Homes', 1]]);
    expect(brief(await waiting('desk', tested))).toEqual([['no-window', false, 'Odderly Homes', 1]]);
    expect(brief(await waiting('plumber', tested))).toEqual([['no-window', true, 'Odderly Homes', 1]]);
    for (const lot of [withdrawn, passed]) expect(await waiting('superintendent', lot)).toEqual([]);
  });

  it('a request: on the desk, by the window it wishes for', async () => {
    await ask(world, [world.otherLot.id], { by: 'otherSuperintendent' });
    expect(brief(await waiting('otherDesk'))).toEqual([['request-to-place', true, 'Vennick', 1]]);
    expect(brief(await waiting('otherSuperintendent'))).toEqual([['request-to-place', false, 'Vennick', 1]]);
    expect(await waiting('otherDesk')).toMatchObject([{ by: '2027-03-03T13:30:00.000Z', zone: 'America/Chicago' }]);
  });

  it('a consent: on whoever may answer, who may not open the lot yet', async () => {
    const [lot, other] = [await newLot(), await newLot()];
    const ask = (each: LotModel) =>
      LotConsentModel.create({
        id: randomUUID(),
        lotId: each.id,
        kind: 'plumber',
        organizationId: world.organizations.otherPlumber.id,
        askedAt: server.clock.now(),
      });
    await ask(lot);
    const consents = async (by: WorldPerson) => (await waiting(by)).filter(({ kind }) => kind === 'consent-to-answer');
    expect(await consents('otherPlumber')).toMatchObject([
      { isOnYou: true, waitsOn: 'Merrow', count: 1, lotId: null, lotNumber: lot.number },
    ]);
    expect(await consents('otherHelper')).toMatchObject([{ isOnYou: false }]);
    expect(await consents('superintendent')).toMatchObject([{ isOnYou: false, waitsOn: 'Merrow', lotId: lot.id }]);
    await ask(other);
    expect(await consents('otherPlumberOwner')).toMatchObject([{ isOnYou: true, count: 2, lotNumber: null }]);
    expect(await consents('plumber')).toEqual([]);
  });

  it('comes in order: the reader’s own first, by time, what has none last', async () => {
    for (const by of ['superintendent', 'plumber', 'desk', 'inspector'] as const) {
      const items = await waiting(by);
      const keys = items.map(({ isOnYou, by: at }) => `${isOnYou ? 0 : 1} ${at ?? '9'}`);
      expect(keys.length).toBeGreaterThan(2);
      expect(keys).toEqual([...keys].sort());
    }
  });

  it('is of one organization where asked, of own ones only, and tells nobody of strangers’ lots', async () => {
    const of = (by: WorldPerson, id: string) => world.as(by).get(`/api/waiting?organizationId=${id}`);
    expect((await of('superintendent', world.organizations.builder.id)).body.items.length).toBeGreaterThan(0);
    expect((await of('superintendent', world.organizations.otherBuilder.id)).body.code).toBe('not-found');
    expect(JSON.stringify(await waiting('otherSuperintendent'))).not.toContain('Quillback');
    expect(await waiting('operator')).toEqual([]);
  });
});
