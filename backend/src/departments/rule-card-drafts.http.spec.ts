import { randomUUID } from 'node:crypto';
import type { RuleCard } from '@holdwater/shared-types/departments/departments.contract.js';
import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { book } from '../testing/fixtures/visits.js';
import { createWorld, type World } from '../testing/fixtures/world.js';
import { startTestApp, testNow, type TestApp } from '../testing/test-app.js';

let server: TestApp;
let world: World;
let departmentId: string;

beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
  departmentId = world.organizations.department.id;
});
afterAll(() => server.close());

const draft = async (): Promise<RuleCard> =>
  (await world.as('desk').post(`/api/departments/${departmentId}/rule-cards`).expect(201)).body as RuleCard;
const save = (id: string, content: unknown) => world.as('desk').put(`/api/rule-cards/${id}`, { content });
const firstTest = (content: RuleCardContent, change: object) => ({
  ...content,
  tests: content.tests.map((test, at) => (at === 0 ? { ...test, ...change } : test)),
});

// issue "Rule cards", bad input: each refused with words on its field
describe('a draft of a rule card', () => {
  it('names who changed it last, to its department alone', async () => {
    const { id, content, edited } = await draft();
    expect(edited).toBeNull();
    expect((await save(id, content)).body.edited).toEqual({ by: 'Wes Pomfret', at: testNow.replace('Z', '.000Z') });
    await world.as('desk').post(`/api/rule-cards/${id}/publish`, { effectiveFrom: '2027-03-08' }).expect(200);
    expect((await world.as('inspector').get(`/api/rule-cards/${id}`)).body.edited).not.toBeNull();
    expect((await world.as('superintendent').get(`/api/rule-cards/${id}`)).body.edited).toBeNull();
    expect((await world.nobody().get(`/api/public/rule-cards/${id}`)).body.edited).toBeNull();
  });

  it.each([
    ['no accepted method', { acceptedMethods: [] }, 'acceptedMethods', 'no-accepted-method'],
    [
      'a pressure of zero',
      { pressures: [{ medium: 'air', minimumPsi: 0, preferredPsi: null }] },
      'pressures.0.minimumPsi',
      'must-be-positive',
    ],
    ['a level below nothing', { headRule: { kind: 'fill-level', feet: -1 } }, 'headRule.feet', 'out-of-range'],
    ['no time to stand', { standMinutes: 0 }, 'standMinutes', 'out-of-range'],
  ])('refuses %s at its field', async (_what, change, path, code) => {
    const { id, content } = await draft();
    const answer = await save(id, firstTest(content, change));
    expect(answer.body).toMatchObject({ code: 'bad-input', fields: { [`content.tests.0.${path}`]: code } });
  });

  it('keeps what does not fit together, and refuses to publish it', async () => {
    const { id, content } = await draft();
    const zero = firstTest(content, { headRule: { kind: 'above-highest-fitting', feet: 0 } });
    const unworked = { ...zero, asking: { ...zero.asking, windows: [{ ...zero.asking.windows[0]!, days: [7] }] } };
    await save(id, unworked).expect(200);
    const refused = await world.as('desk').post(`/api/rule-cards/${id}/publish`, { effectiveFrom: '2027-04-05' });
    expect(refused.status).toBe(400);
    expect(refused.body).toMatchObject({
      code: 'rule-card-incomplete',
      fields: { 'tests.0.headRule.feet': 'must-be-positive', 'asking.windows.0.days': 'nobody-works' },
    });
    await save(id, content).expect(200);
  });

  it('is thrown away by its desk only, and its number is the next draft’s', async () => {
    const { id, version } = await draft();
    const path = `/api/rule-cards/${id}`;
    await world.as('inspector').delete(path).expect(403);
    await world.as('otherDesk').delete(path).expect(404);
    await world.as('plumber').delete(path).expect(404);
    await world.nobody().delete(path).expect(401);
    await world.as('desk').delete(path).expect(200);
    await world.as('desk').get(path).expect(404);
    await world.as('desk').delete(path).expect(404);
    const next = await draft();
    expect(next.version).toBe(version);
    expect(next.id).not.toBe(id);
    const [entries] = await server.db.query(
      `SELECT kind FROM ledger_entries WHERE scope = 'department:${departmentId}' ORDER BY sequence DESC LIMIT 2`,
    );
    expect(entries).toEqual([{ kind: 'rule-card-drafted' }, { kind: 'rule-card-draft-deleted' }]);
  });

  it('is not thrown away once it is published, by the database either', async () => {
    const answer = await world.as('desk').delete(`/api/rule-cards/${world.ruleCard.id}`);
    expect(answer.body).toMatchObject({ code: 'rule-card-not-draft', params: { version: 1 } });
    await expect(server.db.query(`DELETE FROM rule_cards WHERE id = '${world.ruleCard.id}'`)).rejects.toThrow(/kept/);
  });
});

// interface §5, Rule card: "what a new version touches (booked visits keep theirs)"
describe('what a new version touches', () => {
  it('counts what keeps its version and what is planned anew, and names plans it does not take', async () => {
    const { id, content } = await draft();
    const visit = await book(world, world.lots[0]);
    const plan = {
      ...{ clientId: randomUUID(), madeAt: testNow, unitNumber: 1, stageCode: 'rough-in', system: 'dwv' },
      ...{ method: 'attic-cut', medium: 'water' },
    };
    for (const lot of [world.lots[0], world.lots[1]])
      await world
        .as('plumber')
        .post(`/api/lots/${lot.id}/plans`, { ...plan, clientId: randomUUID() })
        .expect(201);
    const tests = content.tests.map((test) => ({ ...test, acceptedMethods: test.acceptedMethods.slice(0, 1) }));
    await save(id, { ...content, tests }).expect(200);
    const { body } = await world.as('desk').get(`/api/rule-cards/${id}/touches`).expect(200);
    expect(body).toEqual({
      keptVisits: { booked: 1, requested: 0, versions: [1] },
      lotsWithoutVisit: 5,
      // superintendent; plumber; desk and two inspectors: helpers and owners are not told
      told: [
        { organizationId: world.organizations.plumber.id, name: 'Dunlatch Plumbing', people: 1 },
        { organizationId: world.organizations.builder.id, name: 'Odderly Homes', people: 1 },
        { organizationId: departmentId, name: 'Tallowmere', people: 3 },
      ],
      // the first lot's plan is held to the version of its visit
      unfitPlans: [
        {
          ...{ lotId: world.lots[1].id, lotNumber: '2', tractName: 'Quillback Rise', stageCode: 'rough-in' },
          ...{ system: 'dwv', reason: 'method' },
        },
      ],
    });
    await world.as('desk').post(`/api/rule-cards/${id}/publish`, { effectiveFrom: '2027-04-05' }).expect(200);
    const kept = await world.as('superintendent').get(`/api/visits/${visit.id}`).expect(200);
    expect(kept.body.ruleCardVersion ?? kept.body.ruleCard?.version).toBe(1);
  });

  it('is told to members of the department alone', async () => {
    const { id } = await draft();
    const path = `/api/rule-cards/${id}/touches`;
    await world.as('inspector').get(path).expect(200);
    await world.as('otherDesk').get(path).expect(404);
    await world.as('superintendent').get(path).expect(404);
    await world.as('superintendent').get(`/api/rule-cards/${world.ruleCard.id}/touches`).expect(403);
    await world.nobody().get(path).expect(401);
  });
});
