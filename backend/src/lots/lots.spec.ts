import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { createWorld, type World, type WorldPerson } from '../testing/fixtures/world.js';
import { house } from '../testing/fixtures/house.js';
import { startTestApp, testNow, type TestApp } from '../testing/test-app.js';

let server: TestApp;
let world: World;

beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
});
afterAll(() => server.close());
beforeEach(() => server.clock.set(testNow));

const own: WorldPerson[] = [
  'superintendent',
  'builderOwner',
  'plumber',
  'helper',
  'plumberOwner',
  'desk',
  'inspector',
  'departmentOwner',
];
const strangers: WorldPerson[] = ['otherSuperintendent', 'otherPlumber', 'otherDesk', 'otherInspector', 'operator'];
const newLot = (number: string, extra: object = {}) => ({
  builderId: world.organizations.builder.id,
  tractId: world.tract.id,
  number,
  address: `${number} Tern Court`,
  ...extra,
});
const entriesOf = async (lotId: string) => {
  const [rows] = await server.db.query(
    `SELECT kind, actor_role, payload FROM ledger_entries WHERE lot_id = '${lotId}' ORDER BY sequence`,
  );
  return rows as Array<{ kind: string; actor_role: string; payload: Record<string, unknown> }>;
};

/** A booked visit of the inspector, straight into the table. */
async function bookVisit(lotId: string, date: string, startAt: string, state = 'booked'): Promise<string> {
  const id = randomUUID();
  await server.db.query(
    `INSERT INTO visits (id, lot_id, department_id, rule_card_id, stage_code, unit_numbers, state, window_date, window_label, "window", place,
       inspector_id, planned, requested_by, requesting_side, requested_at, ended_at, calendar_uid, created_at)
     VALUES (:id, :lotId, :departmentId, :ruleCardId, 'rough-in', '{1}', :state, :date, 'mid', tstzrange(:startAt, CAST(:startAt AS timestamptz) + interval '2 hours'),
       1, :inspectorId, tstzrange(:startAt, CAST(:startAt AS timestamptz) + interval '30 minutes'), :requestedBy, 'builder', :startAt,
       CASE WHEN :state = 'closed' THEN CAST(:startAt AS timestamptz) END, :id, :startAt)`,
    {
      replacements: {
        ...{ id, lotId, date, startAt, state },
        departmentId: world.organizations.department.id,
        ruleCardId: world.ruleCard.id,
        inspectorId: world.people.inspector.id,
        requestedBy: world.people.superintendent.id,
      },
    },
  );
  return id;
}

describe('reading a lot', () => {
  it.each(own)('shows it to the %s of its three organizations', async (person) => {
    const { status, body } = await world.as(person).get(`/api/lots/${world.lots[0].id}`);
    expect(status).toBe(200);
    expect(body).toMatchObject({
      number: '1',
      builderName: 'Odderly Homes',
      zone: 'America/Denver',
      tract: { name: 'Quillback Rise' },
    });
  });

  it.each(strangers)('hides it from the %s as if it were not there', async (person) => {
    const hidden = await world.as(person).get(`/api/lots/${world.lots[0].id}`);
    const missing = await world.as(person).get(`/api/lots/${randomUUID()}`);
    expect([hidden.status, hidden.body.code]).toEqual([404, 'not-found']);
    expect({ ...hidden.body, entry: '' }).toEqual({ ...missing.body, entry: '' });
  });

  it('tells its stages by the rule card in force, its people and what the reader may do', async () => {
    const { body } = await world.as('superintendent').get(`/api/lots/${world.lots[1].id}`);
    expect(body.stages.map(({ code, state }: { code: string; state: string }) => [code, state])).toEqual([
      ['groundwork', 'not-tested'],
      ['rough-in', 'not-tested'],
      ['final', 'not-tested'],
    ]);
    expect(body).toMatchObject({
      currentStage: 'groundwork',
      nextVisit: null,
      openCorrections: 0,
      ruleCard: { version: 1, effectiveFrom: '2027-01-01' },
    });
    const parties = body.parties.map((party: { kind: string; status: string; people: Array<{ name: string }> }) => [
      party.kind,
      party.status,
      party.people.map(({ name }) => name),
    ]);
    expect(parties).toEqual([
      ['builder', 'attached', ['Della Arkwright']],
      ['plumber', 'attached', ['Ruben Achterberg']],
      ['department', 'attached', ['Gil Strand', 'Noor Haverty', 'Wes Pomfret']],
    ]);
    expect(JSON.stringify(body)).not.toContain('@example.test');
    expect(body.abilities).toMatchObject({ canEdit: true, canDecide: false });
  });

  it('shows gate code and hazards to the inspector on the day of the visit in the department’s zone, and to nobody else of the department', async () => {
    const lotId = world.lots[2].id;
    await bookVisit(lotId, '2027-03-03', '2027-03-03T16:00:00Z');
    const accessFor = async (person: WorldPerson) => (await world.as(person).get(`/api/lots/${lotId}`)).body.access;
    // 23:59 of the day before in Denver, where it is the day already in UTC
    server.clock.set('2027-03-03T06:59:00Z');
    expect(await accessFor('inspector')).toBeNull();
    server.clock.set('2027-03-03T07:00:00Z');
    expect(await accessFor('inspector')).toEqual({
      gateCode: '4471',
      contactName: 'Site office',
      contactPhone: '555-0119',
      hazards: null,
    });
    expect(await accessFor('secondInspector')).toBeNull();
    expect(await accessFor('desk')).toBeNull();
    expect(await accessFor('plumber')).toMatchObject({ gateCode: '4471' });
    server.clock.set('2027-03-04T07:00:00Z');
    expect(await accessFor('inspector')).toBeNull();
  });

  it('names the earliest open visit as the next one', async () => {
    const lotId = world.lots[3].id;
    await bookVisit(lotId, '2027-03-01', '2027-03-01T16:00:00Z', 'closed');
    const id = await bookVisit(lotId, '2027-03-08', '2027-03-08T20:30:00Z');
    const { body } = await world.as('plumber').get(`/api/lots/${lotId}`);
    expect(body.nextVisit).toEqual({
      id,
      state: 'booked',
      startAt: '2027-03-08T20:30:00.000Z',
      endAt: '2027-03-08T22:30:00.000Z',
      zone: 'America/Denver',
    });
  });
});

describe('adding a lot', () => {
  it('adds it whole, with its units, and answers as the lot reads', async () => {
    const given = newLot('21', {
      units: [{ label: 'A' }, { label: 'B' }],
      latitude: 39.7,
      longitude: -104.9,
      permit: { number: 'P-27-0021', status: 'applied', holder: null },
      access: { gateCode: '9', contactName: null, contactPhone: null, hazards: 'dog' },
    });
    const { status, body } = await world.as('superintendent').post('/api/lots', given);
    expect(status).toBe(201);
    expect(body).toMatchObject({
      number: '21',
      permit: { number: 'P-27-0021', status: 'applied', holder: null },
      units: [
        { number: 1, label: 'A', geometry: null },
        { number: 2, label: 'B', geometry: null },
      ],
      access: { gateCode: '9', hazards: 'dog' },
      departmentName: null,
      stages: [],
      currentStage: null,
      ruleCard: null,
    });
    expect(await entriesOf(body.id)).toMatchObject([
      { kind: 'lot-added', actor_role: 'superintendent', payload: { number: '21' } },
    ]);
  });

  it('refuses a number the tract has already, and an address twice outside of tracts', async () => {
    expect((await world.as('superintendent').post('/api/lots', newLot('1'))).body.code).toBe('lot-number-taken');
    const alone = newLot('900', { tractId: null });
    expect((await world.as('superintendent').post('/api/lots', alone)).status).toBe(201);
    expect((await world.as('superintendent').post('/api/lots', { ...alone, number: '901' })).body.code).toBe(
      'lot-number-taken',
    );
  });

  it.each([
    ['half a place on earth', { latitude: 39 }, { longitude: 'both-or-neither' }],
    ['a latitude off the earth', { latitude: 91, longitude: 0 }, { latitude: expect.any(String) }],
    ['no address', { address: ' ' }, { address: 'required' }],
    ['a tract that is not there', { tractId: randomUUID() }, { tractId: 'unknown' }],
    ['a plumber that is none', { plumberId: randomUUID() }, { plumberId: 'unknown' }],
    ['an unknown field', { owner: 'x' }, { owner: 'unknown' }],
  ])('refuses %s and writes nothing', async (_, extra, fields) => {
    const { status, body } = await world.as('superintendent').post('/api/lots', newLot('77', extra));
    expect([status, body.code]).toEqual([400, 'bad-input']);
    expect(body.fields).toEqual(fields);
    const [rows] = await server.db.query(`SELECT 1 FROM lots WHERE number = '77'`);
    expect(rows).toEqual([]);
  });

  it('refuses a builder’s tract to another builder, and a builder as a plumber', async () => {
    const foreign = newLot('78', { tractId: world.otherTract.id });
    expect((await world.as('superintendent').post('/api/lots', foreign)).body.fields).toEqual({ tractId: 'unknown' });
    const wrongKind = newLot('78', { plumberId: world.organizations.otherBuilder.id });
    expect((await world.as('superintendent').post('/api/lots', wrongKind)).body.fields).toEqual({
      plumberId: 'unknown',
    });
  });

  it('lets superintendents of the builder alone add', async () => {
    expect((await world.as('builderOwner').post('/api/lots', newLot('79'))).body.code).toBe('not-allowed');
    for (const person of ['plumber', 'desk', 'otherSuperintendent', 'operator'] as const) {
      expect((await world.as(person).post('/api/lots', newLot('79'))).body.code).toBe('not-found');
    }
    expect((await world.nobody().post('/api/lots', newLot('79'))).status).toBe(401);
  });

  it('gives the first answer to a repeated request', async () => {
    const key = randomUUID();
    const first = await world.as('superintendent').post('/api/lots', newLot('80'), { key });
    const again = await world.as('superintendent').post('/api/lots', newLot('80'), { key });
    expect(again.body).toEqual(first.body);
  });
});

describe('changing a lot', () => {
  it('changes what differs and records the names of the fields, never a gate code', async () => {
    const { body: lot } = await world.as('superintendent').post('/api/lots', newLot('31'));
    const update = {
      address: '31 Tern Court',
      coverDate: '2027-04-01',
      access: { gateCode: '8812', contactName: null, contactPhone: null, hazards: null },
    };
    const { body } = await world.as('superintendent').patch(`/api/lots/${lot.id}`, update);
    expect(body).toMatchObject({ address: '31 Tern Court', coverDate: '2027-04-01', access: { gateCode: '8812' } });
    await world.as('superintendent').patch(`/api/lots/${lot.id}`, update);
    const entries = await entriesOf(lot.id);
    expect(entries.map(({ kind }) => kind)).toEqual(['lot-added', 'lot-changed']);
    expect(entries[1]?.payload).toEqual({ fields: ['coverDate', 'gateCode'] });
    expect(JSON.stringify(entries)).not.toContain('8812');
  });

  it('lets the desk set the permit, and the permit alone', async () => {
    const path = `/api/lots/${world.lots[4].id}`;
    const permit = { number: 'P-27-5', status: 'expired', holder: 'Dunlatch Plumbing' };
    expect((await world.as('desk').patch(path, { permit })).body.permit).toEqual(permit);
    expect((await world.as('desk').patch(path, { permit, address: 'elsewhere' })).body.code).toBe('not-allowed');
    expect((await world.as('desk').patch(path, { mayPlumberRequest: false })).body.code).toBe('not-allowed');
    const last = (await entriesOf(world.lots[4].id)).at(-1);
    expect(last).toMatchObject({
      kind: 'lot-changed',
      actor_role: 'desk',
      payload: { permitStatus: 'expired', permitNumber: 'P-27-5' },
    });
  });

  it.each([
    ['builderOwner', 'not-allowed'],
    ['plumber', 'not-allowed'],
    ['helper', 'not-allowed'],
    ['inspector', 'not-allowed'],
    ['departmentOwner', 'not-allowed'],
    ['otherSuperintendent', 'not-found'],
    ['otherDesk', 'not-found'],
  ] as const)('refuses it to the %s: %s', async (person, code) => {
    expect((await world.as(person).patch(`/api/lots/${world.lots[0].id}`, { address: 'x' })).body.code).toBe(code);
    const permit = { number: null, status: 'issued', holder: null };
    expect((await world.as(person).patch(`/api/lots/${world.lots[0].id}`, { permit })).body.code).toBe(code);
  });

  it('refuses a number taken and half a place, counting what stands already', async () => {
    const path = `/api/lots/${world.lots[5].id}`;
    expect((await world.as('superintendent').patch(path, { number: '1' })).body.code).toBe('lot-number-taken');
    expect((await world.as('superintendent').patch(path, { latitude: null })).body.fields).toEqual({
      latitude: 'both-or-neither',
    });
  });
});

describe('house geometry', () => {
  const path = (unit = 1) => `/api/lots/${world.lots[0].id}/units/${unit}/geometry`;

  it('is set by superintendent and plumber, and kept as given', async () => {
    const geometry = { ...house(), ventTerminalFt: 31 };
    for (const person of ['superintendent', 'plumber'] as const) {
      const { status, body } = await world.as(person).put(path(), { geometry });
      expect(status).toBe(200);
      expect(body.units[0].geometry).toMatchObject({ ventTerminalFt: 31 });
    }
    expect((await entriesOf(world.lots[0].id)).at(-1)).toMatchObject({
      kind: 'geometry-set',
      actor_role: 'plumber',
      payload: { unitNumber: 1 },
    });
  });

  it.each(['builderOwner', 'helper', 'inspector', 'desk'] as const)('is refused to the %s', async (person) => {
    expect((await world.as(person).put(path(), { geometry: {} })).body.code).toBe('not-allowed');
  });

  it('refuses an impossible house by its path, and a unit that is not there', async () => {
    const geometry = { ...house(), lowestFittingFt: 30, ventTerminalFt: 20 };
    const { body } = await world.as('plumber').put(path(), { geometry });
    expect(body.fields).toMatchObject({ 'geometry.ventTerminalFt': 'ends-before-it-starts' });
    expect((await world.as('plumber').put(path(2), { geometry: {} })).body.code).toBe('not-found');
    expect((await world.as('otherPlumber').put(path(), { geometry: {} })).body.code).toBe('not-found');
  });
});
