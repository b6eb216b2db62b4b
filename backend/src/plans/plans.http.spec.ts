import { randomUUID } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { TestPlan } from '@holdwater/shared-types/plans/plan.contract.js';
import { RuleCardModel } from '../departments/rule-card.model.js';
import { HoldScenario } from '../holds/holds.scenario.js';
import { LotUnitModel } from '../lots/lot-unit.model.js';
import { LotModel } from '../lots/lot.model.js';
import { house } from '../testing/fixtures/house.js';
import { ruleCardContent } from '../testing/fixtures/rule-card-content.js';
import { createWorld, type World, type WorldPerson } from '../testing/fixtures/world.js';
import { startTestApp, testNow, type TestApp } from '../testing/test-app.js';
import { TestPlanModel } from './test-plan.model.js';

type Index = 0 | 1 | 2 | 3 | 4 | 5;

describe('test plans over the API', () => {
  let server: TestApp;
  let world: World;
  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
  });
  afterAll(() => server?.close());

  const dwv = { unitNumber: 1, stageCode: 'rough-in', system: 'dwv' };
  const water = { ...dwv, system: 'water' };
  const atticCut = (overrides: object = {}) => ({
    ...{ clientId: randomUUID(), madeAt: testNow, ...dwv, method: 'attic-cut', medium: 'water' },
    ...overrides,
  });
  const plansOf = (index: Index) => `/api/lots/${world.lots[index].id}/plans`;
  const chooseAs = (person: WorldPerson, index: Index, body: object) => world.as(person).post(plansOf(index), body);
  const choose = async (index: Index, body: object = atticCut()): Promise<TestPlan> =>
    (await chooseAs('plumber', index, body).expect(201)).body as TestPlan;
  const offersOf = (index: Index, body: object) =>
    world.as('inspector').post(`/api/lots/${world.lots[index].id}/plan-offers`, body);
  const currentOf = async (index: Index): Promise<TestPlan[]> =>
    (await world.as('superintendent').get(plansOf(index)).expect(200)).body.items as TestPlan[];

  describe('what is offered', () => {
    it('works out every way there is and says of each that does not serve why', async () => {
      const { body } = await offersOf(0, dwv).expect(200);
      expect(body).toMatchObject({ ruleCard: { version: 1 }, isGroundwork: false, hasHouse: true });
      const told = body.ways.map((way: { method: string; isOffered: boolean; reasons: { code: string }[] }) => [
        way.method,
        way.isOffered,
        way.reasons.map(({ code }) => code),
      ]);
      // the card of the fixture accepts four ways and 5 ft over the highest fitting; the laundry stands on the first floor
      expect(told).toEqual([
        ['stack-to-roof', true, []],
        ['attic-cut', true, []],
        ['laundry-box', false, ['laundry-on-lowest-floor', 'level-short']],
        ['laundry-riser', false, ['method-not-accepted', 'level-short']],
        ['standpipe', true, []],
        ['sectional', false, ['method-not-accepted']],
        ['air', false, ['method-not-accepted', 'air-on-plastic']],
      ]);
    });

    it('answers heads as the standard’s foot of water does', async () => {
      const { body } = await offersOf(0, dwv).expect(200);
      const cut = body.ways.find((way: { method: string }) => way.method === 'attic-cut').dwv;
      const plug = cut.plugs[0];
      expect(plug).toMatchObject({ name: 'clean-out', headFt: 22 });
      // conventional foot of water, NIST SP 811: 0.433528 psi; at the default 60 °F within a tenth of a percent of it
      expect(Math.abs(plug.pressurePsi / (22 * 0.433528) - 1)).toBeLessThan(0.0015);
    });

    it('takes the plumber’s tools into account', async () => {
      const plugs = [{ name: 'weak', elevationFt: -2, ratedPsi: 5, nominalIn: 4 }];
      const { body } = await offersOf(0, { ...dwv, tools: { plugs } }).expect(200);
      const roof = body.ways[0];
      expect(roof).toMatchObject({ method: 'stack-to-roof', isOffered: false, reasons: [{ code: 'plug-overloaded' }] });
      const gauge = { rangePsi: 300, incrementPsi: 5 };
      const coarse = await offersOf(0, { ...water, tools: { gauge } }).expect(200);
      // IRC P2503.9: over 10 to 100 psi, increments of 1 psi or less
      expect(coarse.body.ways[0].reasons).toEqual([
        { code: 'gauge-too-coarse', params: { incrementPsi: 5, requiredIncrementPsi: 1 } },
      ]);
    });

    it('names the measures that are missing, and has no way without a house', async () => {
      const { id } = world.lots[5];
      await LotUnitModel.update({ geometry: house({ atticCutFt: null }) }, { where: { lotId: id } });
      const { body } = await offersOf(5, dwv).expect(200);
      expect(body.ways[1]).toMatchObject({
        ...{ method: 'attic-cut', isOffered: false, reasons: [], dwv: null },
        missing: [{ field: 'atticCutFt', code: 'required' }],
      });
      await LotUnitModel.update({ geometry: null }, { where: { lotId: id } });
      const bare = await offersOf(5, dwv).expect(200);
      expect(bare.body).toMatchObject({ hasHouse: false, ways: [] });
    });

    it('plans groundwork for what is there before the slab', async () => {
      const { body } = await offersOf(0, { ...dwv, stageCode: 'groundwork' }).expect(200);
      expect(body.isGroundwork).toBe(true);
      const standpipe = body.ways.find((way: { method: string }) => way.method === 'standpipe');
      expect(standpipe).toMatchObject({ isOffered: true, missing: [] });
      // the fixture's card: 5 ft above the highest fitting, and the stubs end at the slab
      expect(standpipe.dwv).toMatchObject({ fillLevelFt: 20, requiredLevelFt: 5, shortByFt: 0, notUnderTest: [] });
      expect(standpipe.dwv.levels.map((level: { name: string }) => level.name)).not.toContain('second');
    });
  });

  describe('choosing', () => {
    it('keeps the plan as it was told, tells the ledger, and shows it to all three parties', async () => {
      const plan = await choose(0);
      expect(plan).toMatchObject({
        ...{ ...dwv, method: 'attic-cut', medium: 'water', isCurrent: true, supersededAt: null, stale: [] },
        ...{ chosenBy: 'Ruben Achterberg', ruleCard: { version: 1 }, water: null },
        dwv: { fillLevelFt: 20, requiredLevelFt: 19, usable: true },
      });
      for (const person of ['superintendent', 'helper', 'inspector', 'desk'] as const) {
        const { body } = await world.as(person).get(plansOf(0)).expect(200);
        expect(body).toEqual({ items: [plan] });
      }
      const entries = await server.db.query<{ kind: string; payload: object }>(
        'SELECT kind, payload FROM ledger_entries WHERE lot_id = :lotId',
        { replacements: { lotId: world.lots[0].id }, type: QueryTypes.SELECT },
      );
      const payload = { planId: plan.id, ...dwv, method: 'attic-cut', medium: 'water', ruleCardVersion: 1 };
      expect(entries).toEqual([{ kind: 'plan-chosen', payload }]);
    });

    it('supersedes the plan before it and keeps it in the history', async () => {
      const first = await choose(1);
      const second = await choose(1, atticCut({ method: 'stack-to-roof' }));
      expect((await currentOf(1)).map(({ id }) => id)).toEqual([second.id]);
      const query = `unitNumber=1&stageCode=rough-in&system=dwv`;
      const { body } = await world
        .as('plumber')
        .get(`${plansOf(1)}/history?${query}`)
        .expect(200);
      expect(body.items.map((each: TestPlan) => [each.method, each.isCurrent]).sort()).toEqual([
        ['attic-cut', false],
        ['stack-to-roof', true],
      ]);
      const old = await world.as('desk').get(`/api/plans/${first.id}`).expect(200);
      expect(old.body).toMatchObject({ method: 'attic-cut', isCurrent: false, dwv: first.dwv });
    });

    it('keeps one plan for each system, and one current of each when two are chosen at once', async () => {
      await choose(2);
      await choose(2, atticCut({ ...water, method: 'gauge' }));
      expect((await currentOf(2)).map(({ system }) => system)).toEqual(['dwv', 'water']);
      const both = await Promise.all([chooseAs('plumber', 2, atticCut()), chooseAs('plumber', 2, atticCut())]);
      expect(both.map(({ status }) => status)).toEqual([201, 201]);
      expect((await currentOf(2)).filter(({ system }) => system === 'dwv')).toHaveLength(1);
    });

    it('gives the same plan again for the same client id, and refuses the id on another lot', async () => {
      const body = atticCut();
      const first = await choose(3, body);
      expect(await choose(3, body)).toEqual(first);
      const elsewhere = await chooseAs('plumber', 4, body).expect(400);
      expect(elsewhere.body).toMatchObject({ code: 'bad-input', fields: { clientId: 'used-before' } });
    });

    it('never edits or loses a plan in the database', async () => {
      const plan = await choose(3);
      await expect(TestPlanModel.update({ method: 'standpipe' }, { where: { id: plan.id } })).rejects.toThrow();
      await expect(TestPlanModel.destroy({ where: { id: plan.id } })).rejects.toThrow();
    });
  });

  describe('refuses', () => {
    it.each(['superintendent', 'helper', 'plumberOwner', 'inspector', 'desk'] as const)(
      '%s, who does not choose the method',
      async (person) => {
        const { body } = await chooseAs(person, 4, atticCut()).expect(403);
        expect(body.code).toBe('not-allowed');
      },
    );

    it('strangers, to whom the lot is not there', async () => {
      await chooseAs('otherPlumber', 4, atticCut()).expect(404);
      await world.as('otherPlumber').get(plansOf(4)).expect(404);
      const plan = await choose(4);
      await world.as('otherPlumber').get(`/api/plans/${plan.id}`).expect(404);
    });

    it('a method the rule card does not accept', async () => {
      const { body } = await chooseAs('plumber', 4, atticCut({ method: 'air', medium: 'air' })).expect(409);
      expect(body).toMatchObject({ code: 'method-not-accepted', fields: { method: 'method-not-accepted' } });
    });

    it('a way that does not serve this house, with its reasons', async () => {
      const { body } = await chooseAs('plumber', 4, atticCut({ method: 'laundry-box' })).expect(409);
      expect(body.code).toBe('plan-not-usable');
      expect(body.params.reasons.map(({ code }: { code: string }) => code)).toContain('laundry-on-lowest-floor');
    });

    it('a medium the rule card gives no pressure for', async () => {
      const body = atticCut({ ...water, method: 'gauge', medium: 'air' });
      const refused = await chooseAs('plumber', 4, body).expect(409);
      expect(refused.body).toMatchObject({
        code: 'plan-not-usable',
        params: { reasons: [{ code: 'medium-not-accepted' }] },
      });
    });

    it.each([
      ['a stage the card does not have', { stageCode: 'attic' }, 400, 'stage-unknown', undefined],
      ['a system the stage does not test', { stageCode: 'final' }, 400, 'bad-input', { system: 'not-of-this-stage' }],
      ['a unit there is not', { unitNumber: 2 }, 400, 'bad-input', { unitNumber: 'no-such-unit' }],
      ['a method of the other system', { method: 'gauge' }, 400, 'bad-input', { method: 'not-one-of-the-choices' }],
      [
        'a medium a method is never filled with',
        { medium: 'air' },
        400,
        'bad-input',
        { medium: 'not-one-of-the-choices' },
      ],
      [
        'a rating of zero',
        { tools: { plugs: [{ name: 'a', elevationFt: 0, ratedPsi: 0 }] } },
        400,
        'bad-input',
        { 'tools.plugs.0.ratedPsi': 'must-be-positive' },
      ],
      [
        'an instant ahead of now',
        { madeAt: '2027-03-02T17:00:00Z' },
        400,
        'reading-in-the-future',
        { madeAt: 'in-the-future' },
      ],
    ])('%s', async (_name, overrides, status, code, fields) => {
      const { body } = await chooseAs('plumber', 4, atticCut(overrides)).expect(status);
      expect(body.code).toBe(code);
      if (fields !== undefined) expect(body.fields).toEqual(fields);
    });

    it('to plan a house nobody measured', async () => {
      const { body } = await chooseAs('plumber', 5, atticCut()).expect(409);
      expect(body.code).toBe('no-house');
    });

    it('to plan without a department, whose rules nobody knows', async () => {
      await LotModel.update({ departmentId: null }, { where: { id: world.lots[5].id } });
      const { body } = await chooseAs('plumber', 5, atticCut()).expect(409);
      expect(body.code).toBe('lot-without-department');
    });
  });

  describe('a test started by a plan', () => {
    const start = (index: Index, body: object) =>
      world.as('plumber').post(`/api/lots/${world.lots[index].id}/holds`, body);
    const reading = () => ({ clientId: randomUUID(), madeAt: testNow });
    const body = (overrides: object) => ({
      ...{ clientId: randomUUID(), madeAt: testNow, ...dwv, method: 'attic-cut', medium: 'water' },
      ...{ tape: { incrementIn: 0.25 }, firstReading: { ...reading(), levelIn: 0 } },
      ...overrides,
    });

    it('takes level, ceiling and gauge from it, and keeps whose plan it was', async () => {
      const plan = await choose(2);
      const lines = await choose(2, atticCut({ ...water, method: 'gauge' }));
      const drains = await start(2, body({ planId: plan.id })).expect(201);
      expect(drains.body).toMatchObject({ planId: plan.id, fillLevelFt: 20, gauge: null });
      const bare = { ...body({ ...water, method: 'gauge' }), tape: undefined };
      const pumped = await start(2, { ...bare, firstReading: { ...reading(), pressurePsi: 120, gaugeValve: 'open' } });
      // named or not: the current plan of the same way is meant
      expect(pumped.body).toMatchObject({
        ...{ planId: lines.id, gauge: { rangePsi: 200, incrementPsi: 1 } },
        ceilingPsi: lines.water?.ceilingPsi,
      });
    });

    it('goes by what was really filled to, where it was told', async () => {
      const plan = await choose(3);
      const { body: told } = await start(3, body({ planId: plan.id, fillLevelFt: 19.5 })).expect(201);
      expect(told).toMatchObject({ planId: plan.id, fillLevelFt: 19.5 });
    });

    it('goes without one by another way, and refuses a plan of another part or way', async () => {
      const plan = await choose(4);
      const other = await choose(3);
      const refused = await start(4, body({ planId: other.id })).expect(400);
      expect(refused.body.fields).toEqual({ planId: 'no-such-plan' });
      const turned = await start(4, body({ planId: plan.id, method: 'stack-to-roof' })).expect(400);
      expect(turned.body.fields).toEqual({ method: 'not-as-planned' });
      const { body: own } = await start(4, body({ method: 'stack-to-roof', fillLevelFt: 24 })).expect(201);
      expect(own).toMatchObject({ planId: null, fillLevelFt: 24 });
    });
  });

  describe('a plan that no longer tells of what is there', () => {
    it('says so when the house changes, and holds again once it is as it was', async () => {
      await choose(1);
      const { id } = world.lots[1];
      const put = (geometry: object) =>
        world.as('superintendent').put(`/api/lots/${id}/units/1/geometry`, { geometry }).expect(200);
      await put(house({ ventTerminalFt: 26 }));
      expect((await currentOf(1))[0]?.stale).toEqual(['geometry-changed']);
      await put(house());
      expect((await currentOf(1))[0]?.stale).toEqual([]);
    });

    it('says so when another rule card comes into force, but not while a visit keeps the old one', async () => {
      await choose(0);
      await choose(3);
      await new HoldScenario(server, world).visit(world.lots[3]);
      const now = server.clock.now();
      await server.db.query(`UPDATE rule_cards SET effective = daterange('2027-01-01', '2027-03-02') WHERE id = :id`, {
        replacements: { id: world.ruleCard.id },
      });
      await server.db.query(
        `INSERT INTO rule_cards (id, department_id, version, state, content, effective, created_at, published_at)
         VALUES (:id, :departmentId, 2, 'published', :content, daterange('2027-03-02', NULL), :now, :now)`,
        {
          replacements: {
            ...{ id: randomUUID(), departmentId: world.ruleCard.departmentId, now },
            content: JSON.stringify(ruleCardContent()),
          },
        },
      );
      expect(await RuleCardModel.count({ where: { departmentId: world.ruleCard.departmentId } })).toBe(2);
      expect((await currentOf(0))[0]?.stale).toEqual(['rule-card-changed']);
      expect((await currentOf(3))[0]?.stale).toEqual([]);
      const anew = await choose(0);
      expect(anew).toMatchObject({ stale: [], ruleCard: { version: 2 } });
    });
  });
});
