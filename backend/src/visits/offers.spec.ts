import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ClosureModel } from '../departments/closure.model.js';
import type { LotModel } from '../lots/lot.model.js';
import { ruleCardContent } from '../testing/fixtures/rule-card-content.js';
import { addClosedVisit, addLots, ask, asking, book, nextDay, setRuleCard } from '../testing/fixtures/visits.js';
import { createWorld, type World, type WorldPerson } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { VisitModel } from './visit.model.js';

let server: TestApp;
let world: World;
beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
});
afterAll(() => server?.close());

interface Offer {
  date: string;
  label: string;
  roomLeft: number;
  isTakeable: boolean;
  whyNot: string | null;
}
const offers = (
  lots: readonly LotModel[],
  { by = 'superintendent', stageCode = 'rough-in' }: { by?: WorldPerson; stageCode?: string } = {},
) => world.as(by).post('/api/visits/offers', { lots: lots.map(({ id }) => ({ lotId: id })), stageCode });
const offerOf = (body: { windows: Offer[] }, date: string, label: string) =>
  body.windows.find((each) => each.date === date && each.label === label);

describe('offers', () => {
  it('name the department, its rule card, and the days open to a request made now', async () => {
    const { body, status } = await offers([world.lots[0]]);
    expect(status).toBe(200);
    // Tuesday 9:30 am counts for Tuesday: Wednesday is the first day; ten working days Monday to Thursday end on Thursday the 18th
    expect(body).toMatchObject({
      departmentName: 'Tallowmere',
      zone: 'America/Denver',
      booking: 'self',
      ruleCardVersion: 1,
      lotsPerRequest: 10,
      upByFor: 'hours-before',
      firstDate: '2027-03-03',
      lastDate: '2027-03-18',
      cutoffAt: '2027-03-02T22:00:00.000Z',
      now: '2027-03-02T16:30:00.000Z',
    });
    expect(await VisitModel.count()).toBe(0);
  });

  it('say of each window why it cannot be taken', async () => {
    const departmentId = world.organizations.department.id;
    const closure = await ClosureModel.create({
      id: crypto.randomUUID(),
      departmentId,
      date: '2027-03-10',
      fromTime: null,
      toTime: null,
      why: 'Move',
      createdAt: server.clock.now(),
    });
    for (const lot of await addLots(server, world, 3)) await book(world, lot, { label: 'early' });
    const { body } = await offers([world.lots[0]]);
    expect(offerOf(body, '2027-03-02', 'mid')).toMatchObject({ isTakeable: false, whyNot: 'past' });
    expect(offerOf(body, '2027-03-02', 'noon')).toMatchObject({ isTakeable: false, whyNot: 'cut-off-passed' });
    expect(offerOf(body, '2027-03-10', 'mid')).toMatchObject({ isTakeable: false, whyNot: 'closed' });
    expect(offerOf(body, nextDay, 'early')).toMatchObject({ isTakeable: false, whyNot: 'full', roomLeft: 0 });
    expect(offerOf(body, nextDay, 'mid')).toMatchObject({ isTakeable: true, whyNot: null, roomLeft: 3 });
    await closure.update({ removedAt: server.clock.now() });
    // the closure is gone, so the horizon ends on the 18th again: the rest of its week is none of the rule card's working days
    await setRuleCard(server, world.ruleCard.id, ruleCardContent({ asking: asking({ horizonWorkingDays: 8 }) }));
    const shorter = (await offers([world.lots[0]])).body;
    expect(offerOf(shorter, '2027-03-16', 'mid')).toMatchObject({ whyNot: null });
    expect(offerOf(shorter, '2027-03-17', 'mid')).toMatchObject({ whyNot: 'beyond-horizon' });
    await setRuleCard(server, world.ruleCard.id, ruleCardContent());
  });

  it('are for all the lots at once: room and inspectors’ time for each', async () => {
    await book(world, world.lots[0], { date: '2027-03-04', label: 'mid' });
    const three = world.lots.slice(1, 4);
    expect(offerOf((await offers(three)).body, '2027-03-04', 'mid')).toMatchObject({ whyNot: 'full', roomLeft: 2 });
    const { stages, ...content } = ruleCardContent();
    await setRuleCard(server, world.ruleCard.id, {
      ...content,
      stages: stages.map((stage) => ({ ...stage, minutesPerVisit: 70 })),
    });
    const { body } = await offers(three);
    // two inspectors, 90 minutes each: two such visits find their time, a third does not
    expect(offerOf(body, '2027-03-08', 'early')).toMatchObject({ whyNot: 'no-inspector', roomLeft: 3 });
    expect(offerOf((await offers(three.slice(1))).body, '2027-03-08', 'early')).toMatchObject({ whyNot: null });
    await setRuleCard(server, world.ruleCard.id, ruleCardContent());
  });

  it('what is offered can be taken, what is not cannot', async () => {
    const { body } = await offers([world.lots[5]]);
    for (const { date, label, isTakeable, whyNot } of body.windows as Offer[]) {
      const answer = await ask(world, [world.lots[5].id], { date, label });
      expect([date, label, answer.status]).toEqual([date, label, isTakeable ? 201 : 409]);
      if (isTakeable)
        await VisitModel.update(
          { state: 'withdrawn', endedAt: server.clock.now() },
          { where: { id: answer.body.visits[0].id } },
        );
      else
        expect(answer.body.code).toBe(
          { past: 'window-past', full: 'window-full', closed: 'window-closed' }[whyNot ?? ''] ?? whyNot,
        );
    }
  });

  it('keep re-inspections to the windows meant for them', async () => {
    const [lot] = (await addLots(server, world, 1)) as [LotModel];
    await addClosedVisit(server, world, lot, 'fail');
    await setRuleCard(
      server,
      world.ruleCard.id,
      ruleCardContent({ asking: asking({ reinspectionWindows: ['late'] }) }),
    );
    const labels = async (each: LotModel) => [
      ...new Set(((await offers([each])).body.windows as Offer[]).map(({ label }) => label)),
    ];
    expect(await labels(lot)).toEqual(['late']);
    expect(await labels(world.lots[5])).toEqual(['early', 'mid', 'noon', 'late']);
    await setRuleCard(server, world.ruleCard.id, ruleCardContent());
  });

  it('are for whoever may ask', async () => {
    for (const by of ['plumber', 'desk'] as const) expect((await offers([world.lots[5]], { by })).status).toBe(200);
    for (const by of ['helper', 'inspector', 'builderOwner'] as const)
      expect((await offers([world.lots[5]], { by })).body.code).toBe('not-allowed');
    for (const by of ['otherSuperintendent', 'otherDesk', 'operator'] as const)
      expect((await offers([world.lots[5]], { by })).body.code).toBe('not-found');
    expect((await offers([world.lots[5]], { stageCode: 'roof' })).body.code).toBe('stage-unknown');
    expect((await offers([world.otherLot], { by: 'otherSuperintendent' })).body).toMatchObject({
      booking: 'desk',
      zone: 'America/Chicago',
    });
  });
});
