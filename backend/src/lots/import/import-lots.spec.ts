import type { ImportFault } from '@holdwater/shared-types/lots/lot-import.contract.js';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { createWorld, type World, type WorldPerson } from '../../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../../testing/test-app.js';

let server: TestApp;
let world: World;
let standing: number;

beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
});
afterAll(() => server.close());
beforeEach(async () => {
  standing = await countLots();
});

async function countLots(): Promise<number> {
  const [rows] = await server.db.query('SELECT count(*)::int AS count FROM lots');
  return (rows as Array<{ count: number }>)[0]?.count ?? 0;
}
const send = (csv: string, extra: object = {}, person: WorldPerson = 'superintendent') =>
  world.as(person).post('/api/lots/import', {
    builderId: world.organizations.builder.id,
    tractId: world.tract.id,
    csv,
    isTrial: false,
    ...extra,
  });
const faultsOf = async (csv: string, extra: object = {}) => {
  const { status, body } = await send(csv, extra);
  expect(status).toBe(200);
  expect(body.isImported).toBe(false);
  expect(await countLots()).toBe(standing);
  return (body.faults as ImportFault[]).map(({ line, column, code, value, suggestion }) => [
    line,
    column,
    code,
    value,
    suggestion,
  ]);
};

describe('importing lots', () => {
  it('adds every line with all of its columns and asks the parties once for all of them', async () => {
    const csv = [
      'Number,Address,latitude,longitude,permit_number,Permit Status,permit_holder,units,zone,gate_code,contact_name,contact_phone,hazards',
      '41,41 Tern Court,39.7,-104.9,P-27-41,Issued,Dunlatch Plumbing,2,America/Denver,4471,Site office,555-0119,open trench',
      '42,"42 Tern Court, rear",,,,,,,US/Mountain,,,,=cmd()',
    ].join('\r\n');
    const ties = { plumberId: world.organizations.plumber.id, departmentId: world.organizations.department.id };
    const { body } = await send(csv, ties);
    expect(body).toEqual({ isImported: true, lots: 2, faults: [] });
    const list = await world.as('superintendent').get('/api/search?q=Tern');
    const [first, second] = list.body.items;
    const lot = (await world.as('superintendent').get(`/api/lots/${first.id}`)).body;
    expect(lot).toMatchObject({
      ...{ number: '41', latitude: 39.7, longitude: -104.9 },
      permit: { number: 'P-27-41', status: 'issued', holder: 'Dunlatch Plumbing' },
      units: [
        { number: 1, label: '1' },
        { number: 2, label: '2' },
      ],
      access: { gateCode: '4471', contactName: 'Site office', contactPhone: '555-0119', hazards: 'open trench' },
      parties: [
        { status: 'attached' },
        { kind: 'plumber', status: 'pending' },
        { kind: 'department', status: 'pending' },
      ],
    });
    expect((await world.as('superintendent').get(`/api/lots/${second.id}`)).body).toMatchObject({
      ...{ address: '42 Tern Court, rear', latitude: null },
      access: { hazards: '=cmd()' },
      permit: { number: null, status: 'not-applied', holder: null },
    });
    const [events] = await server.db.query(
      `SELECT payload FROM outbox_events WHERE kind = 'consent-asked' ORDER BY position`,
    );
    expect(events).toMatchObject([
      { payload: { kind: 'plumber', lotCount: 2 } },
      { payload: { kind: 'department', lotCount: 2 } },
    ]);
  });

  it('tells of a trial what an import would, and writes nothing', async () => {
    const { body } = await send('number,address\n51,51 Tern Court', { isTrial: true });
    expect(body).toEqual({ isImported: false, lots: 1, faults: [] });
    expect(await countLots()).toBe(standing);
    const [rows] = await server.db.query(
      `SELECT 1 FROM idempotent_answers WHERE route LIKE '%import%' AND answer ->> 'lots' = '1'`,
    );
    expect(rows).toEqual([]);
  });

  it('names columns it does not know, the likely one beside, before it looks at any line', async () => {
    expect(await faultsOf('lot,adress,Lattitude,color\nx,,y,z')).toEqual([
      [1, 'lot', 'unknown-column', 'lot', 'number'],
      [1, 'adress', 'unknown-column', 'adress', 'address'],
      [1, 'Lattitude', 'unknown-column', 'Lattitude', 'latitude'],
      [1, 'color', 'unknown-column', 'color', null],
      [1, 'number', 'missing-column', null, null],
      [1, 'address', 'missing-column', null, null],
    ]);
    expect(await faultsOf('number,address,Number\n1,a,2')).toEqual([[1, 'Number', 'column-twice', 'Number', null]]);
  });

  it('tells every fault of every line with its column and value, and imports none of the good ones', async () => {
    const head = 'number,address,latitude,longitude,permit_status,units,contact_phone,gate_code';
    const lines = [
      '61,61 Tern Court,39.7,-104.9,issued,1,555-0119,1',
      ',62 Tern Court,95,-104.9,isued,13,12,1',
      `${'6'.repeat(21)},,39.7,,issued,two,,${'9'.repeat(41)}`,
      '64,64 Tern Court,"39,7",-104.9,unknown words,1,,,stray',
    ];
    expect(await faultsOf([head, ...lines].join('\n'))).toEqual([
      [3, 'units', 'out-of-range', '13', null],
      [3, 'number', 'required', null, null],
      [3, 'latitude', 'out-of-range', '95', null],
      [3, 'permit_status', 'not-one-of-the-choices', 'isued', 'issued'],
      [3, 'contact_phone', 'not-a-phone', '12', null],
      [4, 'units', 'not-a-number', 'two', null],
      [4, 'number', 'too-long', '6'.repeat(21), null],
      [4, 'address', 'required', null, null],
      [4, 'longitude', 'both-or-neither', null, null],
      [4, 'gate_code', 'too-long', '9'.repeat(41), null],
      [5, 'latitude', 'not-a-number', '39,7', '39.7'],
      [5, 'permit_status', 'not-one-of-the-choices', 'unknown words', null],
      [5, null, 'cell-without-column', 'stray', null],
    ]);
  });

  it('takes a zone only as the department’s own', async () => {
    const csv = 'number,address,zone\n71,a,America/Denver\n72,b,America/Chicago\n73,c,America/Denvr\n74,d,Mountain';
    const departmentId = world.organizations.department.id;
    expect(await faultsOf(csv, { departmentId })).toEqual([
      [3, 'zone', 'zone-differs', 'America/Chicago', 'America/Denver'],
      [4, 'zone', 'no-such-zone', 'America/Denvr', 'America/Denver'],
      [5, 'zone', 'no-such-zone', 'Mountain', 'America/Denver'],
    ]);
    expect(await faultsOf('number,address,zone\n71,a,Nowhere/Atall')).toEqual([
      [2, 'zone', 'no-such-zone', 'Nowhere/Atall', null],
    ]);
  });

  it('finds a number twice in the file, and one the tract has', async () => {
    expect(await faultsOf('number,address\n81,a\n1,b\n81,c\n81,d')).toEqual([
      [3, 'number', 'lot-number-taken', '1', null],
      [4, 'number', 'repeated-in-file', '81', '2'],
      [5, 'number', 'repeated-in-file', '81', '2'],
    ]);
  });

  it('tells lots without a tract apart by their address', async () => {
    const { body } = await send('number,address\n5,1 Lone Road\n5,2 Lone Road', { tractId: null });
    expect(body.isImported).toBe(true);
    standing = await countLots();
    expect(await faultsOf('number,address\n6,2 Lone Road\n7,3 Lone Road\n8,3 Lone Road', { tractId: null })).toEqual([
      [2, 'address', 'lot-number-taken', '2 Lone Road', null],
      [4, 'address', 'repeated-in-file', '3 Lone Road', '3'],
    ]);
  });

  it('refuses an empty file, a broken quote, signs no database keeps and more lines than it takes', async () => {
    expect(await faultsOf('number,address\n')).toEqual([[0, null, 'empty', null, null]]);
    expect(await faultsOf('number,address\n1,"a')).toMatchObject([[2, null, 'quote-not-closed', null, null]]);
    expect(await faultsOf('number,address\n91,a\u0000b\n92,M\uFFFDrz')).toMatchObject([
      [2, 'address', 'not-text', 'a\uFFFDb', null],
      [3, 'address', 'not-text', 'M\uFFFDrz', null],
    ]);
    const many = Array.from({ length: 2001 }, (_, n) => `${n + 1000},${n} Long Road`).join('\n');
    expect(await faultsOf(`number,address\n${many}`)).toEqual([[0, null, 'too-many-lines', '2001', null]]);
  });

  it('is for superintendents of the builder, into a tract of the builder', async () => {
    const csv = 'number,address\n95,a';
    expect((await send(csv, {}, 'builderOwner')).body.code).toBe('not-allowed');
    for (const person of ['plumber', 'desk', 'otherSuperintendent', 'operator'] as const) {
      expect((await send(csv, {}, person)).body.code).toBe('not-found');
      expect((await send(csv, { isTrial: true }, person)).body.code).toBe('not-found');
    }
    expect((await send(csv, { tractId: world.otherTract.id })).body.fields).toEqual({ tractId: 'unknown' });
    expect(await countLots()).toBe(standing);
  });
});
