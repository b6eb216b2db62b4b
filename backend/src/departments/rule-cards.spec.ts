import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { OrganizationModel } from '../accounts/organization.model.js';
import { createWorld, type World } from '../testing/fixtures/world.js';
import { join } from '../testing/fixtures/world.people.js';
import { createDepartment } from '../testing/fixtures/world.places.js';
import { askingFixture, ruleCardContent } from '../testing/fixtures/rule-card-content.js';
import { startTestApp, testNow, type TestApp } from '../testing/test-app.js';
import { RuleCardsQueries } from './rule-cards.queries.js';

let server: TestApp;
let world: World;
let departmentId: string;

beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
  departmentId = world.organizations.department.id;
});
afterAll(() => server.close());
beforeEach(() => server.clock.set(testNow));

const draft = async () => (await world.as('desk').post(`/api/departments/${departmentId}/rule-cards`)).body;
const publish = (id: string, effectiveFrom: string) =>
  world.as('desk').post(`/api/rule-cards/${id}/publish`, { effectiveFrom });

// product and definitions: "rule card, per department and version"; the rules of versions are those of interface §5, "Rule card"
describe('rule cards', () => {
  it('starts a draft from the newest version, once, and shows it to the department only', async () => {
    const first = await world.as('desk').post(`/api/departments/${departmentId}/rule-cards`);
    expect(first.status).toBe(201);
    expect(first.body).toMatchObject({
      version: 2,
      state: 'draft',
      effectiveFrom: null,
      isInForce: false,
      zone: 'America/Denver',
    });
    expect(first.body.content).toEqual(JSON.parse(JSON.stringify(ruleCardContent())));
    expect((await draft()).id).toBe(first.body.id);
    const path = `/api/rule-cards/${first.body.id}`;
    expect((await world.as('inspector').get(path)).status).toBe(200);
    expect((await world.as('superintendent').get(path)).body.code).toBe('not-found');
    expect((await world.nobody().get(`/api/public/rule-cards/${first.body.id}`)).body.code).toBe('not-found');
    const seenByOthers = await world.as('plumber').get(`/api/departments/${departmentId}`);
    expect(seenByOthers.body.ruleCards.map((card: { state: string }) => card.state)).toEqual(['published']);
    expect((await world.as('departmentOwner').get(`/api/departments/${departmentId}`)).body.ruleCards).toHaveLength(2);
  });

  it('lets nobody but its own desk draft, edit or publish', async () => {
    const { id, content } = await draft();
    for (const person of ['inspector', 'departmentOwner'] as const) {
      const caller = world.as(person);
      expect((await caller.post(`/api/departments/${departmentId}/rule-cards`)).body.code).toBe('not-allowed');
      expect((await caller.put(`/api/rule-cards/${id}`, { content })).body.code).toBe('not-allowed');
      expect((await caller.post(`/api/rule-cards/${id}/publish`, { effectiveFrom: '2027-04-01' })).body.code).toBe(
        'not-allowed',
      );
    }
    expect((await world.as('otherDesk').put(`/api/rule-cards/${id}`, { content })).body.code).toBe('not-found');
    expect((await world.as('superintendent').post(`/api/departments/${departmentId}/rule-cards`)).body.code).toBe(
      'not-allowed',
    );
  });

  it('keeps what the desk edits and names what is wrong by its path', async () => {
    const { id } = await draft();
    const content = ruleCardContent({ asking: { ...askingFixture, cutoff: '14:30' } });
    const edited = await world.as('desk').put(`/api/rule-cards/${id}`, { content });
    expect(edited.body.content.asking.cutoff).toBe('14:30');
    const broken = { ...content, asking: { ...content.asking, windows: [] } };
    const refused = await world.as('desk').put(`/api/rule-cards/${id}`, { content: broken });
    expect(refused.body).toMatchObject({ code: 'bad-input', fields: { 'content.asking.windows': 'no-window' } });
  });

  it('refuses a day gone by in the department, a day that has a version, and parts that do not fit together', async () => {
    const { id, content } = await draft();
    // 23:30 on the 1st in Denver, while it is the 2nd in London
    server.clock.set('2027-03-02T06:30:00Z');
    expect((await publish(id, '2027-02-28')).body).toMatchObject({
      code: 'rule-card-in-the-past',
      params: { today: '2027-03-01' },
    });
    expect((await publish(id, '2027-01-01')).body.code).toBe('rule-card-in-the-past');
    const unfit = { ...content, asking: { ...content.asking, reinspectionWindows: ['dusk'] } };
    await world.as('desk').put(`/api/rule-cards/${id}`, { content: unfit });
    const refused = await publish(id, '2027-03-08');
    expect(refused.body).toMatchObject({
      code: 'rule-card-incomplete',
      fields: { 'asking.reinspectionWindows.0': 'unknown' },
    });
    await world.as('desk').put(`/api/rule-cards/${id}`, { content });
  });

  it('publishes from a day on: the version before ends the day before, and neither is edited again', async () => {
    const { id, content } = await draft();
    const published = await publish(id, '2027-03-08');
    expect(published.body).toMatchObject({
      state: 'published',
      effectiveFrom: '2027-03-08',
      effectiveTo: null,
      isInForce: false,
    });
    const { body } = await world.as('superintendent').get(`/api/departments/${departmentId}`);
    expect(body.ruleCards).toMatchObject([
      { version: 2, effectiveFrom: '2027-03-08', effectiveTo: null },
      { version: 1, effectiveFrom: '2027-01-01', effectiveTo: '2027-03-07', isInForce: true },
    ]);
    expect(body.department.ruleCard.version).toBe(1);
    expect((await world.as('desk').put(`/api/rule-cards/${id}`, { content })).body.code).toBe('rule-card-not-draft');
    expect((await publish(id, '2027-04-01')).body.code).toBe('rule-card-not-draft');
    const next = await draft();
    expect((await publish(next.id, '2027-03-08')).body.code).toBe('rule-card-overlap');
    expect((await publish(next.id, '2027-03-05')).body).toMatchObject({
      code: 'rule-card-overlap',
      params: { version: 2, from: '2027-03-08' },
    });
  });

  it('changes the version in force at the department’s midnight', async () => {
    const inForce = async () =>
      (await world.nobody().get('/api/public/rule-cards')).body.items.find(
        (each: { id: string }) => each.id === departmentId,
      ).ruleCard.version;
    server.clock.set('2027-03-08T06:59:59Z');
    expect(await inForce()).toBe(1);
    server.clock.set('2027-03-08T07:00:00Z');
    expect(await inForce()).toBe(2);
    const queries = server.get(RuleCardsQueries);
    expect((await queries.getRuleCardInForce(departmentId, '2027-03-07')).version).toBe(1);
    expect((await queries.getRuleCardInForce(departmentId, '2027-03-08')).version).toBe(2);
    expect(await queries.findRuleCardInForce(departmentId, '2026-12-31')).toBeNull();
    await expect(queries.getRuleCardInForce(departmentId, '2026-12-31')).rejects.toMatchObject({
      code: 'no-rule-card',
    });
  });

  it('records drafts and versions in the department’s ledger and tells of a new version once', async () => {
    const [entries] = await server.db.query(
      `SELECT kind, actor_role FROM ledger_entries WHERE scope = 'department:${departmentId}' ORDER BY sequence`,
    );
    expect(entries.map((entry) => (entry as { kind: string }).kind)).toEqual([
      'rule-card-drafted',
      'rule-card-published',
      'rule-card-drafted',
    ]);
    const [events] = await server.db.query(`SELECT payload FROM outbox_events WHERE kind = 'rule-card-published'`);
    expect(events).toMatchObject([{ payload: { version: 2, effectiveFrom: '2027-03-08', departmentId } }]);
  });

  it('opens published versions to anyone, whoever asks', async () => {
    const { body } = await world.nobody().get('/api/public/rule-cards');
    expect(body.items.map((each: { name: string }) => each.name)).toEqual(['Tallowmere', 'Vennick']);
    const card = await world.nobody().get(`/api/public/rule-cards/${world.ruleCard.id}`);
    expect(card.body).toMatchObject({ departmentName: 'Tallowmere', version: 1, state: 'published' });
    expect((await world.nobody().get('/api/departments')).status).toBe(401);
    expect((await world.as('otherHelper').get('/api/departments')).body.items).toHaveLength(2);
    expect((await world.as('desk').get('/api/departments/5b0c9a2e-0d5e-4f0b-9a53-0c2f3f1f0001')).status).toBe(404);
  });

  it('takes two desks publishing at once as one', async () => {
    const { id } = await draft();
    const answers = await Promise.all([publish(id, '2027-05-03'), publish(id, '2027-05-03')]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it('begins with the model codes’ values where a department has no version yet', async () => {
    const now = server.clock.now();
    const organization = await OrganizationModel.create({
      id: randomUUID(),
      name: 'Brackenford',
      kind: 'department',
      phone: null,
      createdAt: now,
    });
    await createDepartment(organization, 'America/Phoenix', 1086);
    await join(world.people.otherDesk, organization, ['desk'], now);
    const { status, body } = await world.as('otherDesk').post(`/api/departments/${organization.id}/rule-cards`);
    expect(status).toBe(201);
    // IPC 312.2: ten feet of head
    expect(body).toMatchObject({ version: 1, content: { tests: [{ headRule: { feet: 10 } }, {}, {}] } });
    const from = await world
      .as('otherDesk')
      .post(`/api/rule-cards/${body.id}/publish`, { effectiveFrom: '2027-03-02' });
    expect(from.body).toMatchObject({ isInForce: true, effectiveFrom: '2027-03-02' });
  });
});
