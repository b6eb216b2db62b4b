import { randomUUID } from 'node:crypto';
import pg from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { LotModel } from '../../lots/lot.model.js';
import { addClosedVisit, addCorrection, addLots, book } from '../../testing/fixtures/visits.js';
import { createWorld, type World } from '../../testing/fixtures/world.js';
import { startTestApp, type TestApp } from '../../testing/test-app.js';

// That these rules are constraints and not the services' alone is the project's own (quality.md, safety of the data). Each write is the
// owner's, who may do everything but break them.
let server: TestApp;
let world: World;
let owner: pg.Client;
beforeAll(async () => {
  server = await startTestApp();
  world = await createWorld(server);
  owner = new pg.Client({ connectionString: server.database.ownerUrl });
  await owner.connect();
});
afterAll(async () => {
  await owner?.end();
  await server?.close();
});

const refused = (sql: string, values: unknown[], constraint: string) =>
  expect(owner.query(sql, values), sql).rejects.toMatchObject({ constraint });
const newLot = async () => (await addLots(server, world, 1))[0] as LotModel;

describe('a visit', () => {
  it('has an end when it has ended, and none while it is open', async () => {
    const { id } = await book(world, await newLot());
    for (const state of ['closed', 'withdrawn', 'declined', 'freed'])
      await refused('UPDATE visits SET state = $2 WHERE id = $1', [id, state], 'visits_ended');
    await refused('UPDATE visits SET ended_at = now() WHERE id = $1', [id], 'visits_ended');
    await owner.query(`UPDATE visits SET state = 'withdrawn', ended_at = now() WHERE id = $1`, [id]);
    await refused(`UPDATE visits SET state = 'booked' WHERE id = $1`, [id], 'visits_ended');
  });

  it('has a place of the room of its window, by the rule card in force on the day', async () => {
    const { id } = await book(world, await newLot(), { label: 'mid' });
    await owner.query('UPDATE visits SET place = 3 WHERE id = $1', [id]);
    await refused('UPDATE visits SET place = 4 WHERE id = $1', [id], 'visits_place_in_room');
    await refused(`UPDATE visits SET window_label = 'midnight' WHERE id = $1`, [id], 'visits_place_in_room');
    await refused(`UPDATE visits SET window_date = '2019-03-05' WHERE id = $1`, [id], 'visits_place_in_room');
    const copy = `INSERT INTO visits SELECT (jsonb_populate_record(v, jsonb_build_object('id', $2::uuid, 'calendar_uid', $2::uuid, 'place', 4))).*
      FROM visits v WHERE id = $1`;
    await refused(copy, [id, randomUUID()], 'visits_place_in_room');
  });

  it('keeps its place when a version published later has less room', async () => {
    const { id } = await book(world, await newLot(), { label: 'late' });
    await owner.query('UPDATE visits SET place = 3 WHERE id = $1', [id]);
    const shrink = `UPDATE rule_cards SET content = replace(content::text, '"room": 3', '"room": 1')::jsonb WHERE id = $1`;
    await owner.query('SET session_replication_role = replica');
    await owner.query(shrink, [world.ruleCard.id]);
    await owner.query('SET session_replication_role = origin');
    await owner.query(`UPDATE visits SET state = 'ready', ready_at = now(), place = 3 WHERE id = $1`, [id]);
    await refused('UPDATE visits SET place = 2 WHERE id = $1', [id], 'visits_place_in_room');
  });

  it('is for a stage its own rule card knows', async () => {
    const { id } = await book(world, await newLot(), { date: '2027-03-04' });
    await refused(`UPDATE visits SET stage_code = 'roofing' WHERE id = $1`, [id], 'visits_stage_of_card');
  });

  it('stands in the stead of one other visit of its own lot at most', async () => {
    const [one, other] = [await newLot(), await newLot()];
    const freed = await addClosedVisit(server, world, one, 'fail', { date: '2027-02-22', at: '2027-02-22T15:00:00Z' });
    const foreign = await addClosedVisit(server, world, other, 'fail', {
      date: '2027-02-23',
      at: '2027-02-23T15:00:00Z',
    });
    const again = await book(world, one, { date: '2027-03-08' });
    const final = await book(world, one, { date: '2027-03-08', stageCode: 'groundwork', label: 'mid' });
    const restores = 'UPDATE visits SET restores_id = $2 WHERE id = $1';
    await refused(restores, [again.id, foreign.id], 'visits_restores_own_lot');
    await refused(restores, [again.id, again.id], 'visits_restores_another');
    await owner.query(restores, [again.id, freed.id]);
    await refused(restores, [final.id, freed.id], 'visits_restores_once');
  });
});

describe('a correction', () => {
  it('is of the stage of its visit, and at a point of it where it names one', async () => {
    const visit = await addClosedVisit(server, world, await newLot(), 'fail', {
      date: '2027-02-25',
      at: '2027-02-25T15:00:00Z',
    });
    const { id } = await addCorrection(world, visit, 1);
    const point = 'UPDATE corrections SET point_code = $2 WHERE id = $1';
    await owner.query(point, [id, 'nail-plates']);
    // a point of groundwork, not of rough-in
    await refused(point, [id, 'bedding'], 'corrections_point_of_stage');
    await refused(point, [id, 'no-such-point'], 'corrections_point_of_stage');
    await refused(`UPDATE corrections SET stage_code = 'groundwork' WHERE id = $1`, [id], 'corrections_own_stage');
  });
});

describe('a party', () => {
  it('of a lot is an organization of its kind', async () => {
    const { id } = await newLot();
    const { builder, plumber, department } = world.organizations;
    const set = (column: string) => `UPDATE lots SET ${column} = $2 WHERE id = $1`;
    await refused(set('builder_id'), [id, plumber.id], 'lots_builder_kind');
    await refused(set('builder_id'), [id, department.id], 'lots_builder_kind');
    await refused(set('plumber_id'), [id, builder.id], 'lots_plumber_kind');
    await refused(set('plumber_id'), [id, department.id], 'lots_plumber_kind');
    await expect(owner.query(set('department_id'), [id, plumber.id])).rejects.toThrow('lots_department_id_fkey');
  });

  it('asked for its consent is of the kind it is asked as', async () => {
    const { id } = await newLot();
    const { plumber } = world.organizations;
    const ask = `INSERT INTO lot_consents (id, lot_id, kind, organization_id, asked_at) VALUES ($1, $2, $3, $4, now())`;
    for (const kind of ['builder', 'department'])
      await refused(ask, [randomUUID(), id, kind, plumber.id], 'lot_consents_kind');
    await owner.query(ask, [randomUUID(), id, 'plumber', plumber.id]);
  });

  it('keeps its kind: a department is one, a tract is its builder’s', async () => {
    const { builder, plumber } = world.organizations;
    const department = `INSERT INTO departments (id, zone) VALUES ($1, 'America/Denver')`;
    await refused(department, [plumber.id], 'departments_kind');
    await refused(
      'UPDATE tracts SET builder_id = $2 WHERE id = $1',
      [world.tract.id, plumber.id],
      'tracts_builder_kind',
    );
    await expect(
      owner.query(`UPDATE organizations SET kind = 'plumber' WHERE id = $1`, [builder.id]),
    ).rejects.toMatchObject({ code: '23503' });
  });
});
