import type { OrganizationBrief } from '@holdwater/shared-types/accounts/person.contract.js';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { DepartmentModel } from '../../departments/department.model.js';
import { LedgerEntryModel } from '../../ledger/ledger-entry.model.js';
import { accountMailsTo } from '../../testing/fixtures/accounts.js';
import { createWorld, type World } from '../../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../../testing/test-app.js';
import { OrganizationModel } from '../organization.model.js';

const owner = { ownerEmail: 'Ida.Thornwick@example.test', ownerName: 'Ida Thornwick' };

describe('organizations', () => {
  let server: TestApp;
  let world: World;
  const listed = async (query: string) => {
    const { items, nextCursor } = (await world.as('superintendent').get(`/api/organizations${query}`)).body as {
      items: OrganizationBrief[];
      nextCursor: string | null;
    };
    return { names: items.map((item) => item.name), nextCursor };
  };

  beforeAll(async () => {
    server = await startTestApp();
    world = await createWorld(server);
  });
  afterAll(() => server?.close());

  describe('finding them', () => {
    it('goes by kind and by any part of the name, in whatever letters', async () => {
      expect((await listed('?kind=plumber')).names).toEqual(['Dunlatch Plumbing', 'Merrow']);
      expect((await listed('?q=MARROW')).names).toEqual(['Penmarrow']);
      expect((await listed('?kind=department&q=ow')).names).toEqual(['Tallowmere']);
      expect((await listed('?q=%25')).names).toEqual([]);
      expect((await listed('?q=_')).names).toEqual([]);
    });

    it('goes by pages that leave nobody out', async () => {
      const names: string[] = [];
      let cursor: string | null = '';
      for (let pages = 0; cursor !== null && pages < 10; pages += 1) {
        const page = await listed(`?limit=2${cursor && `&cursor=${cursor}`}`);
        names.push(...page.names);
        cursor = page.nextCursor;
      }
      expect(names).toEqual(['Dunlatch Plumbing', 'Merrow', 'Odderly Homes', 'Penmarrow', 'Tallowmere', 'Vennick']);
    });

    it('refuses a cursor that is none, an unknown kind, and nobody signed in', async () => {
      expect((await world.as('desk').get('/api/organizations?cursor=zzz')).body).toMatchObject({
        fields: { cursor: 'not-a-cursor' },
      });
      expect((await world.as('desk').get('/api/organizations?kind=bank')).body).toMatchObject({ code: 'bad-input' });
      expect((await world.nobody().get('/api/organizations')).status).toBe(401);
    });
  });

  describe('adding one', () => {
    const add = (body: object) => world.as('operator').post('/api/organizations', { ...owner, ...body });

    it('is the operator’s: for everybody else there is no such thing', async () => {
      for (const person of ['builderOwner', 'departmentOwner', 'superintendent', 'desk'] as const) {
        const answer = await world
          .as(person)
          .post('/api/organizations', { ...owner, name: 'Thornwick', kind: 'builder' });
        expect(answer.body).toMatchObject({ code: 'not-found' });
      }
      expect(await OrganizationModel.count()).toBe(6);
    });

    it('adds it, invites its first owner and keeps a record of both', async () => {
      const answer = await add({ name: 'Thornwick', kind: 'builder', phone: '555-0140' });
      expect(answer.status).toBe(201);
      const { id } = answer.body as OrganizationBrief;
      expect(answer.body).toEqual({ id, name: 'Thornwick', kind: 'builder', phone: '555-0140' });
      expect(await accountMailsTo('ida.thornwick@example.test')).toMatchObject([
        { mail: 'invitation', name: 'Ida Thornwick', organizationName: 'Thornwick', invitedByName: 'Quill Ambrose' },
      ]);
      const entries = await LedgerEntryModel.findAll({
        where: { scope: ['installation', `organization:${id}`] },
        order: ['at', 'scope'],
      });
      expect(entries).toMatchObject([
        {
          scope: 'installation',
          kind: 'organization-added',
          actorRole: 'operator',
          payload: { name: 'Thornwick', kind: 'builder' },
        },
        {
          kind: 'person-invited',
          actorRole: 'operator',
          payload: { email: 'ida.thornwick@example.test', roles: ['owner'] },
        },
      ]);
      expect(await DepartmentModel.findByPk(id)).toBeNull();
    });

    it('gives a department its zone and elevation, and refuses one without', async () => {
      const answer = await add({ name: 'Thornwick', kind: 'department', zone: 'America/Boise', elevationFt: 2730 });
      const department = await DepartmentModel.findByPk((answer.body as OrganizationBrief).id, { rejectOnEmpty: true });
      expect(department).toMatchObject({ zone: 'America/Boise', elevationFt: 2730, isOutside: false });
      const without = await add({ name: 'Sallow', kind: 'department' });
      expect(without.body).toMatchObject({ code: 'bad-input', fields: { zone: 'required', elevationFt: 'required' } });
      const nowhere = await add({ name: 'Sallow', kind: 'department', zone: 'America/Nowhere', elevationFt: 0 });
      expect(nowhere.body).toMatchObject({ fields: { zone: 'no-such-zone' } });
    });

    it('refuses a name in use for its kind, and leaves nothing behind', async () => {
      const mails = (await accountMailsTo('ida.thornwick@example.test')).length;
      expect((await add({ name: 'Merrow', kind: 'plumber' })).body).toMatchObject({
        code: 'bad-input',
        fields: { name: 'taken' },
      });
      expect((await accountMailsTo('ida.thornwick@example.test')).length).toBe(mails);
      expect((await add({ name: 'Merrow', kind: 'builder' })).status).toBe(201);
    });

    it('adds it once when the request comes twice', async () => {
      const body = { ...owner, name: 'Fennimoor', kind: 'plumber' };
      const [one, two] = await Promise.all(
        [1, 2].map(() => world.as('operator').post('/api/organizations', body, { key: 'twice-the-same' })),
      );
      expect(two?.body).toEqual(one?.body);
      expect(await OrganizationModel.count({ where: { name: 'Fennimoor' } })).toBe(1);
    });
  });
});
