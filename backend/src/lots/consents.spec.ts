import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { OrganizationModel } from '../accounts/organization.model.js';
import { DepartmentModel } from '../departments/department.model.js';
import { createWorld, type World, type WorldPerson } from '../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { answeringRole, canAnswerConsent } from './consents.policy.js';

let server: TestApp;
let world: World;
let outside: OrganizationModel;
let nextNumber = 500;

beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
  outside = await OrganizationModel.create({
    id: randomUUID(),
    name: 'Farrow County',
    kind: 'department',
    phone: null,
    createdAt: server.clock.now(),
  });
  await DepartmentModel.create({ id: outside.id, zone: 'America/Boise', elevationFt: 2700, isOutside: true });
});
afterAll(() => server.close());

/** A lot of Odderly Homes that asks strangers to join. */
async function lotAsking(extra: object): Promise<string> {
  nextNumber += 1;
  const given = {
    builderId: world.organizations.builder.id,
    tractId: world.tract.id,
    number: String(nextNumber),
    address: `${nextNumber} Tern Court`,
    ...extra,
  };
  const { status, body } = await world.as('superintendent').post('/api/lots', given);
  expect(status).toBe(201);
  return body.id as string;
}
const askingPlumber = () => lotAsking({ plumberId: world.organizations.otherPlumber.id });
const answer = (person: WorldPerson, lotIds: string[], isJoining: boolean, why?: string) =>
  world
    .as(person)
    .post('/api/consents', { organizationId: world.organizations.otherPlumber.id, lotIds, isJoining, why });
const askedLots = async (person: WorldPerson) =>
  ((await world.as(person).get('/api/consents')).body.items as Array<{ lotId: string }>).map(({ lotId }) => lotId);
const partiesOf = async (lotId: string) => {
  const { body } = await world.as('superintendent').get(`/api/lots/${lotId}`);
  return body.parties.map((party: { kind: string; status: string; organization: { name: string } }) => [
    party.kind,
    party.status,
    party.organization.name,
  ]);
};
const eventsOf = async (kind: string, lotId: string) => {
  const [rows] = await server.db.query('SELECT payload FROM outbox_events WHERE kind = :kind AND lot_id = :lotId', {
    replacements: { kind, lotId },
  });
  return rows as Array<{ payload: Record<string, unknown> }>;
};
const ledgerKinds = async (lotId: string) => {
  const [rows] = await server.db.query('SELECT kind FROM ledger_entries WHERE lot_id = :lotId ORDER BY sequence', {
    replacements: { lotId },
  });
  return (rows as Array<{ kind: string }>).map(({ kind }) => kind);
};

// product: "a lot ties one builder, one plumber and one department together (each attached only with its consent)"
describe('asking a party to join', () => {
  it('shows the one asked what it must know to answer, and not the lot', async () => {
    const lotId = await askingPlumber();
    const { body } = await world.as('otherPlumber').get('/api/consents');
    const [asked] = body.items;
    expect(asked).toEqual({
      lotId,
      lotNumber: String(nextNumber),
      tractName: 'Quillback Rise',
      address: `${nextNumber} Tern Court`,
      builderName: 'Odderly Homes',
      kind: 'plumber',
      organization: { id: world.organizations.otherPlumber.id, name: 'Merrow', kind: 'plumber', phone: '555-0104' },
      askedAt: server.clock.now().toISOString(),
      handover: null,
    });
    expect((await world.as('otherPlumber').get(`/api/lots/${lotId}`)).status).toBe(404);
    expect(await askedLots('otherHelper')).toEqual([lotId]);
    for (const person of ['plumber', 'otherSuperintendent', 'otherDesk', 'operator'] as const)
      expect(await askedLots(person)).toEqual([]);
    expect(await partiesOf(lotId)).toEqual([
      ['builder', 'attached', 'Odderly Homes'],
      ['plumber', 'pending', 'Merrow'],
    ]);
    expect(await eventsOf('consent-asked', lotId)).toMatchObject([
      { payload: { organizationId: world.organizations.otherPlumber.id, kind: 'plumber', lotCount: 1 } },
    ]);
    await answer('otherPlumber', [lotId], false);
  });

  it('asks one at a time, and none where one is attached', async () => {
    const lotId = await askingPlumber();
    const ask = (kind: string, organizationId: string) =>
      world.as('builderOwner').post(`/api/lots/${lotId}/parties`, { kind, organizationId });
    expect((await ask('plumber', world.organizations.plumber.id)).body.code).toBe('party-pending');
    expect((await ask('department', world.organizations.plumber.id)).body.fields).toEqual({
      organizationId: 'unknown',
    });
    const asked = await ask('department', world.organizations.otherDepartment.id);
    expect(asked.body.parties.map(({ status }: { status: string }) => status)).toEqual([
      'attached',
      'pending',
      'pending',
    ]);
    await answer('otherPlumber', [lotId], true);
    expect((await ask('plumber', world.organizations.otherPlumber.id)).body.code).toBe('party-already-attached');
    expect((await ask('plumber', world.organizations.plumber.id)).body.code).toBe('party-already-attached');
  });

  it.each([
    ['plumber', 'not-allowed'],
    ['desk', 'not-allowed'],
    ['otherSuperintendent', 'not-found'],
  ] as const)('lets the %s not ask: %s', async (person, code) => {
    const asked = { kind: 'plumber', organizationId: world.organizations.plumber.id };
    expect((await world.as(person).post(`/api/lots/${world.lots[0].id}/parties`, asked)).body.code).toBe(code);
  });

  it('takes two askings at once as one', async () => {
    const lotId = await lotAsking({});
    const ask = () =>
      world
        .as('superintendent')
        .post(`/api/lots/${lotId}/parties`, { kind: 'plumber', organizationId: world.organizations.plumber.id });
    const answers = await Promise.all([ask(), ask()]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it('joins an outside department at once', async () => {
    const lotId = await lotAsking({ departmentId: outside.id });
    expect(await partiesOf(lotId)).toEqual([
      ['builder', 'attached', 'Odderly Homes'],
      ['department', 'attached', 'Farrow County'],
    ]);
    expect(await ledgerKinds(lotId)).toEqual(['lot-added', 'party-joined']);
    expect(await eventsOf('consent-asked', lotId)).toEqual([]);
  });
});

describe('answering', () => {
  it('joins several lots in one act, tells the builder once, and opens them to the new party', async () => {
    const lotIds = [await askingPlumber(), await askingPlumber()].sort();
    expect((await answer('otherPlumber', lotIds, true)).body).toEqual({ done: true });
    for (const lotId of lotIds) {
      expect((await world.as('otherHelper').get(`/api/lots/${lotId}`)).body).toMatchObject({ plumberName: 'Merrow' });
      expect(await ledgerKinds(lotId)).toEqual(['lot-added', 'party-asked', 'party-joined']);
    }
    expect(await askedLots('otherPlumber')).toEqual([]);
    expect(await eventsOf('consent-given', lotIds[0] ?? '')).toMatchObject([{ payload: { lotCount: 2 } }]);
    expect(await eventsOf('consent-given', lotIds[1] ?? '')).toEqual([]);
  });

  it('refuses with a reason, which the builder reads, and may be asked again', async () => {
    const lotId = await askingPlumber();
    expect((await answer('otherPlumberOwner', [lotId], false, 'No crew in May')).status).toBe(200);
    expect(await partiesOf(lotId)).toEqual([
      ['builder', 'attached', 'Odderly Homes'],
      ['plumber', 'refused', 'Merrow'],
    ]);
    expect(await eventsOf('consent-refused', lotId)).toMatchObject([{ payload: { why: 'No crew in May' } }]);
    expect((await world.as('otherPlumber').get(`/api/lots/${lotId}`)).status).toBe(404);
    server.clock.advance(1);
    const again = await world
      .as('superintendent')
      .post(`/api/lots/${lotId}/parties`, { kind: 'plumber', organizationId: world.organizations.otherPlumber.id });
    expect(again.status).toBe(200);
    expect((await answer('otherPlumber', [lotId], true)).status).toBe(200);
    expect(await partiesOf(lotId)).toContainEqual(['plumber', 'attached', 'Merrow']);
  });

  it('is all or nothing: one lot that did not ask, and none is answered', async () => {
    const lotId = await askingPlumber();
    for (const other of [world.lots[0].id, world.otherLot.id, randomUUID()]) {
      expect((await answer('otherPlumber', [lotId, other], true)).body.code).toBe('not-found');
    }
    expect(await askedLots('otherPlumber')).toEqual([lotId]);
    await answer('otherPlumber', [lotId], false);
  });

  it('says how it was answered before', async () => {
    const lotId = await askingPlumber();
    await answer('otherPlumber', [lotId], true);
    expect((await answer('otherPlumberOwner', [lotId], false)).body).toMatchObject({
      code: 'stale-state',
      params: { is: 'attached', lotId },
    });
  });

  it('lets two colleagues answer at once: one is told that it was answered', async () => {
    const lotId = await askingPlumber();
    const answers = await Promise.all([
      answer('otherPlumber', [lotId], true),
      answer('otherPlumberOwner', [lotId], false),
    ]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it('is for those who speak for the organization', async () => {
    const lotId = await askingPlumber();
    expect((await answer('otherHelper', [lotId], true)).body.code).toBe('not-allowed');
    for (const person of ['superintendent', 'plumber', 'otherSuperintendent', 'operator'] as const) {
      expect((await answer(person, [lotId], true)).body.code).toBe('not-found');
    }
    expect(await askedLots('otherPlumber')).toEqual([lotId]);
  });

  it('lets desk and owner of a department answer, its inspector not', async () => {
    const organizationId = world.organizations.otherDepartment.id;
    for (const [person, status] of [
      ['otherInspector', 403],
      ['otherDesk', 200],
      ['otherDepartmentOwner', 200],
    ] as const) {
      const lotId = await lotAsking({ departmentId: organizationId });
      const answered = await world
        .as(person)
        .post('/api/consents', { organizationId, lotIds: [lotId], isJoining: true });
      expect(answered.status).toBe(status);
      const { body } = await world.as('superintendent').get(`/api/lots/${lotId}`);
      expect(body.zone).toBe(status === 200 ? 'America/Chicago' : null);
    }
  });
});

describe('consents policy', () => {
  const actorOf = (...roles: Array<'plumber' | 'helper' | 'inspector' | 'desk' | 'owner'>) => ({
    ...{ personId: 'p', sessionId: 's', name: 'P', isOperator: false },
    memberships: [{ organizationId: 'o', kind: 'plumber' as const, roles }],
  });

  it('is for plumber, desk and owner of the organization asked', () => {
    for (const role of ['plumber', 'desk', 'owner'] as const) {
      expect(canAnswerConsent(actorOf(role), 'o')).toBe(true);
      expect(answeringRole(actorOf(role), 'o')).toBe(role);
      expect(canAnswerConsent(actorOf(role), 'other')).toBe(false);
    }
    for (const role of ['helper', 'inspector'] as const) expect(canAnswerConsent(actorOf(role), 'o')).toBe(false);
  });
});
